import { expect, test } from 'vitest';
import { listenHost, originOf } from './listen-host.ts';

test.each([
  ['127.0.0.1', '127.0.0.1', 'http://127.0.0.1:4600'],
  ['localhost', 'localhost', 'http://localhost:4600'],
  ['::1', '::1', 'http://[::1]:4600'],
  ['[::1]', '::1', 'http://[::1]:4600'],
])('%s is listened on as %s and reached at %s', (given, host, origin) => {
  expect(listenHost(given)).toBe(host);
  expect(originOf(given, 4600)).toBe(origin);
  expect(new URL(originOf(given, 4600)).port).toBe('4600');
});
