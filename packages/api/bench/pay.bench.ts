import { computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import type { PayWeekInput } from '@driprail/shared/domain/pay/pay-week.types';
import { inTurn, median, timed } from './measure.ts';
import type { Ratio } from './measure.ts';

const FEW = 12;
const MANY = 200;

/** Computing a pay week for 12 and for 200 technicians: time per person should stay the same. */
export async function benchPay(): Promise<Ratio> {
  const few = weekOf(FEW);
  const many = weekOf(MANY);
  const run = (input: PayWeekInput) => () => timed(() => Promise.resolve(computePayWeek(input)));
  const [a, b] = await inTurn(15, 3, run(many), run(few));
  const ratio = median(a) / MANY / (median(b) / FEW);
  return {
    what: `pay week per person, ${MANY} people / ${FEW} people`,
    ratio,
    goal: 1.3,
    note: `${median(a).toFixed(0)} ms for ${MANY}, ${median(b).toFixed(1)} ms for ${FEW}`,
  };
}

/** Everybody works five days of nine hours on four jobs a day, paid by the hour and by commission. */
function weekOf(people: number): PayWeekInput {
  const at = (day: number, hour: number) => new Date(Date.UTC(2026, 4, 11 + day, hour)).toISOString();
  const ids = Array.from({ length: people }, (_, n) => `person-${n}`);
  const days = [0, 1, 2, 3, 4];
  const hours = [12, 14, 16, 18];
  return {
    startsAt: at(0, 4),
    endsAt: at(7, 4),
    zone: 'America/New_York',
    clock: '24',
    rules: {
      ...{ overtimeRuleSet: 'us_federal', minimumWage: '7.25', crewSplit: 'equal', mealBreakMinutes: 30 },
      ...{ punchRoundingMinutes: null, premiumRounding: 'half_up' },
    },
    people: ids.map((id) => ({ id, name: id })),
    entries: ids.flatMap((personId) =>
      days.flatMap((day) =>
        hours.map((hour) => ({
          id: `${personId}-${day}-${hour}`,
          personId,
          kind: 'job' as const,
          visitId: `visit-${personId}-${day}-${hour}`,
          startedAt: at(day, hour),
          endedAt: at(day, hour + 2),
          interrupted: false,
        })),
      ),
    ),
    rates: [
      {
        id: 'hourly',
        kind: 'hourly',
        personId: null,
        serviceId: null,
        clockKind: null,
        value: '19.5',
        startsOn: '2026-01-01',
      },
      {
        id: 'percent',
        kind: 'commission_percent',
        personId: null,
        serviceId: null,
        clockKind: null,
        value: '6',
        startsOn: '2026-01-01',
      },
    ],
    doneLines: ids.flatMap((personId, n) =>
      days.flatMap((day) =>
        hours.map((hour) => ({
          lineId: `line-${personId}-${day}-${hour}`,
          jobId: `job-${personId}-${day}-${hour}`,
          jobNumber: n * 100 + day * 10 + hour,
          visitId: `visit-${personId}-${day}-${hour}`,
          serviceId: 'polish',
          serviceName: 'One-step polish',
          sizeClass: 'sedan' as const,
          isAddOn: false,
          commissionableCents: 26_500,
          doneAt: at(day, hour + 1),
          crew: [{ personId, position: 0, weight: 1, isTrainee: false, minutes: 120 }],
        })),
      ),
    ),
    tips: [],
    adjustments: [],
    plans: [],
    places: [],
    carried: [],
    asOf: at(8, 12),
  };
}
