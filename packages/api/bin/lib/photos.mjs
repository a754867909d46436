import { chmodSync, cpSync, existsSync } from 'node:fs';
import { join } from 'node:path';

import { dataFolder } from './paths.mjs';

/** Where photos lie on this machine; null when S3_BUCKET names a bucket, which is backed up by itself. */
export function photosFolder() {
  return process.env.S3_BUCKET ? null : join(dataFolder(), 'photos');
}

/** The folder beside a backup that holds its photos. */
export const photosBeside = (backup) => `${backup}.photos`;

/**
 * Copies a folder of photos, readable by its owner alone. What is there already stays: a photo never changes.
 * @returns {boolean} false when there is no such folder
 */
export function copyPhotos(from, to) {
  if (!existsSync(from)) return false;
  // What a crash left half-written is no photo.
  cpSync(from, to, { recursive: true, force: false, filter: (path) => !path.endsWith('.part') });
  chmodSync(to, 0o700);
  return true;
}
