import { dollars, fractionText, type Exact } from '../money/exact.ts';
import { centsText, decimalText, shortText, toCents } from '../money/rounding.ts';
import { aLine, totalCents } from './pay-line.ts';
import type { PayLine, PayLineKind, PayPerson, SourceRef, WorkingStep } from './pay-week.types.ts';
import type { WeekPremium } from './week-premium.ts';
import { hoursAndMinutes, workedDays } from './working-words.ts';
import type { WorkSpan } from './work-spans.ts';

export interface PremiumParts {
  person: PayPerson;
  spans: readonly WorkSpan[];
  hours: Exact;
  rate: Exact;
  premium: WeekPremium;
  /** Lines inside the regular rate, the make-up among them. */
  included: readonly PayLine[];
  /** Lines outside it, tips and all. */
  excluded: readonly PayLine[];
}

/** The overtime line with its working in the order a person would do it by hand; null when nothing is owed. */
export function premiumLine(parts: PremiumParts): PayLine | null {
  const { person, hours, rate, premium } = parts;
  const amountCents = toCents(premium.premium);
  if (amountCents === 0) return null;
  return aLine({
    key: 'overtime_premium',
    personId: person.id,
    kind: 'overtime_premium',
    label: premium.split.double.gt(0) ? 'Overtime and double time premium' : 'Overtime, half the regular rate',
    hours: fractionText(premium.split.overtime.add(premium.split.double)),
    rate: fractionText(rate),
    amountCents,
    rule:
      premium.ruleSet.key === 'us_federal'
        ? '29 USC 207(a); 29 CFR 778.109 to 778.118'
        : `${premium.ruleSet.name}; ${premium.ruleSet.source}`,
    working: [
      workedStep(parts),
      ...includedSteps(parts.included),
      ...excludedStep(parts.excluded),
      ...rateSteps(parts, hours, rate),
      ...premiumSteps(parts, amountCents),
    ],
  });
}

function workedStep({ person, spans, hours }: PremiumParts): WorkingStep {
  const entries = [...new Map(spans.map((span) => [span.entryId, span.date])).entries()];
  return {
    label: `What ${person.name} worked`,
    note: workedDays(spans),
    arithmetic: hoursAndMinutes(hours),
    result: `${shortText(hours)} h`,
    sources: entries.map(([id, date]) => ({ kind: 'clock_entry', id, label: `Clock entry, ${date}` })),
  };
}

const INCLUDED: [PayLineKind, string][] = [
  ['flat', 'Flat amounts of this week count'],
  ['commission', 'Commission of this week counts'],
  ['bonus', 'Bonuses of this week count'],
  ['minimum_wage_make_up', 'The make-up to the minimum wage counts'],
];

/** Hourly lines one by one with their own arithmetic; the other kinds as one sum each. */
function includedSteps(included: readonly PayLine[]): WorkingStep[] {
  const hourly = included.filter((line) => line.kind === 'hourly').flatMap((line) => line.working.slice(-1));
  const others = INCLUDED.flatMap(([kind, label]) => {
    const lines = included.filter((line) => line.kind === kind);
    if (lines.length === 0) return [];
    const jobs = [...new Set(lines.map((line) => line.jobNumber).filter((number) => number !== null))];
    return [
      {
        label,
        note:
          jobs.length > 0
            ? `${jobs.length === 1 ? 'Job' : 'Jobs'} ${jobs.join(', ')}`
            : lines.map((line) => line.label).join(', '),
        arithmetic: lines.map((line) => centsText(line.amountCents)).join(' + '),
        result: centsText(totalCents(lines)),
        sources: lines.map(lineSource),
      },
    ];
  });
  return [...hourly, ...others];
}

const EXCLUDED: [PayLineKind[], string, string][] = [
  [['tip', 'tip_already_received'], 'tips', 'Tips belong to the crew'],
  [['correction'], 'corrections', 'A correction belongs to the week it mends'],
  [['discretionary_bonus'], 'discretionary bonus', 'A discretionary bonus was never promised'],
  [['reimbursement'], 'reimbursement', 'A reimbursement pays back an expense'],
  [['paid_time_off'], 'paid time off', 'Paid time off was not worked'],
];

function excludedStep(excluded: readonly PayLine[]): WorkingStep[] {
  const groups = EXCLUDED.map(([kinds, noun, reason]) => ({
    noun,
    reason,
    lines: excluded.filter((line) => kinds.includes(line.kind)),
  })).filter((group) => group.lines.length > 0);
  if (groups.length === 0) return [];
  return [
    {
      label: 'Does not count',
      note: groups.map((group) => group.reason).join('. '),
      arithmetic: groups.map((group) => `${centsText(totalCents(group.lines))} ${group.noun}`).join(', '),
      result: '',
      sources: groups.flatMap((group) => group.lines.map(lineSource)),
    },
  ];
}

function rateSteps({ included }: PremiumParts, hours: Exact, rate: Exact): WorkingStep[] {
  const total = totalCents(included);
  const quotient = dollars(total).div(hours);
  const isRaised = rate.gt(quotient);
  return [
    {
      label: 'Together',
      note: 'Everything that counts',
      arithmetic: included.map((line) => centsText(line.amountCents)).join(' + '),
      result: centsText(total),
      sources: [],
    },
    {
      label: 'The regular rate',
      note: isRaised
        ? 'What an hour of this week was worth, raised to the minimum wage'
        : 'What an hour of this week was worth',
      arithmetic: `${centsText(total)} divided by ${shortText(hours)} h`,
      result: decimalText(rate, 4),
      sources: [],
    },
  ];
}

function premiumSteps({ hours, rate, premium }: PremiumParts, amountCents: number): WorkingStep[] {
  const { overtime, double } = premium.split;
  const isFederal = premium.ruleSet.key === 'us_federal';
  const sources: SourceRef[] = [{ kind: 'rule', id: premium.ruleSet.key, label: premium.ruleSet.name }];
  const note = isFederal
    ? `${shortText(hours)} less ${premium.ruleSet.weeklyHours} is ${shortText(overtime)} h. The whole hour is in the steps above already`
    : `${premium.ruleSet.name}: ${shortText(overtime)} h. The whole hour is in the steps above already`;
  const half = `half of ${decimalText(rate, 4)} times ${shortText(overtime)} h`;
  const whole = `${decimalText(rate, 4)} times ${shortText(double)} h`;
  return [
    {
      label: isFederal ? `Half of it, for the hours over ${premium.ruleSet.weeklyHours}` : 'The premium on top',
      note: double.gt(0) ? `${note}. Double time: ${shortText(double)} h` : note,
      arithmetic: double.gt(0) ? `${half} + ${whole}` : half,
      result: centsText(amountCents),
      sources,
    },
  ];
}

function lineSource(line: PayLine): SourceRef {
  if (line.jobId !== null) return { kind: 'job', id: line.jobId, label: `Job ${line.jobNumber}` };
  return { kind: 'pay_line', id: line.key, label: line.label };
}
