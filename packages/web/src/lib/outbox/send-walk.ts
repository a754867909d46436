import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import type {
  WalkPhotoDto,
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
import type { KeptPress } from './store.ts';
import { fileOf } from './drafts.ts';

/** From which byte a photo goes on; asked of the server when this run of the app does not know. */
const offsets = new Map<string, number>();

/** Sends a walk-round, an addition, or the next piece of a photo. @returns whether there is more of it to send */
export async function sendWalk(kept: KeptPress): Promise<boolean> {
  const params = { id: kept.targetId };
  if (kept.path === 'walk') {
    await call(postWalkRoundAt, { params, body: kept.body as RequestOf<typeof postWalkRound>['body'] });
    return false;
  }
  if (kept.path === 'walk_addition') {
    await call(postWalkAdditionAt, { params, body: kept.body as RequestOf<typeof postWalkAddition>['body'] });
    return false;
  }
  return sendPiece(kept);
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
    return isUnfinished(answer.photo);
  } catch (error) {
    if (!(error instanceof ApiError) || error.code !== 'offset') {
      offsets.delete(kept.key);
      throw error;
    }
    // An answer was lost on the way: the server says what it has.
    return isUnfinished(error.hint.current as WalkPhotoDto);
  }
}

async function announce(kept: KeptPress): Promise<number | 'stored'> {
  const body = kept.body as RequestOf<typeof postPhoto>['body'];
  const { photo } = await call(postPhotoAt, { params: { id: kept.targetId }, body });
  if (!isUnfinished(photo)) return 'stored';
  return photo.receivedBytes;
}

function isUnfinished({ id, isStored, receivedBytes }: WalkPhotoDto): boolean {
  if (isStored) offsets.delete(id);
  else offsets.set(id, receivedBytes);
  return !isStored;
}
