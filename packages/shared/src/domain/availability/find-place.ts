import { visitMinutes } from '../board/crew-time.ts';
import { estimateTravel } from '../board/travel.ts';
import { addMinutes, isBefore, minutesBetween, overlaps } from '../time/zone.ts';
import type { BusySpan, FoundPlace, FreeVan, Span, WantedWork } from './plan.ts';

/** Starts are promised on the clock's five minutes: common practice, no source. */
const STEP_MINUTES = 5;

/**
 * The van that can keep an arrival window with the least driving on top, and from when; null when none can. A place found
 * here is one that the board takes without a refusal, and without a warning but that of overtime.
 * @param window in which the crew arrives; work may end later
 * @param open the day's hours, in which all of the work lies
 */
export function findPlace(vans: readonly FreeVan[], work: WantedWork, window: Span, open: Span): FoundPlace | null {
  let best: FoundPlace | null = null;
  for (const van of vans) {
    const found = carries(van, work) ? earliestIn(van, work, window, open) : null;
    if (found && (!best || found.addedMinutes < best.addedMinutes)) best = found;
  }
  return best;
}

function carries({ equipment }: FreeVan, work: WantedWork): boolean {
  return (
    work.equipment.every((tool) => equipment.includes(tool)) &&
    (!work.bringsWater || equipment.includes('water_tank')) &&
    (!work.bringsPower || equipment.includes('generator'))
  );
}

/** A start is tried at each moment at which something changes: the window or the day opens, a crew begins, a stop ends. */
function earliestIn(van: FreeVan, work: WantedWork, window: Span, open: Span): FoundPlace | null {
  const moments = [
    window.from,
    open.from,
    ...van.crew.map((person) => person.from),
    ...van.busy.map((stop) => addMinutes(stop.to, estimateTravel(stop.place, work.place).minutes)),
  ];
  const starts = [...new Set(moments.map(onStep))]
    .filter((start) => !isBefore(start, window.from) && !isBefore(window.to, start))
    .sort();
  for (const from of starts) {
    const found = placeAt(van, work, from, open);
    if (found) return found;
  }
  return null;
}

function placeAt(van: FreeVan, work: WantedWork, from: string, open: Span): FoundPlace | null {
  if (isBefore(from, open.from)) return null;
  // More hands are quicker, and quicker work may be within the hours of more hands: the largest crew that stays is asked first.
  const there = van.crew.filter((person) => !isBefore(from, person.from) && isBefore(from, person.to));
  for (let size = there.filter((person) => !person.isTrainee).length; size >= 1; size -= 1) {
    const to = addMinutes(from, visitMinutes(work.lineMinutes, size));
    const staying = there.filter((person) => !person.isTrainee && !isBefore(person.to, to));
    if (staying.length < size || isBefore(open.to, to)) continue;
    if (!work.skills.every((skill) => staying.some((person) => person.skills.includes(skill)))) continue;
    const addedMinutes = drivingAdded(van.busy, work, { from, to });
    return addedMinutes === null ? null : { vanId: van.id, from, to, addedMinutes };
  }
  return null;
}

/** Null when the stops before and after leave no time to drive. */
function drivingAdded(busy: readonly BusySpan[], work: WantedWork, span: Span): number | null {
  if (busy.some((stop) => overlaps(stop, span))) return null;
  const before = busy
    .filter((stop) => !isBefore(span.from, stop.to))
    .sort((a, b) => Date.parse(b.to) - Date.parse(a.to))[0];
  const after = busy
    .filter((stop) => !isBefore(stop.from, span.to))
    .sort((a, b) => Date.parse(a.from) - Date.parse(b.from))[0];
  const there = before ? estimateTravel(before.place, work.place).minutes : 0;
  const on = after ? estimateTravel(work.place, after.place).minutes : 0;
  if (before && minutesBetween(before.to, span.from) < there) return null;
  if (after && minutesBetween(span.to, after.from) < on) return null;
  const direct = before && after ? estimateTravel(before.place, after.place).minutes : 0;
  return there + on - direct;
}

function onStep(instant: string): string {
  const step = STEP_MINUTES * 60_000;
  return new Date(Math.ceil(Date.parse(instant) / step) * step).toISOString();
}
