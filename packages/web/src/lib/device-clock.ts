/**
 * Device time minus server time at the last contact, milliseconds; sent with every press, so that a wrong phone clock
 * is recognised. It outlives the app: a phone that starts in a dead zone still knows.
 */
const KEY = 'driprail-clock-offset';
let offset = Number(localStorage.getItem(KEY) ?? '0') || 0;

/** Called with each answer's server time. Under a second is the way there and back, not a wrong clock. */
export function noteServerTime(now: string | null): void {
  if (!now) return;
  const difference = Date.now() - Date.parse(now);
  if (!Number.isFinite(difference)) return;
  offset = Math.abs(difference) < 1000 ? 0 : Math.round(difference);
  localStorage.setItem(KEY, String(offset));
}

export function deviceOffsetMs(): number {
  return offset;
}

/** The server's time now, as this device reckons it. */
export function serverNow(): Date {
  return new Date(Date.now() - offset);
}
