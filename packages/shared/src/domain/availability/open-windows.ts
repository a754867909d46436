import { findPlace } from './find-place.ts';
import type { FoundPlace, FreeVan, OpenPromise, Span, WantedWork } from './plan.ts';

/**
 * The vans' days once every promise on Unplaced is kept by some van: what is left may be offered. A promise that fits
 * nowhere takes nothing away; dispatch has to see to it.
 * @param hoursOf the open hours of the day that holds an instant
 */
export function keepPromises(
  vans: readonly FreeVan[],
  promises: readonly OpenPromise[],
  hoursOf: (instant: string) => Span,
): FreeVan[] {
  const kept = vans.map((van) => ({ ...van, busy: [...van.busy] }));
  for (const promise of promises) {
    const found = findPlace(kept, promise, promise.window, hoursOf(promise.window.from));
    if (found)
      kept.find((van) => van.id === found.vanId)?.busy.push({ from: found.from, to: found.to, place: promise.place });
  }
  return kept;
}

export interface OfferedWindow extends Span {
  /** Null where no van is free. */
  place: FoundPlace | null;
}

/** Which arrival windows of a day are truly free for this work. */
export function openWindows(
  vans: readonly FreeVan[],
  work: WantedWork,
  windows: readonly Span[],
  open: Span,
): OfferedWindow[] {
  return windows.map((window) => ({ ...window, place: findPlace(vans, work, window, open) }));
}
