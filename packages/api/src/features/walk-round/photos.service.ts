import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { PhotoBody, WalkPhotoDto } from '@driprail/shared/contracts/walk-round.contract';
import { walkPhotoDto } from '@driprail/shared/contracts/walk-round.contract';
import { isBefore } from '@driprail/shared/domain/time/zone';
import type { FileKind } from '@driprail/shared/domain/walk-round/jpeg';
import { kindOfFile, readJpeg } from '@driprail/shared/domain/walk-round/jpeg';
import { PHOTO_MAX_BYTES } from '@driprail/shared/domain/walk-round/photo-limits';
import { stampOf } from '../../db/models/columns.ts';
import { Photo } from '../../db/models/index.ts';
import { inTransaction, run, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { AppError, badRequest, conflict, notFound, unprocessable } from '../../http/errors.ts';
import type { FileStore } from '../../integrations/storage/index.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { lockVisit } from '../board/index.ts';
import { markedVisit } from './marked-visit.ts';
import { photoJson } from './walk-sheet.queries.ts';

/**
 * Announces a photo. Its key is its id, so the same press finds what has arrived of it, and sends on from there.
 * @throws 404, 403, 413 for too many bytes, 422 when the key was used for another photo or its content was refused
 */
export async function announcePhoto(
  ctx: Ctx,
  visitId: string,
  body: PhotoBody,
): Promise<{ photo: WalkPhotoDto; isRepeat: boolean }> {
  if (body.bytes > PHOTO_MAX_BYTES)
    throw new AppError(413, 'too_large', 'That photo is too large to send. Take it anew with the camera here.');
  return inTransaction(async (tx) => {
    // A second send of the same press waits here, then finds the first one's row.
    if (!(await lockVisit(tx, visitId))) throw notFound('That visit');
    const known = await Photo.findByPk(body.key, { transaction: tx });
    if (known) return { photo: await announcedBefore(tx, ctx, known, visitId, body), isRepeat: true };
    const { visit, sheet, hasBegun, times } = await markedVisit(tx, ctx, visitId, body);
    const isAfterStart = hasBegun && sheet.startedAt !== null && isBefore(sheet.startedAt, times.occurredAt);
    await Photo.create(
      {
        id: body.key,
        visitId,
        vehicleId: body.vehicleId,
        view: body.view,
        moment: body.moment,
        bytes: body.bytes,
        sha256: body.sha256,
        isAddition: body.moment === 'before' && isAfterStart,
        userId: ctx.actor.userId,
        ...stampOf(times),
      },
      { transaction: tx },
    );
    hintAfterCommit(tx, ['desk'], 'visit', visit.id, visit.version);
    return { photo: await photoOf(tx, body.key), isRepeat: false };
  });
}

async function announcedBefore(
  tx: Transaction,
  { actor }: Ctx,
  known: Photo,
  visitId: string,
  body: PhotoBody,
): Promise<WalkPhotoDto> {
  const isSame =
    known.userId === actor.userId &&
    known.visitId === visitId &&
    known.vehicleId === body.vehicleId &&
    known.view === body.view &&
    known.moment === body.moment &&
    known.bytes === body.bytes &&
    known.sha256 === body.sha256;
  if (!isSame) throw unprocessable('key_reused', 'This press was sent before with other content.');
  if (known.refused) throw unprocessable('not_a_photo', known.refused);
  return photoOf(tx, known.id);
}

type Taken = { photo: WalkPhotoDto } | { error: AppError };

/**
 * Takes the next piece of one's own photo; with the last one the photo is checked by its content, stripped of all but
 * the picture, and stored. What is refused stays refused.
 * @throws 404, 409 with what has arrived when the piece does not follow it, 422 when the whole is no JPEG
 */
export async function takePiece(
  ctx: Ctx,
  store: FileStore,
  id: string,
  offset: number,
  piece: Uint8Array,
): Promise<WalkPhotoDto> {
  const taken = await inTransaction<Taken>(async (tx) => {
    const photo = await Photo.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!photo || photo.userId !== ctx.actor.userId) throw notFound('That photo');
    if (photo.refused) throw unprocessable('not_a_photo', photo.refused);
    if (photo.storedAt) return { photo: await photoOf(tx, id) };
    if (offset !== photo.receivedBytes) throw await outOfStep(tx, id);
    if (piece.length === 0 || offset + piece.length > photo.bytes)
      throw badRequest('That piece is empty or reaches past the photo’s end.');
    await run(
      'INSERT INTO photo_pieces (photo_id, starts_at, content) VALUES (:id, :offset, :piece)',
      { id, offset, piece: Buffer.from(piece) },
      tx,
    );
    await photo.update({ receivedBytes: offset + piece.length }, { transaction: tx });
    return photo.receivedBytes < photo.bytes ? { photo: await photoOf(tx, id) } : complete(tx, ctx, store, photo);
  });
  // Thrown outside, so that what was written down about the refusal stays.
  if ('error' in taken) throw taken.error;
  return taken.photo;
}

async function complete(tx: Transaction, { now }: Ctx, store: FileStore, photo: Photo): Promise<Taken> {
  const pieces = await select<{ content: Buffer }>(
    'SELECT content FROM photo_pieces WHERE photo_id = :id ORDER BY starts_at',
    { id: photo.id },
    tx,
  );
  const whole = Buffer.concat(pieces.map(({ content }) => content));
  await run('DELETE FROM photo_pieces WHERE photo_id = :id', { id: photo.id }, tx);
  if (createHash('sha256').update(whole).digest('hex') !== photo.sha256) {
    await photo.update({ receivedBytes: 0 }, { transaction: tx });
    return { error: await outOfStep(tx, photo.id) };
  }
  const picture = readJpeg(whole);
  if (!picture) {
    const refused = `${wordsOf(kindOfFile(whole))} Take the photo anew with the camera here.`;
    await photo.update({ refused }, { transaction: tx });
    return { error: unprocessable('not_a_photo', refused) };
  }
  // The same key with the same content, should the transaction fail after this and the piece come again.
  const storageKey = `${photo.occurredAt.toISOString().slice(0, 7)}/${photo.id}.jpg`;
  await store.put(storageKey, picture.bytes);
  const { width, height } = picture;
  await photo.update({ storageKey, width, height, storedAt: now() }, { transaction: tx });
  hintAfterCommit(tx, ['desk'], 'visit', photo.visitId);
  return { photo: await photoOf(tx, photo.id) };
}

async function outOfStep(tx: Transaction, id: string): Promise<AppError> {
  return conflict('offset', 'The photo goes on from another byte.', await photoOf(tx, id));
}

function wordsOf(kind: FileKind): string {
  if (kind === 'pdf') return 'That file is a PDF, not a photo, whatever its name says.';
  if (kind === 'jpeg') return 'That photo is damaged.';
  return 'That file is no JPEG photo.';
}

async function photoOf(tx: Transaction, id: string): Promise<WalkPhotoDto> {
  const [row] = await select<{ photo: WalkPhotoDto }>(
    `SELECT ${photoJson} AS photo FROM photos p JOIN users u ON u.id = p.user_id WHERE p.id = :id`,
    { id },
    tx,
  );
  if (!row) throw notFound('That photo');
  return walkPhotoDto.parse(row.photo);
}
