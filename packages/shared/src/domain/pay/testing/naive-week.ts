import type { PayWeekInput } from '../pay-week.types.ts';

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

const MINUTE = 60_000;

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

function workedMinutes(input: PayWeekInput, personId: string): bigint {
  let count = 0n;
  for (const entry of input.entries) {
    const from = Date.parse(entry.startedAt);
    const to = Date.parse(entry.endedAt ?? entry.startedAt);
    const isOff =
      entry.kind === 'meal_break' && !entry.interrupted && to - from >= input.rules.mealBreakMinutes * MINUTE;
    if (entry.personId !== personId || isOff) continue;
    for (let at = from; at < to; at += MINUTE)
      if (at >= Date.parse(input.startsAt) && at < Date.parse(input.endsAt)) count += 1n;
  }
  return count;
}

type Crew = PayWeekInput['doneLines'][number]['crew'];

/** Cents handed out one at a time to whoever is furthest below the exact share, the earlier in the crew first. */
function part(whole: bigint, crew: Crew, personId: string, input: PayWeekInput): bigint {
  const split = input.rules.crewSplit;
  let weights = crew.map((one) => BigInt(split === 'equal' ? 1 : split === 'weights' ? one.weight : one.minutes));
  let total = weights.reduce((sum, weight) => sum + weight, 0n);
  if (total === 0n) weights = crew.map(() => 1n);
  total = weights.reduce((sum, weight) => sum + weight, 0n);
  if (total === 0n) return 0n;
  const parts = weights.map((weight) => (whole * weight) / total);
  for (let left = whole - parts.reduce((sum, one) => sum + one, 0n); left > 0n; left -= 1n) {
    let next = 0;
    const lack = (index: number): bigint => whole * (weights[index] ?? 0n) - (parts[index] ?? 0n) * total;
    for (let index = 1; index < parts.length; index += 1) if (lack(index) > lack(next)) next = index;
    parts[next] = (parts[next] ?? 0n) + 1n;
  }
  return parts[crew.findIndex((one) => one.personId === personId)] ?? 0n;
}

function halfUp(numerator: bigint, denominator: bigint): bigint {
  return (2n * numerator + denominator) / (2n * denominator);
}

function hundredths(decimal: string): bigint {
  const [whole = '0', fraction = ''] = decimal.split('.');
  return BigInt(whole) * 100n + BigInt(fraction.padEnd(2, '0'));
}
