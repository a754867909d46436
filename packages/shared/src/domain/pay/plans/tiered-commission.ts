import { dollars, exact, least, sum, ZERO, type Exact } from '../../money/exact.ts';
import { centsText, decimalText, shortText, toCents } from '../../money/rounding.ts';
import { formatDay } from '../../time/format.ts';
import { shareEarning } from '../crew-shares.ts';
import { centsOf, commissionBase, jobSource } from '../job-line-pay.ts';
import { aLine } from '../pay-line.ts';
import type { CarriedWeek, PayLine, WorkingStep } from '../pay-week.types.ts';
import { rateText } from '../working-words.ts';
import type { PlanOf } from './pay-plan.ts';
import { commissionLines } from './plan-jobs.ts';
import { planSource, type PlanWeek } from './plan-week.ts';

type Tiered = PlanOf<'tiered_percent'>;
type Tier = Tiered['tiers'][number];

/** The part of what was sold that falls to each tier, with the tier's percentage. */
function tierParts(base: Exact, { tiers, mode }: Pick<Tiered, 'tiers' | 'mode'>): { tier: Tier; part: Exact }[] {
  if (mode === 'whole') {
    const reached = tiers.filter((tier) => base.gt(exact(tier.over)) || exact(tier.over).equals(ZERO)).at(-1);
    return reached ? [{ tier: reached, part: base }] : [];
  }
  return tiers.flatMap((tier, index) => {
    const next = tiers[index + 1];
    const upTo = next ? least(base, exact(next.over)) : base;
    const part = upTo.sub(exact(tier.over));
    return part.gt(0) ? [{ tier, part }] : [];
  });
}

/**
 * Commission on what was sold by tiers: marginal, each part at its own tier's percentage, or whole, everything at the
 * percentage of the tier reached.
 * @returns exact dollars
 */
export function tieredCommission(base: Exact, terms: Pick<Tiered, 'tiers' | 'mode'>): Exact {
  return sum(tierParts(base, terms).map(({ tier, part }) => part.mul(exact(tier.percent)).div(100)));
}

/** The person's part of what the week's finished lines sold for, cents. */
export function tierBase(week: PlanWeek): number {
  const { person, split } = week;
  return commissionLines(week).reduce(
    (total, line) => total + centsOf(shareEarning(commissionBase(line), line.crew, split), person),
    0,
  );
}

/** The week's commission by tiers; by the month, the first tier's percentage on account. */
export function tieredLine(week: PlanWeek, terms: Tiered, baseCents: number): PayLine[] {
  const first = terms.tiers.slice(0, 1);
  const used = terms.period === 'month' ? { tiers: first, mode: terms.mode } : terms;
  const amountCents = toCents(tieredCommission(dollars(baseCents), used));
  if (amountCents === 0) return [];
  return [
    aLine({
      key: 'commission:tiers',
      personId: week.person.id,
      kind: 'commission',
      label: terms.period === 'month' ? 'Commission, on account of the month' : 'Commission by tiers',
      amountCents,
      inRegularRate: true,
      rule: `Commission in the regular rate whatever its formula; 29 CFR 778.117`,
      working: [
        {
          label: `What ${week.person.name} sold`,
          note: 'The own share of finished lines, after discounts, before tax, tips and deposits',
          arithmetic: centsText(baseCents),
          result: centsText(baseCents),
          sources: week.doneLines.map(jobSource),
        },
        tierStep(week, dollars(baseCents), used, amountCents),
      ],
    }),
  ];
}

function tierStep(
  week: PlanWeek,
  base: Exact,
  terms: Pick<Tiered, 'tiers' | 'mode'>,
  amountCents: number,
): WorkingStep {
  return {
    label: 'Commission by tiers',
    note: terms.mode === 'whole' ? 'Everything at the tier reached' : 'Each part at the percentage of its own tier',
    arithmetic: tierParts(base, terms)
      .map(({ tier, part }) => `${shortText(exact(tier.percent))} % of ${decimalText(part, 2)}`)
      .join(' + '),
    result: centsText(amountCents),
    sources: [planSource(week.plan)],
  };
}

/** A workweek of the month with what it was paid on account. */
export type SettledWeek = CarriedWeek;

/**
 * The month's tiers at its end: what the whole month earns above what was paid on account, spread evenly over the
 * month's workweeks, and the overtime each of them owes on its part (29 CFR 778.120(a)(1): equal amounts to each week).
 * Both stay outside this week's regular rate.
 */
export function monthSettlement(week: PlanWeek, terms: Tiered, weeks: readonly SettledWeek[]): PayLine[] {
  const base = dollars(weeks.reduce((total, one) => total + one.tierBaseCents, 0));
  const paidCents = weeks.reduce((total, one) => total + one.tierPaidCents, 0);
  const earnedCents = toCents(tieredCommission(base, terms));
  const dueCents = earnedCents - paidCents;
  if (dueCents <= 0) return [];
  const settlement = aLine({
    key: 'commission_settlement',
    personId: week.person.id,
    kind: 'commission_settlement',
    label: 'Commission of the month, settled',
    amountCents: dueCents,
    rule: 'Commission of a month, spread over its workweeks; 29 CFR 778.119, 778.120',
    working: [
      {
        label: `What ${week.person.name} sold in the month`,
        note: `${weeks.length} workweeks that end in this month`,
        arithmetic: weeks.map((one) => centsText(one.tierBaseCents)).join(' + '),
        result: decimalText(base, 2),
        sources: [],
      },
      tierStep(week, base, terms, earnedCents),
      {
        label: 'Less what was paid on account',
        note: 'Belongs to the whole month, so it stays out of this week’s regular rate',
        arithmetic: `${centsText(earnedCents)} less ${centsText(paidCents)}`,
        result: centsText(dueCents),
        sources: [],
      },
    ],
  });
  return [settlement, ...settlementPremium(week, dueCents, weeks)];
}

function settlementPremium(week: PlanWeek, dueCents: number, weeks: readonly SettledWeek[]): PayLine[] {
  const part = dollars(dueCents).div(weeks.length);
  const owing = weeks.filter((one) => exact(one.premiumHours).gt(0));
  const extras = owing.map((one) => part.div(exact(one.hours)).mul(exact(one.premiumHours)));
  const amountCents = toCents(sum(extras));
  if (amountCents === 0) return [];
  return [
    aLine({
      key: 'settlement_premium',
      personId: week.person.id,
      kind: 'settlement_premium',
      label: 'Overtime on the settled commission',
      amountCents,
      rule: 'Extra half time for each overtime week of the month; 29 CFR 778.120',
      working: [
        {
          label: 'Each week’s part of the settlement',
          note: 'The same amount to every workweek of the month',
          arithmetic: `${centsText(dueCents)} divided by ${weeks.length}`,
          result: decimalText(part, 4),
          sources: [],
        },
        ...owing.map((one, index): WorkingStep => {
          const extra = extras[index] ?? ZERO;
          return {
            label: `The week of ${formatDay(one.startsOn)}`,
            note: `${shortText(exact(one.hours))} h worked; half for each hour of overtime is ${shortText(exact(one.premiumHours))} h`,
            arithmetic: `${decimalText(part, 4)} divided by ${shortText(exact(one.hours))} h times ${shortText(exact(one.premiumHours))} h`,
            result: decimalText(extra, 4),
            sources: [],
          };
        }),
      ],
    }),
  ];
}

/** "6 % over 0, 8 % over 2,000": tiers in words. */
export function tierWords(tiers: readonly Tier[]): string {
  return tiers.map((tier) => `${shortText(exact(tier.percent))} % over ${rateText(tier.over)}`).join(', ');
}
