import type { Coordinates } from './travel.ts';
import type { Progress } from './progress.ts';

/** The facts that the fit rules stand on; both the board's screen and the API fill them in. */
export interface PlannedVisit {
  id: string;
  jobId: string;
  jobNumber: number;
  stopId: string;
  addressId: string;
  vanId: string | null;
  from: string | null;
  to: string | null;
  minutes: number;
  progress: Progress;
  customerName: string;
  place: Coordinates | null;
  windowFrom: string | null;
  windowTo: string | null;
  skills: string[];
  equipment: string[];
  /** Asked by the services, and not there at the place: the van has to bring it. */
  bringsWater: boolean;
  bringsPower: boolean;
}

export interface RidingPerson {
  personId: string;
  name: string;
  skills: string[];
  isTrainee: boolean;
  from: string;
  to: string;
  /** Minutes worked this workweek so far, plus what is still planned in it, this day included. */
  weekMinutes: number;
}

export interface PlannedVan {
  id: string;
  name: string;
  equipment: string[];
  crew: RidingPerson[];
}

export interface BoardFacts {
  day: string;
  zone: string;
  /** How the company writes clock times in what it says. */
  clock: '12' | '24';
  dayStartsAt: string;
  dayEndsAt: string;
  /** Days of a locked pay week can't be planned. */
  isLocked: boolean;
  overtimeAfterMinutes: number;
  vans: PlannedVan[];
  /** All visits with a van on this day. */
  visits: PlannedVisit[];
}

/** Where a visit should go. No van or no time means back to Unplaced. */
export interface Move {
  visitId: string;
  vanId: string | null;
  from: string | null;
  to: string | null;
  /** Puts the visit at another visit's parking place, so that both may run side by side. */
  stopId?: string | undefined;
}
