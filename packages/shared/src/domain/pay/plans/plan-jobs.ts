import { linePay, sharedAmount } from '../job-line-pay.ts';
import type { DoneLine, PayLine } from '../pay-week.types.ts';
import { planSource, type PlanWeek } from './plan-week.ts';

/** Finished lines that earn commission in this week. A draw and the tiers of a month are settled by what was done. */
export function commissionLines({ doneLines, plan: { plan } }: PlanWeek): DoneLine[] {
  const { base } = plan;
  const isByDone = base.kind === 'draw' || (base.kind === 'tiered_percent' && base.period === 'month');
  return doneLines.filter((line) => isByDone || !line.commissionWaits);
}

/** The plan's percentage of each finished line. */
export function percentOfLines(week: PlanWeek, percent: string): PayLine[] {
  const { startsOn } = week.plan;
  return commissionLines(week).flatMap((line) =>
    linePay(shareOf(week, line), { kind: 'commission', value: percent, startsOn, source: planSource(week.plan) }),
  );
}

/** The plan's flat amount of each finished line: by service and size class, else by service. */
export function flatLines(week: PlanWeek): PayLine[] {
  const { startsOn } = week.plan;
  return week.doneLines.flatMap((line) => {
    const value = flatOf(week, line);
    return value === null
      ? []
      : linePay(shareOf(week, line), { kind: 'flat', value, startsOn, source: planSource(week.plan) });
  });
}

function flatOf({ plan }: PlanWeek, { serviceId, sizeClass }: DoneLine): string | null {
  const own = plan.plan.extras.flats.filter((flat) => flat.serviceId === serviceId);
  const exactly = own.find((flat) => flat.sizeClass === sizeClass) ?? own.find((flat) => flat.sizeClass === null);
  return exactly?.amount ?? null;
}

/** The job rate, once for each visit on which something was finished; the crew shares it. */
export function jobRates(week: PlanWeek, perJob: string): PayLine[] {
  const byVisit = new Map(week.doneLines.map((line) => [line.visitId, line]));
  return [...byVisit.values()].flatMap((line) =>
    sharedAmount(shareOf(week, line), {
      key: `job_rate:${line.visitId}`,
      kind: 'job_rate',
      label: 'Job rate',
      rule: 'Fixed amount per job whatever the hours; 29 CFR 778.112',
      value: perJob,
      source: planSource(week.plan),
    }),
  );
}

/** A promised amount for each add-on finished; the crew shares it. */
export function addOnBonuses(week: PlanWeek, amount: string): PayLine[] {
  return week.doneLines
    .filter((line) => line.isAddOn)
    .flatMap((line) =>
      sharedAmount(shareOf(week, line), {
        key: `bonus:add_on:${line.lineId}`,
        kind: 'bonus',
        label: `Bonus per add-on: ${line.serviceName}`,
        rule: 'Promised bonus, inside the regular rate; 29 CFR 778.208 to 778.211',
        value: amount,
        source: planSource(week.plan),
      }),
    );
}

export function shareOf({ person, split, zone }: PlanWeek, line: DoneLine) {
  return { person, line, split, zone };
}
