import type { IncomingMessage } from 'node:http';

/** Whether a request's Origin, if a browser named one, is this very site: others may neither write nor open a socket. */
export function isOwnOrigin(req: IncomingMessage, publicUrl: string | null): boolean {
  const origin = req.headers.origin;
  if (!origin) return req.headers['sec-fetch-site'] !== 'cross-site';
  if (publicUrl && origin === new URL(publicUrl).origin) return true;
  try {
    return new URL(origin).host === req.headers.host;
  } catch {
    return false;
  }
}
