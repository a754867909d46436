import { payKinds, type PayKind } from '@driprail/shared/domain/pay/handover/kinds-of-pay';

/**
 * Raised whenever a column is added, taken away, renamed, moved or comes to mean something else. A test keeps what
 * each version held.
 */
export const EXPORT_SCHEMA_VERSION = '1';

type Columns<Name extends string> = readonly (readonly [name: Name, meaning: string])[];

const KIND_MEANINGS: Record<PayKind, string> = {
  straight_pay: 'Hours, salary, day rates, premiums for a role or shift, rest breaks paid apart',
  flat: 'Flat amounts, job rates, trips on which nobody was home',
  commission: 'Commission with what is settled later, less what customers’ refunds take off it',
  bonus: 'Bonuses inside the regular rate (29 CFR 778.208 to 778.211)',
  percentage_bonus: 'A percentage of all earnings; carries its own overtime (29 CFR 778.210)',
  discretionary_bonus: 'Discretionary bonuses, outside the regular rate (29 CFR 778.211)',
  flsa_premium: 'The overtime half that 29 USC 207 requires for hours over 40 in the week: qualified overtime',
  state_only_premium: 'Overtime premium that only a place’s own rules ask for',
  plan_top_up: 'What a plan adds up to its floor, guarantee or draw; below zero where a draw is paid back',
  minimum_wage_make_up: 'Make-up to the minimum wage (29 USC 206)',
  tips_card: 'Own share of tips by card, to be paid out',
  tips_invoice: 'Own share of tips with the invoice, to be paid out',
  tips_cash: 'Own share of cash tips that the company holds, to be paid out',
  tips_already_received: 'Own share of tips received on the spot: reported, not in the gross, not paid again',
  reimbursement: 'Expenses paid back; not wages',
  paid_time_off: 'Paid time off; not hours worked',
  show_up_pay: 'For hours of a short day that were not worked (29 CFR 778.220)',
  deductions: 'Deductions, below zero',
  corrections: 'Corrections of locked weeks, either sign',
};

const kindMeanings: Columns<PayKind | 'gross'> = [
  ...payKinds.map((kind) => [kind, KIND_MEANINGS[kind]] as const),
  ['gross', 'Gross pay before withholding: the columns from straight_pay on, less tips_already_received'],
];

const version = ['schema_version', `Version of these columns, ${EXPORT_SCHEMA_VERSION} as told here`] as const;

/** kinds.csv: a row per person and week. */
export const kindColumns = [
  version,
  ['week_start', 'First day of the workweek'],
  ['week_end', 'Last day of the workweek'],
  ['person_id', 'Stays the same when a name changes'],
  ['person', 'Name'],
  ['hours_worked', 'Hours of the week, 4 places'],
  ['overtime_hours', 'Hours that carry a premium, 4 places'],
  ['regular_rate', 'Dollars an hour, 4 places; empty without hours'],
  ...kindMeanings,
] as const satisfies Columns<string>;

/** people.csv: a row per person over the weeks of the payday. */
export const peopleColumns = [
  version,
  ['first_week_start', 'First day of the oldest workweek'],
  ['last_week_end', 'Last day of the newest workweek'],
  ['weeks', 'How many workweeks; each was worked out alone (29 CFR 778.104)'],
  ['person_id', 'Stays the same when a name changes'],
  ['person', 'Name'],
  ['hours_worked', 'Hours of the weeks, 4 places'],
  ['overtime_hours', 'Hours that carry a premium, 4 places'],
  ...kindMeanings,
] as const satisfies Columns<string>;

/** hours.csv: a row per clock entry and day. */
export const hourColumns = [
  version,
  ['week_start', 'First day of the workweek'],
  ['week_end', 'Last day of the workweek'],
  ['person_id', 'Stays the same when a name changes'],
  ['person', 'Name'],
  ['date', 'In the company’s zone; an entry past midnight has a row for each day'],
  ['kind', 'Kind of clock entry: job, travel, waiting, shop, training, rest_break, meal_break'],
  ['job', 'Job number, where the entry was on a job'],
  ['started', 'Date and time with the offset from UTC, as counted'],
  ['ended', 'The same'],
  ['hours', 'Hours that counted, 4 places; 0.0000 for a break that is not worked'],
  ['worked', 'yes or no: whether it counted as worked time'],
] as const satisfies Columns<string>;

/** clock-entries.csv in a person’s own export: a row per entry as it stands, beside what was recorded first. */
export const clockColumns = [
  version,
  ['entry_id', 'Names the entry in clock-corrections.json and audit.json'],
  ['kind', 'Kind of clock entry'],
  ['job', 'Job number, where the entry was on a job'],
  ['started', 'Date and time with the offset from UTC'],
  ['ended', 'The same; empty while it runs'],
  ['original_kind', 'As first recorded; empty when the entry was written down later'],
  ['original_started', 'As first recorded'],
  ['original_ended', 'As first recorded'],
  ['corrections', 'How many; each stands in clock-corrections.json'],
  ['last_reason', 'Why it was corrected last'],
] as const satisfies Columns<string>;

/** tips.csv in a person’s own export: a row per tip and locked week. */
export const tipColumns = [
  version,
  ['week_start', 'First day of the workweek'],
  ['date', 'When it was received'],
  ['job', 'Job number'],
  ['method', 'card, cash or invoice'],
  ['own_share', 'Dollars; the own share alone'],
  ['paid_out', 'no for tips received on the spot'],
] as const satisfies Columns<string>;

/** lines.csv, and the week’s export.csv: a row per person and line. Older than the version column, so without one. */
export const lineColumns = [
  ['week_start', 'First day of the workweek'],
  ['week_end', 'Last day of the workweek'],
  ['state', 'draft, checked or locked; a hand-over has locked weeks only'],
  ['person', 'Name'],
  ['kind', 'Kind of line'],
  ['description', 'In words'],
  ['date', 'Day of the work, where a line has one'],
  ['job', 'Job number'],
  ['hours', 'Hours, 4 places, where the line is paid by time'],
  ['rate', 'Dollars an hour or percent, 4 places'],
  ['amount', 'Dollars'],
  ['paid_out', 'no for tips already received'],
  ['rule', 'The rule that made it'],
] as const satisfies Columns<string>;

export function namesOf(columns: Columns<string>): string[] {
  return columns.map(([name]) => name);
}
