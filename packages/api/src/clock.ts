export type Clock = () => Date;

/** The time now; started at `startAt` it runs on from there, for tests and pictures. */
export function createClock(startAt: string | null): Clock {
  if (!startAt) return () => new Date();
  const offset = Date.parse(startAt) - Date.now();
  return () => new Date(Date.now() + offset);
}
