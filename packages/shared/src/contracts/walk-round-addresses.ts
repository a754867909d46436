import { addressOf } from './address.ts';
import type * as walkRound from './walk-round.contract.ts';

/** What the walk-round's pages ask for; a test holds each to its contract. */
export const getWalkSheetAt = addressOf<typeof walkRound.getWalkSheet>('get', '/api/visits/:id/walk-round');
export const postWalkRoundAt = addressOf<typeof walkRound.postWalkRound>('post', '/api/visits/:id/walk-round');
export const postWalkAdditionAt = addressOf<typeof walkRound.postWalkAddition>(
  'post',
  '/api/visits/:id/walk-round/additions',
);
export const postPhotoAt = addressOf<typeof walkRound.postPhoto>('post', '/api/visits/:id/photos');
export const putPhotoPieceAt = addressOf<typeof walkRound.putPhotoPiece>('put', '/api/photos/:id/bytes');
