import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import webPush from 'web-push';

/** The key pair by which push services know this server (RFC 8292), and whom they may write to about it. */
export interface PushKeys {
  publicKey: string;
  privateKey: string;
  contact: string;
}

/** From the environment, else made once and kept in a file only its owner can read: new keys would silence every phone. */
export async function pushKeys(
  given: { publicKey: string; privateKey: string } | null,
  dataDir: string,
  contact: string,
): Promise<PushKeys> {
  if (given) return { ...given, contact };
  const file = join(dataDir, 'push-keys.json');
  try {
    return { ...(JSON.parse(await readFile(file, 'utf8')) as { publicKey: string; privateKey: string }), contact };
  } catch {
    const made = webPush.generateVAPIDKeys();
    await mkdir(dataDir, { recursive: true });
    await writeFile(file, JSON.stringify(made), { mode: 0o600 });
    return { ...made, contact };
  }
}
