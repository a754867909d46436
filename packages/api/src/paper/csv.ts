import { stringify } from 'csv-stringify/sync';
import { exact } from '@driprail/shared/domain/money/exact';
import { decimalText } from '@driprail/shared/domain/money/rounding';

/** A file of rows under named columns (RFC 4180). Free text must have gone through `harmless`. */
export function csvText(columns: readonly string[], rows: readonly (string | number)[][]): string {
  return stringify([[...columns], ...rows], { record_delimiter: 'windows' });
}

/** A spreadsheet must not take a name for a formula. */
export function harmless(text: string): string {
  return /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
}

/** Integer cents as a plain decimal: "-1234.50". */
export function plainCents(cents: number): string {
  return decimalText(exact(cents).div(100), 2);
}

/** An exact fraction to four places; empty for none. */
export function fourPlaces(fraction: string | null): string {
  return fraction === null ? '' : decimalText(exact(fraction), 4);
}
