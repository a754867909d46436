import type { ClockKind, PayWeekInput } from '../pay-week.types.ts';

/* Plain big integers for the second, independent calculations in tests; nothing here is shared with the engine. */

const MINUTE = 60_000;

/** Worked minutes inside the week, one by one. @param counts which kinds to count; all of them to begin with */
export function workedMinutes(
  input: PayWeekInput,
  personId: string,
  counts: (kind: ClockKind) => boolean = () => true,
): bigint {
  let count = 0n;
  for (const entry of input.entries) {
    const from = Date.parse(entry.startedAt);
    const to = Date.parse(entry.endedAt ?? entry.startedAt);
    const isOff =
      entry.kind === 'meal_break' && !entry.interrupted && to - from >= input.rules.mealBreakMinutes * MINUTE;
    if (entry.personId !== personId || isOff || !counts(entry.kind)) continue;
    for (let at = from; at < to; at += MINUTE)
      if (at >= Date.parse(input.startsAt) && at < Date.parse(input.endsAt)) count += 1n;
  }
  return count;
}

type Crew = PayWeekInput['doneLines'][number]['crew'];

/** Cents handed out one at a time to whoever is furthest below the exact share, the earlier in the crew first. */
export function part(whole: bigint, crew: Crew, personId: string, input: PayWeekInput): bigint {
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

export function halfUp(numerator: bigint, denominator: bigint): bigint {
  return (2n * numerator + denominator) / (2n * denominator);
}

export function hundredths(decimal: string): bigint {
  const [whole = '0', fraction = ''] = decimal.split('.');
  return BigInt(whole) * 100n + BigInt(fraction.padEnd(2, '0'));
}
