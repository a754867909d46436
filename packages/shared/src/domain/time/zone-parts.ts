const formats = new Map<string, Intl.DateTimeFormat>();

/** Making a format costs far more than using it, so each zone keeps its own. */
function formatOf(zone: string): Intl.DateTimeFormat {
  let format = formats.get(zone);
  if (!format) {
    format = new Intl.DateTimeFormat('en-US', {
      ...{ timeZone: zone, hourCycle: 'h23', year: 'numeric' },
      ...{ month: '2-digit', day: '2-digit', hour: '2-digit', minute: '2-digit' },
    });
    formats.set(zone, format);
  }
  return format;
}

/** What the calendar and the clock on the wall of a zone say at an instant; null for what is no instant. */
export function partsIn(instant: string, zone: string): { day: string; clock: string } | null {
  const time = Date.parse(instant);
  if (Number.isNaN(time)) return null;
  const parts = Object.fromEntries(
    formatOf(zone)
      .formatToParts(time)
      .map(({ type, value }) => [type, value]),
  );
  return {
    day: `${parts['year']}-${parts['month']}-${parts['day']}`,
    clock: `${parts['hour']}:${parts['minute']}`,
  };
}
