import type { PayWeekInput } from '../pay-week.types.ts';
import { halfUp, hundredths, part, workedMinutes } from './naive-arithmetic.ts';

/*
 * A second, independent calculation of a federal week for tests: minutes are counted one by one and all arithmetic is
 * on plain big integers. It shares no code with the engine and covers the weeks of random-weeks.ts only: one rate of
 * each kind for everybody, entries to the minute that do not overlap.
 */

export interface NaiveWeek {
  minutes: bigint;
  included: bigint;
  makeUp: bigint;
  premium: bigint;
  tips: bigint;
  gross: bigint;
}

export function naiveWeek(input: PayWeekInput, personId: string): NaiveWeek {
  const minutes = workedMinutes(input, personId);
  const rate = (kind: string): bigint => hundredths(input.rates.find((item) => item.kind === kind)?.value ?? '0');
  const hourly = halfUp(minutes * rate('hourly'), 60n);
  const jobs = input.doneLines.reduce((total, line) => {
    const commission = halfUp(BigInt(line.commissionableCents) * rate('commission_percent'), 10_000n);
    return (
      total +
      part(
        commission,
        line.crew.filter((one) => !one.isTrainee),
        personId,
        input,
      ) +
      part(
        rate('flat_service'),
        line.crew.filter((one) => !one.isTrainee),
        personId,
        input,
      )
    );
  }, 0n);
  const own = input.adjustments.filter((item) => item.personId === personId);
  const sumOf = (kind: string): bigint =>
    own.filter((item) => item.kind === kind).reduce((total, item) => total + BigInt(item.amountCents), 0n);
  const included = hourly + jobs + sumOf('bonus');
  const floor = hundredths(input.rules.minimumWage) * minutes;
  const makeUp = floor > included * 60n ? (floor - included * 60n + 59n) / 60n : 0n;
  const total = included + makeUp;
  const over = minutes > 2400n ? minutes - 2400n : 0n;
  const premium = minutes === 0n ? 0n : halfUp(total * over, 2n * minutes);
  const counted = minutes > 2400n ? 2400n : minutes;
  const room = minutes === 0n ? total : ((total * 60n - floor) * counted) / (minutes * 60n);
  const wanted = -sumOf('deduction');
  const tips = input.tips
    .filter((tip) => !tip.alreadyReceived)
    .reduce((sum, tip) => sum + part(BigInt(tip.amountCents), tip.crew, personId, input), 0n);
  const taken = wanted < room ? wanted : room;
  return { minutes, included, makeUp, premium, tips, gross: total + premium + tips + sumOf('reimbursement') - taken };
}
