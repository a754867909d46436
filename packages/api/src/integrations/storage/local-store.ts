import { access, mkdir, open, readFile, rename, rm } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { v7 as uuid } from 'uuid';
import type { FileStore } from './storage.ts';
import { checkedKey } from './storage.ts';

/** Files in a folder of this machine, readable by its owner alone; outside what the web server hands out. */
export function localStore(folder: string): FileStore {
  const pathOf = (key: string) => join(folder, checkedKey(key));
  return {
    async put(key, content) {
      const path = pathOf(key);
      await mkdir(dirname(path), { recursive: true, mode: 0o700 });
      // Beside its place first: whoever reads finds the whole file or none, also after a crash.
      const draft = `${path}.${uuid()}.part`;
      try {
        const file = await open(draft, 'wx', 0o600);
        try {
          await file.writeFile(content);
          await file.sync();
        } finally {
          await file.close();
        }
        await rename(draft, path);
      } catch (error) {
        await rm(draft, { force: true });
        throw error;
      }
    },
    async get(key) {
      try {
        return await readFile(pathOf(key));
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
        throw error;
      }
    },
    has: (key) =>
      access(pathOf(key)).then(
        () => true,
        () => false,
      ),
    remove: (key) => rm(pathOf(key), { force: true }),
  };
}
