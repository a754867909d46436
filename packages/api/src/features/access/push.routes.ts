import * as api from '@driprail/shared/contracts/push.contract';
import { unprocessable } from '../../http/errors.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import type { PushRules } from './push.service.ts';
import { addSubscription, removeSubscription } from './push.service.ts';

export function pushRoutes(table: RouteTable, push: PushRules | null): void {
  route(table, api.getPushKey, () => Promise.resolve({ publicKey: push?.keys.publicKey ?? null }));
  route(table, api.addPushSubscription, async ({ body }, ctx) => {
    if (!push) throw unprocessable('no_push', 'This server wakes no phones.');
    await addSubscription(ctx, body, push);
    return okay;
  });
  route(table, api.removePushSubscription, async ({ query }, ctx) => {
    await removeSubscription(ctx, query.endpoint);
    return okay;
  });
}
