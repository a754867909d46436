import { readFileSync } from 'node:fs';
import { gzipSync } from 'node:zlib';
import { expect, test } from 'vitest';

interface Chunk {
  file: string;
  imports?: string[];
}

const dist = new URL('../dist/', import.meta.url);
const manifest = JSON.parse(readFileSync(new URL('manifest.json', dist), 'utf8')) as Record<string, Chunk>;
/** Our own goal for a mid-range phone on a weak line, kilobytes of gzip. */
const GOAL_KB = 130;

/** What a browser must have before it can paint: a chunk with all that it imports at once. */
function needed(names: string[], found = new Set<string>()): Set<string> {
  for (const name of names) {
    const chunk = manifest[name];
    if (!chunk || found.has(chunk.file)) continue;
    found.add(chunk.file);
    needed(chunk.imports ?? [], found);
  }
  return found;
}

test('the technician’s first screen needs little', () => {
  const files = needed(['index.html', 'src/features/run-sheet/pages/run-sheet.page.tsx']);
  expect(files.size).toBeGreaterThan(2);
  const bytes = [...files].reduce((sum, file) => sum + gzipSync(readFileSync(new URL(file, dist))).length, 0);
  expect(bytes / 1024).toBeLessThanOrEqual(GOAL_KB);
});
