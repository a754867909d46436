import { strToU8, zipSync } from 'fflate';

/** Files by their path in the archive: text, or bytes that are packed already. */
export type ZipFiles = Record<string, string | Uint8Array>;

/**
 * Packs files in memory: a payday of fifteen people is well under a megabyte.
 * @param at the moment the files carry
 */
export function zipOf(files: ZipFiles, at: Date): Buffer {
  const entries = Object.entries(files).map(([path, content]) =>
    typeof content === 'string'
      ? ([path, [strToU8(content), { level: 6 }]] as const)
      : ([path, [content, { level: 0 }]] as const),
  );
  return Buffer.from(
    zipSync(Object.fromEntries(entries.map(([path, [data, options]]) => [path, [data, options]])), { mtime: at }),
  );
}

/** "2026-05-04-sefa-lund": a name as a part of a path. */
export function pathPart(name: string): string {
  const plain = name
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, '-')
    .replace(/^-+|-+$/g, '');
  return plain === '' ? 'person' : plain;
}
