import { createDecipheriv, createECDH, hkdfSync, randomBytes } from 'node:crypto';
import type { IncomingHttpHeaders } from 'node:http';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';

export interface Taken {
  headers: IncomingHttpHeaders;
  message: unknown;
}

/** A push service on this machine with one browser's keys; it reads what the server sent as the browser would (RFC 8291). */
export async function fakePushService() {
  const keys = createECDH('prime256v1');
  keys.generateKeys();
  const auth = randomBytes(16);
  const taken: Taken[] = [];
  let status = 201;
  const server = createServer((req, res) => {
    const parts: Buffer[] = [];
    req.on('data', (part: Buffer) => parts.push(part));
    req.on('end', () => {
      taken.push({ headers: req.headers, message: JSON.parse(decrypt(Buffer.concat(parts), keys, auth)) });
      res.writeHead(status).end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  return {
    taken,
    subscription: {
      endpoint: `http://127.0.0.1:${port}/push/${randomBytes(8).toString('hex')}`,
      p256dh: keys.getPublicKey('base64url'),
      auth: auth.toString('base64url'),
    },
    answerWith: (next: number) => {
      status = next;
    },
    close: () => new Promise<void>((resolve) => server.close(() => resolve())),
  };
}

/** aes128gcm of RFC 8188 with the keys of RFC 8291, section 3.4; one record. */
function decrypt(body: Buffer, browser: ReturnType<typeof createECDH>, auth: Buffer): string {
  const salt = body.subarray(0, 16);
  const idLength = body.readUInt8(20);
  const serverKey = body.subarray(21, 21 + idLength);
  const secret = browser.computeSecret(serverKey);
  const info = Buffer.concat([Buffer.from('WebPush: info\0'), browser.getPublicKey(), serverKey]);
  const input = Buffer.from(hkdfSync('sha256', secret, auth, info, 32));
  const expand = (label: string, length: number) =>
    Buffer.from(hkdfSync('sha256', input, salt, Buffer.from(`Content-Encoding: ${label}\0`), length));
  const record = body.subarray(21 + idLength);
  const decipher = createDecipheriv('aes-128-gcm', expand('aes128gcm', 16), expand('nonce', 12));
  decipher.setAuthTag(record.subarray(-16));
  const plain = Buffer.concat([decipher.update(record.subarray(0, -16)), decipher.final()]);
  return plain.subarray(0, plain.lastIndexOf(2)).toString();
}
