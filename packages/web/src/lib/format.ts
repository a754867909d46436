import { useMemo } from 'react';
import { centsText, decimalText } from '@driprail/shared/domain/money/rounding';
import { exact } from '@driprail/shared/domain/money/exact';
import { KM_PER_MILE } from '@driprail/shared/domain/board/travel';
import { formatBareSpan, formatClock, formatSpan } from '@driprail/shared/domain/time/format';
import { useSession } from './session.tsx';

/** Two decimals, a true minus, no sign of the currency. */
export function money(cents: number): string {
  return centsText(cents).replace('-', '−');
}

/** Exact hours as "8:05", minutes half up. */
export function hoursMinutes(hours: string): string {
  const minutes = Number(decimalText(exact(hours).mul(60), 0));
  const sign = minutes < 0 ? '−' : '';
  return `${sign}${Math.floor(Math.abs(minutes) / 60)}:${String(Math.abs(minutes) % 60).padStart(2, '0')}`;
}

/** Clock times and distances as the company writes them. */
export function useFormats() {
  const { zone, clock, units } = useSession().company;
  return useMemo(
    () => ({
      zone,
      clock: (instant: string) => formatClock(instant, zone, clock),
      span: (from: string, to: string) => formatSpan(from, to, zone, clock),
      bareSpan: (from: string, to: string) => formatBareSpan(from, to, zone, clock),
      distance: (kilometers: number) =>
        units === 'us' ? `${(kilometers / KM_PER_MILE).toFixed(1)} mi` : `${kilometers.toFixed(1)} km`,
    }),
    [zone, clock, units],
  );
}

/** Typed dollars and cents to integer cents; null for what is no amount. */
export function parseMoney(text: string): number | null {
  const clean = text
    .trim()
    .replace(/[$,\s]/g, '')
    .replace('−', '-');
  if (!/^-?\d{1,7}(\.\d{1,2})?$/.test(clean)) return null;
  return Number(decimalText(exact(clean).mul(100), 0));
}
