import { join } from 'node:path';
import type { S3Place } from './s3-store.ts';
import { localStore } from './local-store.ts';
import type { FileStore } from './storage.ts';

export type { FileStore } from './storage.ts';

/** The store that the settings name: a bucket, else the folder `photos` among the data. */
export function storeFor({ dataDir, s3 }: { dataDir: string; s3: S3Place | null }): FileStore {
  return s3 ? lazyS3(s3) : localStore(join(dataDir, 'photos'));
}

/** The SDK is large and most companies keep their photos here: it is loaded with the first file. */
function lazyS3(place: S3Place): FileStore {
  let made: Promise<FileStore> | null = null;
  const store = () => (made ??= import('./s3-store.ts').then(({ s3Store }) => s3Store(place)));
  return {
    put: async (key, content) => (await store()).put(key, content),
    get: async (key) => (await store()).get(key),
    has: async (key) => (await store()).has(key),
    remove: async (key) => (await store()).remove(key),
  };
}
