import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join, relative } from 'node:path';

/**
 * One hash over the names and contents of files, whatever the order they are given in.
 * @param {string} base folder the names are taken relative to
 * @param {string[]} files absolute paths
 * @returns {string} hexadecimal SHA-256
 */
export function hashFiles(base, files) {
  const hash = createHash('sha256');
  for (const file of [...files].sort()) {
    const content = readFileSync(file);
    hash.update(`${relative(base, file)}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex');
}

/**
 * All files below a folder, without what was built or installed there.
 * @param {string} folder absolute path; a missing folder has no files
 * @returns {string[]} absolute paths
 */
export function filesBelow(folder) {
  let entries;
  try {
    entries = readdirSync(folder, { withFileTypes: true });
  } catch (error) {
    if (error.code === 'ENOENT') return [];
    throw error;
  }
  return entries
    .filter(({ name }) => name !== 'node_modules' && name !== 'dist')
    .flatMap((entry) => {
      const path = join(folder, entry.name);
      if (entry.isDirectory()) return filesBelow(path);
      return entry.isFile() ? [path] : [];
    });
}
