import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import type { PayRulesDto, RateDto } from '@driprail/shared/contracts/pay-rates.contract';
import type { PayPlanDto } from '@driprail/shared/contracts/pay-plans.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import { shortText } from '@driprail/shared/domain/money/rounding';
import { formatClock, formatDate } from '@driprail/shared/domain/time/format';
import type { ClockStyle } from '@driprail/shared/domain/time/format';
import { rateText } from './ledger.ts';
import { basePlanWords } from './plan-base-words.ts';
import { rateKey } from './plan-words.ts';

export type BandState = 'past' | 'now' | 'next';

/** One value from its start until the next one starts; nothing is written over. */
export interface Band {
  id: string;
  from: string;
  /** First day of the band that follows, or null. */
  to: string | null;
  value: string;
  note: string;
  state: BandState;
}

export interface BandRow {
  key: string;
  title: string;
  note: string;
  bands: Band[];
}

interface Dated {
  id: string;
  startsOn: string;
  setBy: string;
}

function bandsOf<T extends Dated>(
  dated: readonly T[],
  today: string,
  words: (item: T) => string,
  more?: (item: T) => string,
): Band[] {
  const sorted = [...dated].sort((a, b) => a.startsOn.localeCompare(b.startsOn));
  const changes = sorted.filter((item, index) => {
    const before = sorted[index - 1];
    return before === undefined || words(before) !== words(item);
  });
  return changes.map((item, index) => {
    const to = changes[index + 1]?.startsOn ?? null;
    const state = item.startsOn > today ? 'next' : to !== null && to <= today ? 'past' : 'now';
    const extra = more?.(item);
    const from = `from ${formatDate(item.startsOn)}${item.setBy ? `, ${item.setBy}` : ''}`;
    return {
      id: item.id,
      from: item.startsOn,
      to,
      value: words(item),
      note: extra ? `${extra}, ${from}` : from,
      state,
    };
  });
}

/** A person's plans as one row; none without a plan. */
export function planRows(plans: readonly PayPlanDto[], personId: string | null, today: string): BandRow[] {
  const own = plans.filter((plan) => plan.personId === personId);
  if (own.length === 0) return [];
  const bands = bandsOf(own, today, (item) => basePlanWords(item.plan));
  return [{ key: 'plan', title: 'Plan', note: 'goes before the rates', bands }];
}

/** What a rate says: "19.50", "6%", "12.00 a line"; a percent or flat amount of zero is none. */
export function rateWords({ kind, value }: Pick<RateDto, 'kind' | 'value'>): string {
  if (kind === 'hourly') return rateText(value);
  if (exact(value).lte(0)) return 'None';
  return kind === 'commission_percent' ? `${shortText(exact(value))}%` : rateText(value);
}

const order = { hourly: 0, commission_percent: 1, flat_service: 2, product_cost: 3, per_review: 4, mileage: 5 };

/** The rows of a person, the person's own first and then the company's; or of the company alone. */
export function rateRows(rates: readonly RateDto[], personId: string | null, today: string): BandRow[] {
  const groups = new Map<string, RateDto[]>();
  for (const rate of rates.filter((r) => r.personId === null || r.personId === personId)) {
    groups.set(rateKey(rate), [...(groups.get(rateKey(rate)) ?? []), rate]);
  }
  const heads = [...groups].flatMap(([key, own]) => (own[0] ? [{ key, own, head: own[0] }] : []));
  return heads
    .sort(
      (a, b) =>
        Number(a.head.personId === null) - Number(b.head.personId === null) ||
        order[a.head.kind] - order[b.head.kind] ||
        (a.head.serviceName ?? '').localeCompare(b.head.serviceName ?? ''),
    )
    .map(({ key, own, head }) => ({
      key,
      title: rowTitle(head),
      note: [head.serviceName ?? scopeWords(head), head.personId === null && personId ? 'company-wide' : '']
        .filter(Boolean)
        .join(', '),
      bands: bandsOf(own, today, rateWords),
    }));
}

const titles = {
  commission_percent: 'Commission',
  flat_service: 'Flat per line',
  product_cost: 'Product cost',
  per_review: 'Bonus per review',
  mileage: 'A mile',
};

function rowTitle({ kind, clockKind }: RateDto): string {
  if (kind !== 'hourly') return titles[kind];
  return clockKind ? `${clockKindNames[clockKind]}, by the hour` : 'By the hour';
}

function scopeWords({ kind, clockKind }: RateDto): string {
  if (kind === 'commission_percent') return 'every service';
  if (kind === 'mileage') return 'own car, paid back';
  if (kind === 'per_review') return 'promised';
  return clockKind ? 'only this kind' : 'all worked time';
}

export const splitWords = { equal: 'Equally', weights: 'By weights', minutes: 'By minutes worked' };
export const weekdayWords = ['Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday', 'Sunday'];

/** The company's rules as rows, each only where it changed. */
export function ruleRows(rules: readonly PayRulesDto[], today: string, clock: ClockStyle): BandRow[] {
  const startOf = (r: PayRulesDto) => formatClock(`2026-01-01T${r.workweekStartsAt}:00Z`, 'utc', clock);
  const row = (
    key: string,
    title: string,
    note: string,
    words: (r: PayRulesDto) => string,
    more?: (r: PayRulesDto) => string,
  ): BandRow => ({
    key,
    title,
    note,
    bands: bandsOf(rules, today, words, more),
  });
  return [
    row(
      'overtime',
      'Overtime',
      'company rule set',
      () => 'Half the regular rate over 40 h',
      () => 'federal, 29 CFR part 778',
    ),
    row('minimum', 'Minimum wage', 'each person, each week', (r) => rateText(r.minimumWage)),
    row('split', 'In a crew', 'how a job is shared', (r) => splitWords[r.crewSplit]),
    row('meal', 'Meal break', 'unpaid from this length on', (r) => `${r.mealBreakMinutes} min`),
    row('punches', 'Punches', 'what the clock counts', (r) =>
      r.punchRoundingMinutes === null ? 'Exact time' : `Nearest ${r.punchRoundingMinutes} min`,
    ),
    row('premium', 'Premium, rounded', 'to the cent, once a week', (r) =>
      r.premiumRounding === 'up' ? 'Always up' : 'Half up',
    ),
    row('earned', 'Commission', 'is earned when', (r) =>
      r.commissionEarned === 'paid' ? 'The customer has paid' : 'The work is done',
    ),
    row(
      'tips',
      'Tips',
      'always the crew’s',
      (r) => (r.tipsGoTo === 'person' ? 'Whom the customer meant' : 'Shared by the crew'),
      (r) => (exact(r.tipCardFeePercent).gt(0) ? `card fee ${shortText(exact(r.tipCardFeePercent))}%` : ''),
    ),
    row('week', 'Workweek', 'seven days, fixed', (r) => `${weekdayWords[r.workweekStartsOn - 1] ?? ''} ${startOf(r)}`),
  ];
}
