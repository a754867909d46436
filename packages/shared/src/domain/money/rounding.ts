import { exact, type Exact } from './exact.ts';

/**
 * Rounds to a multiple of 1/10^places, halves away from zero (so a correction of -0.005 mirrors one of 0.005).
 * @returns the multiple, a whole number: 12.345 to 2 places is 1235n.
 */
export function roundHalfUp(value: Exact, places: number): bigint {
  const scale = 10n ** BigInt(places);
  const magnitude = (2n * value.n * scale + value.d) / (2n * value.d);
  return value.s < 0n ? -magnitude : magnitude;
}

/** Exact dollars to integer cents, half up. */
export function toCents(amount: Exact): number {
  return Number(roundHalfUp(amount, 2));
}

/** Exact dollars to integer cents, up: for what the law sets as a floor (DOL Fact Sheet #65). */
export function toCentsUp(amount: Exact): number {
  return Number(amount.mul(exact(100)).ceil().toFraction());
}

/** Exact dollars to integer cents, down: for the most that may be taken. */
export function toCentsDown(amount: Exact): number {
  return Number(amount.mul(exact(100)).floor().toFraction());
}

/** Decimal text with a fixed number of places, half up: "21.6090". */
export function decimalText(value: Exact, places: number): string {
  const scaled = roundHalfUp(value, places);
  const digits = (scaled < 0n ? -scaled : scaled).toString().padStart(places + 1, '0');
  const sign = scaled < 0n ? '-' : '';
  if (places === 0) return `${sign}${digits}`;
  return `${sign}${digits.slice(0, -places)}.${digits.slice(-places)}`;
}

/** At most four places, without trailing zeros: "42.25", "41.3333", "40". */
export function shortText(value: Exact): string {
  return decimalText(value, 4).replace(/\.?0+$/, '');
}

/** Integer cents as plain text, "1,012.24", with a minus sign before negative amounts. */
export function centsText(cents: number): string {
  const [whole = '', fraction = ''] = decimalText(exact(cents).div(100), 2).split('.');
  return `${whole.replace(/\B(?=(\d{3})+$)/g, ',')}.${fraction}`;
}
