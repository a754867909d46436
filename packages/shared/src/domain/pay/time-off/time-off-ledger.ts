import { exact, fractionText, greatest, least, sum, ZERO, type Exact } from '../../money/exact.ts';
import { timeOffRuleOn, type DatedTimeOffRule, type TimeOffKind } from './time-off-rule.ts';

/** One workweek of a person as the ledger looks at it. Hours are exact fractions, "n/d" or "n". */
export interface LedgerWeek {
  startsOn: string;
  endsOn: string;
  /** Worked hours that earn. Only locked weeks earn: the caller gives 0 for an open one, or what it expects. */
  hoursWorked: string;
}

export interface LedgerTaking {
  id: string;
  on: string;
  hours: string;
}

/** An opening balance or the owner's correction; signed. */
export interface LedgerAdjustment extends LedgerTaking {
  reason: string;
}

export interface LedgerInput {
  kind: TimeOffKind;
  personId: string;
  rules: readonly DatedTimeOffRule[];
  /** Oldest first, from the person's first one on: what was before stands in an opening balance. */
  weeks: readonly LedgerWeek[];
  taken: readonly LedgerTaking[];
  adjustments: readonly LedgerAdjustment[];
}

export type TimeOffMoveKind = 'carry_lost' | 'given' | 'adjusted' | 'taken' | 'earned' | 'cap_lost';

export interface TimeOffMove {
  on: string;
  kind: TimeOffMoveKind;
  /** Signed exact hours. */
  hours: string;
  /** After this move. */
  balance: string;
  /** A rule, an adjustment of the ledger or one of the pay week. */
  sourceId: string;
  note: string;
}

export interface TimeOffWeek {
  startsOn: string;
  endsOn: string;
  /** Earned by hours or given, before what a cap left out. */
  earned: string;
  taken: string;
  adjusted: string;
  /** To the cap and at the turn of the year, as a positive number. */
  lost: string;
  /** At the week's end. */
  balance: string;
  moves: TimeOffMove[];
}

type Draft = Pick<TimeOffMove, 'on' | 'kind' | 'sourceId' | 'note'> & { change: (balance: Exact) => Exact };

/** What happens on one day, in this order; hours of the week are earned when the week is over. */
const ORDER: readonly TimeOffMoveKind[] = ['carry_lost', 'given', 'adjusted', 'taken', 'earned', 'cap_lost'];

/**
 * The ledger of one person and kind: what every week earned, gave, took and lost, and the balance at its end. Pure and
 * exact; the moves add up to the balance. A cap only stops what comes in, it takes away nothing that is there.
 */
export function timeOffLedger(input: LedgerInput): TimeOffWeek[] {
  let balance = ZERO;
  let before = '';
  return input.weeks.map((week) => {
    const moves: TimeOffMove[] = [];
    for (const { change, ...draft } of [...draftsOf(input, week, before)].sort(byDayAndOrder)) {
      const by = change(balance);
      if (by.equals(ZERO)) continue;
      balance = balance.add(by);
      moves.push({ ...draft, hours: fractionText(by), balance: fractionText(balance) });
      const cap = draft.kind === 'earned' || draft.kind === 'given' ? capOn(input, draft.on) : null;
      const over = cap === null ? ZERO : least(by, greatest(ZERO, balance.sub(cap.hours)));
      if (cap === null || over.equals(ZERO)) continue;
      balance = balance.sub(over);
      moves.push({
        ...{ on: draft.on, kind: 'cap_lost', hours: fractionText(over.neg()), balance: fractionText(balance) },
        ...{ sourceId: cap.ruleId, note: 'Over the most that may be kept' },
      });
    }
    before = week.endsOn;
    return weekOf(week, moves, balance);
  });
}

/** Balance at the last week's end, exact hours. */
export function timeOffBalance(weeks: readonly TimeOffWeek[]): Exact {
  return exact(weeks.at(-1)?.balance ?? '0');
}

/** The lowest balance after any move from a day on, exact hours; what may not fall below zero without a word. */
export function lowestBalance(weeks: readonly TimeOffWeek[], from: string): Exact {
  const after = weeks.flatMap((week) =>
    week.moves.filter((move) => move.on >= from).map((move) => exact(move.balance)),
  );
  return after.reduce(least, timeOffBalance(weeks));
}

/** @param before last day of the week before, '' for the first week: then only adjustments reach back further */
function draftsOf(input: LedgerInput, week: LedgerWeek, before: string): Draft[] {
  const isIn = (on: string): boolean => on <= week.endsOn && (before === '' ? on >= week.startsOn : on > before);
  const { taken, adjustments } = input;
  return [
    ...ruleDrafts(input, isIn, week),
    ...adjustments
      .filter(({ on }) => isIn(on) || (before === '' && on < week.startsOn))
      .map(({ id, on, hours, reason }): Draft => ({
        ...{ on, kind: 'adjusted', sourceId: id, note: reason },
        change: () => exact(hours),
      })),
    ...taken
      .filter(({ on }) => isIn(on))
      .map(({ id, on, hours }): Draft => ({
        ...{ on, kind: 'taken', sourceId: id, note: 'Paid time off' },
        change: () => exact(hours).neg(),
      })),
  ];
}

function ruleDrafts(input: LedgerInput, isIn: (on: string) => boolean, week: LedgerWeek): Draft[] {
  const drafts: Draft[] = [];
  for (const dated of input.rules.filter((rule) => rule.kind === input.kind)) {
    const { earning, yearStartsOn, carryHours } = dated.rule;
    const sourceId = dated.id;
    const holds = (on: string): boolean => isIn(on) && timeOffRuleOn(input.rules, input, on)?.id === dated.id;
    for (const on of yearStarts(week, yearStartsOn).filter(holds)) {
      if (carryHours !== null) {
        const change = (balance: Exact): Exact => least(ZERO, exact(carryHours).sub(greatest(ZERO, balance)));
        drafts.push({ on, kind: 'carry_lost', sourceId, note: 'More than goes on into a new year', change });
      }
      if (earning.by === 'year') {
        drafts.push({ on, kind: 'given', sourceId, note: 'For the year', change: () => exact(earning.hours) });
      }
    }
    if (earning.by === 'holidays') {
      for (const { on, name } of earning.dates.filter((date) => holds(date.on)))
        drafts.push({ on, kind: 'given', sourceId, note: name, change: () => exact(earning.hours) });
    }
    if (earning.by === 'hours_worked' && timeOffRuleOn(input.rules, input, week.startsOn)?.id === dated.id) {
      drafts.push({
        ...{ on: week.endsOn, kind: 'earned', sourceId, note: `1 h for every ${earning.perHours} h worked` },
        change: () => exact(week.hoursWorked).div(exact(earning.perHours)),
      });
    }
  }
  return drafts;
}

/** The starts of years near a week; weeks may leave gaps of up to a year between them. */
function yearStarts({ endsOn }: LedgerWeek, monthAndDay: string): string[] {
  const year = Number(endsOn.slice(0, 4));
  return [year - 1, year].map((one) => `${one}-${monthAndDay}`);
}

function capOn({ rules, ...who }: LedgerInput, on: string): { hours: Exact; ruleId: string } | null {
  const dated = timeOffRuleOn(rules, who, on);
  return dated?.rule.capHours ? { hours: exact(dated.rule.capHours), ruleId: dated.id } : null;
}

function byDayAndOrder(a: Draft, b: Draft): number {
  if (a.on !== b.on) return a.on < b.on ? -1 : 1;
  const gain = ORDER.indexOf(a.kind) - ORDER.indexOf(b.kind);
  if (gain !== 0) return gain;
  return a.sourceId < b.sourceId ? -1 : 1;
}

function weekOf({ startsOn, endsOn }: LedgerWeek, moves: TimeOffMove[], balance: Exact): TimeOffWeek {
  const of = (...kinds: TimeOffMoveKind[]): Exact =>
    sum(moves.filter((move) => kinds.includes(move.kind)).map((move) => exact(move.hours)));
  return {
    ...{ startsOn, endsOn, moves },
    earned: fractionText(of('earned', 'given')),
    taken: fractionText(of('taken').neg()),
    adjusted: fractionText(of('adjusted')),
    lost: fractionText(of('carry_lost', 'cap_lost').neg()),
    balance: fractionText(balance),
  };
}
