/** An entry open longer than this was forgotten: flagged, never ended by guess, and no time until somebody settles it. */
export const FORGOTTEN_AFTER_HOURS = 14;

export function isForgotten(startedAt: string, endedAt: string | null, now: string): boolean {
  return endedAt === null && Date.parse(now) - Date.parse(startedAt) > FORGOTTEN_AFTER_HOURS * 3_600_000;
}
