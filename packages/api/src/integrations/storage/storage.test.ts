import { createServer } from 'node:http';
import type { Server } from 'node:http';
import { mkdtemp, readdir, rm, stat } from 'node:fs/promises';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { FileStore } from './index.ts';
import { storeFor } from './index.ts';

let folder: string;
let bucket: Server;
const stores: Record<string, FileStore> = {};
const asked: string[] = [];

/** A bucket in memory that speaks as much S3 as the store uses: put, get, head and delete by path. */
function fakeBucket(): Server {
  const objects = new Map<string, Buffer>();
  return createServer((req, res) => {
    const chunks: Buffer[] = [];
    req.on('data', (chunk: Buffer) => chunks.push(chunk));
    req.on('end', () => {
      const path = new URL(req.url ?? '', 'http://bucket.example').pathname;
      asked.push(`${req.method} ${path}`);
      const found = objects.get(path);
      if (req.method === 'PUT') objects.set(path, Buffer.concat(chunks));
      if (req.method === 'DELETE') objects.delete(path);
      const isMissing = (req.method === 'GET' || req.method === 'HEAD') && !found;
      res.statusCode = isMissing ? 404 : req.method === 'DELETE' ? 204 : 200;
      if (isMissing) res.end(req.method === 'GET' ? '<Error><Code>NoSuchKey</Code></Error>' : undefined);
      else res.end(req.method === 'GET' ? found : undefined);
    });
  });
}

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'driprail-store-'));
  bucket = fakeBucket();
  await new Promise<void>((resolve) => bucket.listen(0, '127.0.0.1', resolve));
  const { port } = bucket.address() as AddressInfo;
  const credentials = { accessKeyId: 'key', secretAccessKey: 'secret' };
  const s3 = { bucket: 'photos', region: 'us-east-1', endpoint: `http://127.0.0.1:${port}`, credentials };
  stores['this machine'] = storeFor({ dataDir: folder, s3: null });
  stores['a bucket'] = storeFor({ dataDir: folder, s3 });
});
afterAll(async () => {
  bucket.closeAllConnections();
  await new Promise((resolve) => bucket.close(resolve));
  await rm(folder, { recursive: true });
});

describe.each(['this machine', 'a bucket'])('files on %s', (name) => {
  const store = () => stores[name] as FileStore;
  const content = new Uint8Array([1, 2, 250, 0, 255]);

  test('are written, read, looked for and removed', async () => {
    await store().put('2026-05/a-1.jpg', content);
    await store().put('2026-05/a-1.jpg', content);
    expect(new Uint8Array((await store().get('2026-05/a-1.jpg')) ?? [])).toEqual(content);
    expect(await store().has('2026-05/a-1.jpg')).toBe(true);
    await store().remove('2026-05/a-1.jpg');
    expect(await store().has('2026-05/a-1.jpg')).toBe(false);
    expect(await store().get('2026-05/a-1.jpg')).toBeNull();
  });

  test.each(['../a.jpg', '/etc/a.jpg', '2026-05/../../a.jpg', 'a', '2026 05/a.jpg'])('have no key %s', async (key) => {
    await expect((async () => store().put(key, content))()).rejects.toThrow('not a key');
  });
});

test('on this machine only the owner reads them, and nothing half-written is left', async () => {
  await stores['this machine']?.put('2026-06/b.jpg', new Uint8Array([7]));
  const place = join(folder, 'photos', '2026-06');
  expect((await stat(place)).mode & 0o777).toBe(0o700);
  expect((await stat(join(place, 'b.jpg'))).mode & 0o777).toBe(0o600);
  expect(await readdir(place)).toEqual(['b.jpg']);
});

test('in a bucket they lie under their key', () => {
  expect(asked).toContain('PUT /photos/2026-05/a-1.jpg');
});
