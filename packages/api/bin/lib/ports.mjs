import { createServer } from 'node:net';
import { setTimeout as wait } from 'node:timers/promises';

import { PlainError } from './words.mjs';

/**
 * @param {string} [text] what the person wrote, such as PORT's value
 * @param {number} fallback
 * @returns {number}
 */
export function portFrom(text, fallback) {
  if (!text) return fallback;
  const port = Number(text);
  if (Number.isInteger(port) && port > 0 && port < 65_536) return port;
  throw new PlainError(`PORT is “${text}”; it has to be a whole number from 1 to 65535.`);
}

/** A port of 127.0.0.1 that nobody uses at this moment. */
export async function freePort() {
  const { port } = await listenOnce(0, '127.0.0.1');
  return port;
}

export async function isFree(port, host = '127.0.0.1') {
  return !(await listenOnce(port, host)).error;
}

/**
 * Waits a moment for a port that the last start is just giving back.
 * @throws {PlainError} when it stays in use or the address is not this machine's
 */
export async function requirePort(port, host) {
  for (let tries = 0; ; tries += 1) {
    const { error } = await listenOnce(port, host);
    if (!error) return;
    if (error === 'EACCES')
      throw new PlainError(
        `This user may not use port ${port}: choose one above 1023, for example PORT=4601 npm start.`,
      );
    if (error !== 'EADDRINUSE') throw new PlainError(`HOST is “${host}”, which is no address of this machine.`);
    if (tries === 10)
      throw new PlainError(
        `Port ${port} is in use by another program: stop it, or choose another port, for example PORT=${port + 1} npm start.`,
      );
    await wait(200);
  }
}

function listenOnce(port, host) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', (error) => resolve({ error: error.code }));
    server.listen({ port, host, exclusive: true }, () => {
      const { port: given } = server.address();
      server.close(() => resolve({ port: given }));
    });
  });
}
