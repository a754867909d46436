import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import type {
  WalkPhotoDto,
  WalkSheetDto,
  postPhoto,
  postWalkAddition,
  postWalkRound,
} from '@driprail/shared/contracts/walk-round.contract';
import {
  postPhotoAt,
  postWalkAdditionAt,
  postWalkRoundAt,
  putPhotoPieceAt,
} from '@driprail/shared/contracts/walk-round-addresses';
import { PIECE_BYTES } from '@driprail/shared/domain/walk-round/photo-limits';
import { ApiError, call } from '../call.ts';
import { changeCopies } from './keep-answer.ts';
import type { KeptPress } from './store.ts';
import { fileOf } from './drafts.ts';

/** From which byte a photo goes on; asked of the server when this run of the app does not know. */
const offsets = new Map<string, number>();

/** Sends a walk-round, an addition, or the next piece of a photo. @returns whether there is more of it to send */
export async function sendWalk(kept: KeptPress): Promise<boolean> {
  const params = { id: kept.targetId };
  if (kept.path === 'walk') {
    const body = kept.body as RequestOf<typeof postWalkRound>['body'];
    await keepSheet(kept, (await call(postWalkRoundAt, { params, body })).sheet);
    return false;
  }
  if (kept.path === 'walk_addition') {
    const body = kept.body as RequestOf<typeof postWalkAddition>['body'];
    await keepSheet(kept, (await call(postWalkAdditionAt, { params, body })).sheet);
    return false;
  }
  return sendPiece(kept);
}

function keepSheet({ userId, targetId }: KeptPress, sheet: WalkSheetDto): Promise<void> {
  return changeCopies(`${userId}:walk-round:${targetId}`, () => sheet);
}

/** A photo that has arrived whole no longer waits: the copy has to show it. */
function keepPhoto({ userId, targetId, body }: KeptPress, photo: WalkPhotoDto): Promise<void> {
  return changeCopies(`${userId}:walk-round:${targetId}`, (value) => {
    const cars = value['cars'] as WalkSheetDto['cars'];
    const isHere = (car: WalkSheetDto['cars'][number]) =>
      car.vehicleId === body['vehicleId'] && !car.photos.some((one) => one.id === photo.id);
    return { ...value, cars: cars.map((car) => (isHere(car) ? { ...car, photos: [...car.photos, photo] } : car)) };
  });
}

async function sendPiece(kept: KeptPress): Promise<boolean> {
  const offset = offsets.get(kept.key) ?? (await announce(kept));
  if (offset === 'stored') return false;
  const photo = await fileOf(kept.key);
  if (!photo) throw new ApiError(422, 'lost', 'The photo is no longer on this phone. Take it again.');
  try {
    const answer = await call(putPhotoPieceAt, {
      params: { id: kept.key },
      query: { offset: String(offset) },
      body: photo.slice(offset, offset + PIECE_BYTES),
    });
    return hasMore(kept, answer.photo);
  } catch (error) {
    if (!(error instanceof ApiError) || error.code !== 'offset') {
      offsets.delete(kept.key);
      throw error;
    }
    // An answer was lost on the way: the server says what it has.
    return hasMore(kept, error.hint.current as WalkPhotoDto);
  }
}

async function announce(kept: KeptPress): Promise<number | 'stored'> {
  const body = kept.body as RequestOf<typeof postPhoto>['body'];
  const { photo } = await call(postPhotoAt, { params: { id: kept.targetId }, body });
  if (!(await hasMore(kept, photo))) return 'stored';
  return photo.receivedBytes;
}

async function hasMore(kept: KeptPress, photo: WalkPhotoDto): Promise<boolean> {
  if (!photo.isStored) offsets.set(photo.id, photo.receivedBytes);
  else {
    offsets.delete(photo.id);
    await keepPhoto(kept, photo);
  }
  return !photo.isStored;
}
