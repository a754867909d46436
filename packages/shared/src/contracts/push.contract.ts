import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { done } from './fields.ts';
import { everyone } from '../authz/actor.ts';

/** Base64 without padding, as browsers write their keys. */
const key = z.string().regex(/^[\w-]{16,200}$/, 'This is no key of a browser.');
const address = z.url('This is no address of a push service.').max(1000);

export const getPushKey = endpoint({
  method: 'get',
  path: '/api/push/key',
  roles: everyone,
  summary: 'The public key by which a browser asks to be told of changes; null where that is switched off.',
  response: z.object({ publicKey: z.string().nullable() }),
});
export const addPushSubscription = endpoint({
  method: 'post',
  path: '/api/push/subscriptions',
  roles: everyone,
  summary: 'This browser wants to be told when its person’s run sheet changes while the app is closed.',
  body: z.strictObject({ endpoint: address, p256dh: key, auth: key }),
  response: done,
});
export const removePushSubscription = endpoint({
  method: 'delete',
  path: '/api/push/subscriptions',
  roles: everyone,
  summary: 'This browser wants no more of it.',
  query: z.object({ endpoint: address }),
  response: done,
});
