import type { WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import { photoMomentNames, photoViewNames } from '@driprail/shared/domain/walk-round/views';
import { companyOf } from '../../db/company.ts';
import { Photo } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound } from '../../http/errors.ts';
import type { FileStore } from '../../integrations/storage/index.ts';
import { authorizeVisit, readVisits } from '../board/index.ts';
import { readWalkSheet } from './walk-sheet.queries.ts';

/** @throws 404 for what one may not know */
export async function showWalkSheet(ctx: Ctx, visitId: string): Promise<WalkSheetDto> {
  await readableVisit(ctx, visitId);
  const sheet = await readWalkSheet(visitId);
  if (!sheet) throw notFound('That visit');
  return sheet;
}

export interface PhotoFile {
  content: Uint8Array;
  /** For who saves it. */
  name: string;
  /** Changes with the content, which it never does. */
  tag: string;
}

/** A stored photo, for those who may see its visit. @throws 404 */
export async function readPhoto(ctx: Ctx, store: FileStore, id: string): Promise<PhotoFile> {
  const photo = await Photo.findByPk(id);
  if (!photo?.storageKey) throw notFound('That photo');
  const visit = await readableVisit(ctx, photo.visitId, 'That photo');
  const content = await store.get(photo.storageKey);
  if (!content) throw notFound('That photo’s file');
  const words = [`job ${visit.jobNumber}`, photoViewNames[photo.view], photoMomentNames[photo.moment]];
  return { content, name: `${words.join(' ').toLowerCase().replace(/ /g, '-')}.jpg`, tag: `"${photo.sha256}"` };
}

async function readableVisit(ctx: Ctx, visitId: string, what = 'That visit') {
  const [visit] = await readVisits({ ids: [visitId] });
  if (!visit) throw notFound(what);
  authorizeVisit(ctx, 'read', visit, (await companyOf()).zone);
  return visit;
}
