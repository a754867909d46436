/** Why a crew goes back to put something right. */
export const callBackCauses = ['missed_spot', 'streaks', 'came_back', 'damage', 'left_something', 'other'] as const;
export type CallBackCause = (typeof callBackCauses)[number];
export const callBackCauseNames: Record<CallBackCause, string> = {
  missed_spot: 'A spot was missed',
  streaks: 'Streaks or haze',
  came_back: 'It came back',
  damage: 'Something was damaged',
  left_something: 'Something was left behind',
  other: 'Something else',
};

/**
 * A call-back's minutes over its lines, by what the lines once took; each at least five, in steps of five.
 * @param total minutes of one person, at least five
 * @param usual minutes of the lines when they were first done
 */
export function callBackMinutes(total: number, usual: readonly number[]): number[] {
  const steps = Math.max(usual.length, Math.round(total / 5));
  const all = usual.reduce((sum, minutes) => sum + minutes, 0);
  const parts = usual.map((minutes) => Math.max(1, Math.floor((steps * minutes) / all)));
  // What is left over, or was given too much to keep everyone above nothing, falls to the largest.
  const largest = parts.indexOf(Math.max(...parts));
  const rest = steps - parts.reduce((sum, part) => sum + part, 0);
  return parts.map((part, index) => (index === largest ? Math.max(1, part + rest) : part) * 5);
}
