/** Where files are kept that are no rows: by key, written once. Nobody reaches it but through the API. */
export interface FileStore {
  /** Writes a file whole or not at all; the same key again is written over with the same. @throws when there is no room */
  put(key: string, content: Uint8Array): Promise<void>;
  /** @returns null when there is no such file */
  get(key: string): Promise<Uint8Array | null>;
  has(key: string): Promise<boolean>;
  remove(key: string): Promise<void>;
}

/** Letters, digits and dashes in folders: a key never leads out of the store. */
const KEY = /^[a-z0-9-]+(\/[a-z0-9-]+)*\.[a-z0-9]+$/;

/** @throws RangeError for a key that could name something else */
export function checkedKey(key: string): string {
  if (!KEY.test(key)) throw new RangeError('not a key of the store');
  return key;
}
