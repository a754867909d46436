import { exact, hoursOf, ZERO, type Exact } from '../../money/exact.ts';
import { hourlyPay, type HourlyPay, type TimePrice } from '../hourly-pay.ts';
import { kindWords } from '../working-words.ts';
import type { OtherTime } from './pay-plan.ts';
import { planSource, type PlanWeek } from './plan-week.ts';

const RULE = 'Worked time times the hourly pay of the plan; 29 CFR 778.110, 778.115';

/** All worked time at the plan's hourly pay; training, helping and services that have their own take it. */
export function allTime(week: PlanWeek, hourly: string): HourlyPay {
  const byService = servicePrices(week);
  const helping = helperVisits(week);
  const { trainingHourly, helperHourly } = week.plan.plan.extras;
  return hourlyPay(week.person, week.spans, (span) => {
    if (span.kind === 'training' && trainingHourly !== null) return price(week, 'training', 'Training', trainingHourly);
    if (span.kind !== 'job' || span.visitId === null) return price(week, 'all', 'Hours by the clock', hourly);
    if (helperHourly !== null && helping.has(span.visitId)) return price(week, 'helper', 'Helping', helperHourly);
    const own = byService.get(span.visitId);
    return own
      ? price(week, own.serviceId, `${own.name}, by the clock`, own.hourly)
      : price(week, 'all', 'Hours by the clock', hourly);
  });
}

/**
 * Time beside the jobs, for plans that pay the jobs themselves by flat amounts or percentages. Nothing where an
 * agreement made before the week covers it and the place allows that.
 */
export function timeBesideJobs(week: PlanWeek, other: OtherTime): HourlyPay {
  if (isCovered(week, other)) return { lines: [], unpaidHours: ZERO, restPaid: ZERO };
  const { trainingHourly } = week.plan.plan.extras;
  return hourlyPay(
    week.person,
    week.spans.filter((span) => span.kind !== 'job'),
    (span) =>
      span.kind === 'training' && trainingHourly !== null
        ? price(week, 'training', 'Training', trainingHourly)
        : price(week, span.kind, `${kindWords(span.kind)}, by the clock`, other.hourly),
  );
}

/** The hours that flat amounts or commission pay for: those on jobs, or all where an agreement covers the rest. */
export function jobHours(week: PlanWeek, other: OtherTime): Exact {
  if (isCovered(week, other)) return week.hours;
  const onJobs = week.spans.filter((span) => span.kind === 'job');
  return hoursOf(onJobs.reduce((total, span) => total + span.to - span.from, 0));
}

/** Whether a dated agreement covers the time beside the jobs (29 CFR 778.318(c)). */
function isCovered({ mayCoverOtherTime, spans }: PlanWeek, { agreement }: OtherTime): boolean {
  const first = spans[0]?.date ?? '';
  return mayCoverOtherTime && agreement !== null && agreement.signedOn <= first;
}

function price({ plan }: PlanWeek, key: string, label: string, value: string): TimePrice {
  return {
    key: `hourly:plan:${key}`,
    label,
    value,
    startsOn: plan.startsOn,
    source: planSource(plan),
    rule: RULE,
  };
}

/** By visit, the best hourly pay that one of its finished services has of its own. */
function servicePrices({ doneLines, plan }: PlanWeek) {
  const best = new Map<string, { serviceId: string; name: string; hourly: string }>();
  for (const { visitId, serviceId, serviceName } of doneLines) {
    const own = plan.plan.extras.hourlyByService.find((item) => item.serviceId === serviceId);
    const known = best.get(visitId);
    if (own && (!known || exact(own.hourly).gt(exact(known.hourly))))
      best.set(visitId, { serviceId, name: serviceName, hourly: own.hourly });
  }
  return best;
}

function helperVisits({ doneLines, person }: PlanWeek): Set<string> {
  const helping = doneLines.filter(({ crew }) => crew.some((one) => one.personId === person.id && one.isTrainee));
  return new Set(helping.map((line) => line.visitId));
}
