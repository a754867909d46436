import { select } from '../../db/sequelize.ts';
import type { FileStore } from '../../integrations/storage/index.ts';

/** How many stored photos have no file, for instance after a restore without the photos' folder. */
export async function checkPhotoFiles(store: FileStore): Promise<{ what: string; count: number }> {
  const photos = await select<{ key: string }>(
    'SELECT storage_key AS key FROM photos WHERE storage_key IS NOT NULL ORDER BY 1',
  );
  let count = 0;
  for (const { key } of photos) if (!(await store.has(key))) count += 1;
  return { what: 'every stored photo has its file', count };
}
