import type { CustomerPhotoDto } from '@driprail/shared/contracts/customer-page.contract';
import { Photo } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { notFound } from '../../http/errors.ts';
import type { FileStore } from '../../integrations/storage/index.ts';

/** The photos of a job that its customer sees once the work is done: before and after, never those of a second look. */
export function listCustomerPhotos(jobId: string): Promise<CustomerPhotoDto[]> {
  return select<CustomerPhotoDto>(
    `SELECT p.id, p.view, p.moment FROM photos p JOIN visits v ON v.id = p.visit_id
      WHERE v.job_id = :jobId AND p.storage_key IS NOT NULL AND p.moment IN ('before', 'after') ORDER BY p.occurred_at, p.id`,
    { jobId },
  );
}

/** The file of a photo that the caller has found among those. @throws 404 when it is gone */
export async function readCustomerPhoto(store: FileStore, id: string): Promise<Uint8Array> {
  const photo = await Photo.findByPk(id);
  const content = photo?.storageKey ? await store.get(photo.storageKey) : null;
  if (!content) throw notFound('That photo');
  return content;
}
