import type { PayWeekInput } from '../pay-week.types.ts';
import type { PlanBase, PlanExtras } from '../plans/pay-plan.ts';
import { halfUp, hundredths, part, workedMinutes } from './naive-arithmetic.ts';

/*
 * A second, independent calculation of a week under a plan, federal rules alone, without agreements, tiers by the month
 * or a draw carried in: by hand from the rules named at each plan in docs/pay.md, on plain big integers.
 */

export interface NaivePlanWeek {
  included: bigint;
  makeUp: bigint;
  premium: bigint;
  /** The percentage of all earnings, outside the rate. */
  beside: bigint;
}

const KINDS = ['travel', 'waiting', 'shop', 'training', 'rest_break', 'meal_break'] as const;

export function naivePlanWeek(
  input: PayWeekInput,
  personId: string,
  base: PlanBase,
  { percentOfTotal, flats }: Pick<PlanExtras, 'percentOfTotal' | 'flats'>,
): NaivePlanWeek {
  const minutes = workedMinutes(input, personId);
  const onJobs = workedMinutes(input, personId, (kind) => kind === 'job');
  const byHour = (rate: string, count: bigint): bigint => halfUp(count * hundredths(rate), 60n);
  const commission = (percent: string): bigint =>
    shared(input, personId, (line) => halfUp(BigInt(line.commissionableCents) * hundredths(percent), 10_000n));
  const flat = hundredths(flats[0]?.amount ?? '0');
  const flatLines = shared(input, personId, () => flat);
  const beside = (hourly: string): bigint =>
    KINDS.reduce(
      (sum, kind) =>
        sum +
        byHour(
          hourly,
          workedMinutes(input, personId, (one) => one === kind),
        ),
      0n,
    );
  const upTo = (promised60: bigint, earned: bigint): bigint => {
    const lack = promised60 - earned * 60n;
    return lack > 0n ? (lack + 59n) / 60n : 0n;
  };
  let included: bigint;
  let notWorked = { over: 0n, by: 1n };
  switch (base.kind) {
    case 'hourly':
      included = byHour(base.hourly, minutes) + flatLines;
      break;
    case 'hourly_plus_percent':
      included = byHour(base.hourly, minutes) + commission(base.percent) + flatLines;
      break;
    case 'flat_with_floor':
      included = flatLines + upTo(hundredths(base.floor) * onJobs, flatLines) + beside(base.other.hourly);
      break;
    case 'percent_with_floor': {
      const earned = commission(base.percent);
      included = earned + upTo(hundredths(base.floor) * onJobs, earned) + beside(base.other.hourly) + flatLines;
      break;
    }
    case 'weekly_guarantee': {
      const earned = byHour(base.hourly, minutes) + commission(base.percent);
      included = earned + upTo(hundredths(base.weekly) * 60n, earned) + flatLines;
      break;
    }
    case 'better_of': {
      const [hour, sale] = [byHour(base.hourly, minutes), commission(base.percent) + beside(base.other.hourly)];
      included = (sale > hour ? sale : hour) + flatLines;
      break;
    }
    case 'draw': {
      const earned = commission(base.percent);
      const draw = hundredths(base.weekly);
      const isPaid = minutes > 0n || earned > 0n;
      included = (isPaid && draw > earned ? draw : earned) + beside(base.other.hourly) + flatLines;
      break;
    }
    case 'salary': {
      const weekly = base.period === 'weekly' ? [1n, 1n] : [12n, 52n];
      const [times = 1n, over = 1n] = weekly;
      const covers = BigInt(base.coversHours) * 60n;
      const salary = hundredths(base.amount) * times;
      const beyond = (count: bigint): bigint => halfUp(salary * count, over * covers);
      const threshold = covers > 2400n ? covers : 2400n;
      const overForty = minutes > threshold ? minutes - threshold : 0n;
      const past = minutes > covers ? minutes - covers : 0n;
      included = halfUp(salary, over) + beyond(past - overForty) + beyond(overForty) + flatLines;
      if (covers > minutes) notWorked = { over: salary * (covers - minutes), by: over * covers };
      break;
    }
    case 'day_rate':
      included = hundredths(base.daily) * workedDays(input, personId) + flatLines;
      break;
    case 'job_rate': {
      const visits = new Map(input.doneLines.map((line) => [line.visitId, line]));
      const jobs = [...visits.values()].reduce(
        (sum, line) =>
          sum +
          part(
            hundredths(base.perJob),
            line.crew.filter((one) => !one.isTrainee),
            personId,
            input,
          ),
        0n,
      );
      included = jobs + beside(base.other.hourly) + flatLines;
      break;
    }
    default:
      throw new Error(`no second calculation of ${base.kind}`);
  }
  const makeUp = upTo(hundredths(input.rules.minimumWage) * minutes, included);
  const total = included + makeUp;
  const over = minutes > 2400n ? minutes - 2400n : 0n;
  const premium = minutes === 0n ? 0n : premiumOf(total, notWorked, minutes, over, hundredths(input.rules.minimumWage));
  const percent = percentOfTotal === null ? 0n : halfUp((total + premium) * hundredths(percentOfTotal), 10_000n);
  return { included, makeUp, premium, beside: percent };
}

/** Half the rate for each minute over 40 h; the rate is what counts less pay for time not worked, at least the minimum wage. */
function premiumOf(
  total: bigint,
  notWorked: { over: bigint; by: bigint },
  minutes: bigint,
  over: bigint,
  minimum: bigint,
): bigint {
  const counted = total * notWorked.by - notWorked.over;
  const isRaised = counted * 60n < minimum * minutes * notWorked.by;
  if (isRaised) return halfUp(minimum * over, 120n);
  return halfUp(counted * over, 2n * minutes * notWorked.by);
}

type Line = PayWeekInput['doneLines'][number];

function shared(input: PayWeekInput, personId: string, whole: (line: Line) => bigint): bigint {
  return input.doneLines.reduce(
    (sum, line) =>
      sum +
      part(
        whole(line),
        line.crew.filter((one) => !one.isTrainee),
        personId,
        input,
      ),
    0n,
  );
}

/** Calendar days of the zone with a worked minute. */
function workedDays(input: PayWeekInput, personId: string): bigint {
  const format = new Intl.DateTimeFormat('en-CA', { timeZone: input.zone, dateStyle: 'short' });
  const days = new Set<string>();
  for (const entry of input.entries) {
    const one = { ...input, entries: [entry] };
    if (workedMinutes(one, personId) === 0n) continue;
    const from = Math.max(Date.parse(entry.startedAt), Date.parse(input.startsAt));
    const to = Math.min(Date.parse(entry.endedAt ?? entry.startedAt), Date.parse(input.endsAt));
    for (let at = from; at < to; at += 60_000) days.add(format.format(at));
  }
  return BigInt(days.size);
}
