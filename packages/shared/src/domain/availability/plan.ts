import type { Coordinates } from '../board/travel.ts';

/** Instants are ISO, spans half-open. */
export interface Span {
  from: string;
  to: string;
}

/** A stop that a van already has, or a place that somebody holds. */
export interface BusySpan extends Span {
  place: Coordinates | null;
}

export interface CrewSpan extends Span {
  skills: readonly string[];
  /** Adds no speed and no skill. */
  isTrainee: boolean;
}

export interface FreeVan {
  id: string;
  equipment: readonly string[];
  crew: readonly CrewSpan[];
  busy: readonly BusySpan[];
}

/** What is wanted, as far as a van's day has to fit it. */
export interface WantedWork {
  /** One-person minutes of each service. */
  lineMinutes: number[];
  skills: readonly string[];
  equipment: readonly string[];
  /** Asked by a service and not there at the place: the van has to bring it. */
  bringsWater: boolean;
  bringsPower: boolean;
  place: Coordinates | null;
}

/** A promise on Unplaced: some van still has to keep it. */
export interface OpenPromise extends WantedWork {
  window: Span;
}

export interface FoundPlace extends Span {
  vanId: string;
  /** Driving that this stop adds to the van's day, minutes. */
  addedMinutes: number;
}
