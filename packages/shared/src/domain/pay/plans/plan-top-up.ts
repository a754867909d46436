import { dollars, exact, type Exact } from '../../money/exact.ts';
import { centsText, shortText, toCentsUp } from '../../money/rounding.ts';
import { aLine, totalCents } from '../pay-line.ts';
import type { PayLine, WorkingStep } from '../pay-week.types.ts';
import { rateText } from '../working-words.ts';
import { planSource, type PlanWeek } from './plan-week.ts';

interface TopUp {
  key: string;
  label: string;
  rule: string;
  /** Exact dollars that the week is promised at least. */
  promised: Exact;
  note: string;
  arithmetic: string;
}

/**
 * What flat amounts or commission lack to the plan's hourly floor for the hours they pay for; nothing when it is met.
 * @param hours the hours on jobs, or all hours where an agreement covers the rest
 */
export function floorLine(week: PlanWeek, earned: readonly PayLine[], floor: string, hours: Exact): PayLine[] {
  return topUp(week, earned, {
    key: 'plan_floor',
    label: 'Up to the hourly floor',
    rule: 'Hourly guarantee: the higher of both is paid and is the regular rate; 29 CFR 778.111(b)',
    promised: exact(floor).mul(hours),
    note: 'At least the floor for every hour that this pay is for, up to the next cent',
    arithmetic: `${shortText(hours)} h times ${rateText(floor)}`,
  });
}

/** What the week's pay lacks to the guaranteed weekly amount; it is pay for all hours of the week. */
export function guaranteeLine(week: PlanWeek, earned: readonly PayLine[], weekly: string): PayLine[] {
  return topUp(week, earned, {
    key: 'plan_floor',
    label: 'Up to the weekly guarantee',
    rule: 'Guaranteed weekly amount, inside the regular rate; 29 CFR 778.109, 778.111(b)',
    promised: exact(weekly),
    note: 'At least this in every week with any work',
    arithmetic: rateText(weekly),
  });
}

function topUp(week: PlanWeek, earned: readonly PayLine[], { promised, ...words }: TopUp): PayLine[] {
  const earnedCents = totalCents(earned);
  const amountCents = toCentsUp(promised.sub(dollars(earnedCents)));
  if (amountCents <= 0) return [];
  const promisedCents = earnedCents + amountCents;
  const steps: WorkingStep[] = [
    {
      label: 'What the plan promises',
      note: words.note,
      arithmetic: words.arithmetic,
      result: centsText(promisedCents),
      sources: [planSource(week.plan)],
    },
    {
      label: 'Less what was earned',
      note: 'What this promise is measured by',
      arithmetic: `${centsText(promisedCents)} less ${centsText(earnedCents)}`,
      result: centsText(amountCents),
      sources: earned.map((line) => ({ kind: 'pay_line', id: line.key, label: line.label })),
    },
  ];
  const { key, label, rule } = words;
  return [
    aLine({
      ...{ key, label, rule, amountCents, kind: 'plan_floor', personId: week.person.id },
      inRegularRate: true,
      working: steps,
    }),
  ];
}
