/** The browser's list of time zones, with the one in use even where the list lacks it. */
export function zoneNames(current: string): string[] {
  const all = Intl.supportedValuesOf('timeZone');
  return all.includes(current) ? all : [current, ...all];
}
