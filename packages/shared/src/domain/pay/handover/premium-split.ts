import { exact, ZERO } from '../../money/exact.ts';
import { toCents } from '../../money/rounding.ts';
import { halfTimeOnAmount, halfTimePremium, hoursOver } from '../regular-rate.ts';
import type { PersonWeek } from '../pay-week.types.ts';

export interface PremiumSplit {
  /** Qualified overtime: the half that 29 USC 207 requires for hours over 40 in the week. Cents. */
  flsaCents: number;
  /** What a place's own rules add: daily overtime, the second half of double time. Cents. */
  stateOnlyCents: number;
}

export interface PremiumFacts {
  /** Whether the federal rule alone held for the person, so that every premium is its half. */
  isFederalOnly: boolean;
  /** Exact hours of the workweeks over which a settled commission is spread, by the settlement line's key. */
  settledHours: (settlementKey: string) => readonly string[];
}

/**
 * Splits a person's overtime premium of a week for year-end reporting (26 USC 225, IRS FS-2026-01): only the half at
 * the regular rate for hours over 40 is qualified, never state daily overtime nor the rest of a double rate.
 * @param week locked lines with the exact hours and regular rate they were worked out from
 */
export function premiumSplit(
  { hoursWorked, regularRate, lines }: Pick<PersonWeek, 'hoursWorked' | 'regularRate' | 'lines'>,
  { isFederalOnly, settledHours }: PremiumFacts,
): PremiumSplit {
  const split: PremiumSplit = { flsaCents: 0, stateOnlyCents: 0 };
  const put = (amountCents: number, requiredCents: number): void => {
    const flsaCents = isFederalOnly ? amountCents : Math.min(amountCents, requiredCents);
    split.flsaCents += flsaCents;
    split.stateOnlyCents += amountCents - flsaCents;
  };
  for (const line of lines) {
    if (line.kind === 'overtime_premium') {
      const rate = regularRate === null ? ZERO : exact(regularRate);
      put(line.amountCents, toCents(halfTimePremium(rate, hoursOver(exact(hoursWorked)))));
    } else if (line.kind === 'settlement_premium') {
      const key = line.key.replace('settlement_premium', 'commission_settlement');
      const settled = lines.find((other) => other.key === key)?.amountCents ?? 0;
      put(line.amountCents, requiredOnSettled(settled, settledHours(key)));
    }
  }
  return split;
}

/** An equal part of the settlement to each workweek, half time on it for the hours over 40 (29 CFR 778.120(a)(1)). */
function requiredOnSettled(settledCents: number, weeks: readonly string[]): number {
  const part = weeks.length === 0 ? ZERO : exact(settledCents).div(100).div(weeks.length);
  const extras = weeks.map((hours) => halfTimeOnAmount(part, exact(hours), hoursOver(exact(hours))));
  return toCents(extras.reduce((total, extra) => total.add(extra), ZERO));
}
