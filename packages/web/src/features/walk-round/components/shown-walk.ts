import type {
  PhotoBody,
  WalkAdditionBody,
  WalkCarDto,
  WalkMarkDto,
  WalkPhotoDto,
  WalkRoundBody,
  WalkRoundDto,
  WalkSheetDto,
} from '@driprail/shared/contracts/walk-round.contract';
import type { Progress } from '@driprail/shared/domain/board/progress';
import { progressActions, takeStep } from '@driprail/shared/domain/board/progress';
import type { KeptPress } from '../../../lib/outbox/store.ts';

/** A photo as a screen shows it. */
export interface ShownPhoto extends WalkPhotoDto {
  /** Its picture waits on this phone. */
  isHere: boolean;
}

/** A car with what waits on this phone already in it. */
export interface ShownCar extends Omit<WalkCarDto, 'photos'> {
  photos: ShownPhoto[];
  /** Its walk-round is finished here, and waits to be sent. */
  isWaiting: boolean;
}

export interface ShownSheet extends Omit<WalkSheetDto, 'cars'> {
  cars: ShownCar[];
  hasBegun: boolean;
}

/** The sheet as it will be once what waits has been sent; the server judges it again then. */
export function withWaiting(sheet: WalkSheetDto, waiting: KeptPress[], by: string): ShownSheet {
  const own = waiting.filter((press) => press.targetId === sheet.visitId);
  return {
    ...sheet,
    hasBegun: hasBegun(sheet, own),
    cars: sheet.cars.map((car) =>
      withPresses(
        car,
        own.filter((press) => press.body['vehicleId'] === car.vehicleId),
        by,
      ),
    ),
  };
}

/** Where a mark goes back to when it is taken back, as far as it matters here. */
const back: Partial<Record<Progress, Progress>> = { working: 'on_site', part_done: 'working', done: 'working' };

function hasBegun({ progress }: WalkSheetDto, own: KeptPress[]): boolean {
  const after = own
    .filter(({ path }) => path === 'visit')
    .reduce((from, { body }) => {
      if (body['kind'] === 'undo') return back[from] ?? from;
      const action = progressActions.find((known) => known === body['kind']);
      const step = action && takeStep(from, action);
      return step?.ok ? step.to : from;
    }, progress);
  return after === 'working' || after === 'part_done' || after === 'done';
}

function withPresses(car: WalkCarDto, presses: KeptPress[], by: string): ShownCar {
  const finish = presses.filter(({ path }) => path === 'walk').at(-1);
  const walkRound = finish ? asRound(finish.body as unknown as WalkRoundBody, by) : car.walkRound;
  const additions = presses
    .filter(({ path }) => path === 'walk_addition')
    .map(({ body }) => body as unknown as WalkAdditionBody);
  return {
    ...car,
    isWaiting: finish !== undefined,
    walkRound: additions.reduce((round, addition) => (round ? withAddition(round, addition, by) : round), walkRound),
    photos: withLocal(car, presses, by),
  };
}

function asRound(
  { key, deviceAt, offsetMs: _offset, vehicleId: _vehicle, ...facts }: WalkRoundBody,
  by: string,
): WalkRoundDto {
  const marks = facts.marks.map((mark): WalkMarkDto => ({ ...mark, isAddition: false, at: deviceAt, by }));
  return { ...facts, id: key, marks, isLate: false, secondLook: null, at: deviceAt, by };
}

function withAddition(round: WalkRoundDto, addition: WalkAdditionBody, by: string): WalkRoundDto {
  const at = addition.deviceAt;
  if (addition.kind === 'second_look')
    return { ...round, secondLook: { outcome: addition.outcome, note: addition.note, at, by } };
  return { ...round, marks: [...round.marks, { ...addition.mark, isAddition: true, at, by }] };
}

function withLocal(car: WalkCarDto, presses: KeptPress[], by: string): ShownPhoto[] {
  const waiting = presses.filter(({ path }) => path === 'photo');
  const known = car.photos.map((photo) => ({ ...photo, isHere: waiting.some(({ key }) => key === photo.id) }));
  const local = waiting
    .filter(({ key }) => !known.some((photo) => photo.id === key))
    .map(({ key, body }): ShownPhoto => {
      const { vehicleId, view, moment, bytes, deviceAt } = body as unknown as PhotoBody;
      const picture = { width: null, height: null, isAddition: false, isStored: false, receivedBytes: 0 };
      return { id: key, vehicleId, view, moment, bytes, ...picture, at: deviceAt, by, isHere: true };
    });
  return [...known, ...local];
}
