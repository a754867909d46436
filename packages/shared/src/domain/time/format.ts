import { partsIn } from './zone-parts.ts';

export type ClockStyle = '12' | '24';

/** "10:42 am" or "10:42". */
export function formatClock(instant: string, zone: string, style: ClockStyle): string {
  const clock = partsIn(instant, zone)?.clock ?? '';
  if (style === '24' || clock === '') return clock;
  const hour = Number(clock.slice(0, 2));
  return `${hour % 12 || 12}${clock.slice(2)} ${hour < 12 ? 'am' : 'pm'}`;
}

/** "10:00 to 11:30 am", the shared half of the day said once. */
export function formatSpan(from: string, to: string, zone: string, style: ClockStyle): string {
  const start = formatClock(from, zone, style);
  const end = formatClock(to, zone, style);
  const half = start.slice(-3);
  return style === '12' && end.endsWith(half) ? `${start.slice(0, -3)} to ${end}` : `${start} to ${end}`;
}

/** "10:00–11:30", for a lane whose hours already say am or pm. */
export function formatBareSpan(from: string, to: string, zone: string, style: ClockStyle): string {
  const bare = (instant: string) => formatClock(instant, zone, style).replace(/ [ap]m$/, '');
  return `${bare(from)}–${bare(to)}`;
}

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const WEEKDAYS = ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat'];

/** "Thu 14 May" is the look's word order; a US company reads "Thu May 14". */
export function formatDay(day: string): string {
  const date = new Date(`${day}T00:00:00Z`);
  return `${WEEKDAYS[date.getUTCDay()]} ${MONTHS[date.getUTCMonth()]} ${date.getUTCDate()}`;
}

/** "May 14, 2026". */
export function formatDate(day: string): string {
  const date = new Date(`${day}T00:00:00Z`);
  return `${MONTHS[date.getUTCMonth()]} ${date.getUTCDate()}, ${date.getUTCFullYear()}`;
}

/** "2 h 15", "45 min". */
export function formatMinutes(total: number): string {
  const sign = total < 0 ? '−' : '';
  const minutes = Math.abs(Math.round(total));
  const hours = Math.floor(minutes / 60);
  const rest = minutes % 60;
  if (hours === 0) return `${sign}${rest} min`;
  return rest === 0 ? `${sign}${hours} h` : `${sign}${hours} h ${String(rest).padStart(2, '0')}`;
}
