import type { MarkBody, WalkRoundBody } from '@driprail/shared/contracts/walk-round.contract';
import { bodyOf } from '@driprail/shared/domain/walk-round/body';
import type { PhotoView } from '@driprail/shared/domain/walk-round/views';
import type { ShownCar } from './shown-walk.ts';

/** A walk-round that is being made; the odometer as it was typed. */
export type WalkDraft = Omit<
  WalkRoundBody,
  'key' | 'deviceAt' | 'offsetMs' | 'vehicleId' | 'odometer' | 'photoViews'
> & {
  odometer: string;
};

/** Where a car's walk-round begins: from what was finished before, else from nothing. */
export function beginDraft(car: ShownCar): WalkDraft {
  const { walkRound } = car;
  if (!walkRound) return emptyDraft(car);
  const { body, paint, interior, hasItems, itemsNote, mayMove, isTooDirty, missingReason, absentReason, initials } =
    walkRound;
  return {
    ...{ body, paint, interior, hasItems, itemsNote, mayMove, isTooDirty, missingReason, absentReason, initials },
    odometer: walkRound.odometer === null ? '' : String(walkRound.odometer),
    marks: walkRound.marks.map(({ isAddition: _added, at: _at, by: _by, ...mark }): MarkBody => mark),
  };
}

function emptyDraft(car: ShownCar): WalkDraft {
  return {
    body: bodyOf(car.sizeClass, car.vehicle),
    ...{ paint: null, interior: null, odometer: '', hasItems: null, itemsNote: '', mayMove: null, isTooDirty: false },
    ...{ missingReason: '', absentReason: '', initials: null, marks: [] },
  };
}

/** Whole numbers, also with commas; null for nothing, undefined for what is none. */
export function readOdometer(text: string): number | null | undefined {
  const digits = text.replace(/[,\s]/g, '');
  if (digits === '') return null;
  return /^\d{1,7}$/.test(digits) ? Number(digits) : undefined;
}

/** The photos of the car as it came, from this phone and from others. */
export function viewsTaken(car: ShownCar): { id: string; view: PhotoView }[] {
  return car.photos.filter(({ moment }) => moment === 'before').map(({ id, view }) => ({ id, view }));
}
