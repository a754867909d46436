import { randomBytes } from 'node:crypto';
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';

/** The session secret: from the environment, else made once and kept in a file only its owner can read. */
export async function sessionSecret(given: string | null, dataDir: string): Promise<string> {
  if (given) return given;
  const file = join(dataDir, 'session-secret');
  try {
    return (await readFile(file, 'utf8')).trim();
  } catch {
    const made = randomBytes(48).toString('base64url');
    await mkdir(dataDir, { recursive: true });
    await writeFile(file, made, { mode: 0o600 });
    return made;
  }
}
