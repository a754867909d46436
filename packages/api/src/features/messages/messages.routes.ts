import type { Request } from 'express';
import * as settings from '@driprail/shared/contracts/message-settings.contract';
import * as api from '@driprail/shared/contracts/messages.contract';
import { tag } from '@driprail/shared/authz/ability';
import { authorize } from '../../authz/authorize.ts';
import type { Ctx } from '../../http/context.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, publicRoute, route } from '../../http/route.ts';
import { dropMessage, retryMessage, settleEnquiry } from './desk.service.ts';
import { takeMailEvent, takeTextEvent } from './inbound.service.ts';
import { listMessages, readCustomerMessages } from './messages.queries.ts';
import { previewMessage } from './preview.service.ts';
import type { RenderParts } from './render.ts';
import { readMessageSettings, updateMessageHours, updateMessageKind } from './settings.service.ts';
import { followStopLink } from './stops.service.ts';

/** Secrets that the mail and text services sign with; null: that hook is off. */
export interface HookSecrets {
  mail: string | null;
  texts: string | null;
}

const SIGNATURE_HEADER = 'x-driprail-signature';

export function messagesRoutes(
  table: RouteTable,
  { deliveries, hookSecrets }: { deliveries: RenderParts; hookSecrets: HookSecrets },
): void {
  route(table, api.listMessages, ({ query }) => listMessages(query));
  route(table, api.listCustomerMessages, ({ params }) => readCustomerMessages(params.id));
  route(table, api.retryMessage, async ({ params }, ctx) => {
    await retryMessage(ctx, params.id);
    return okay;
  });
  route(table, api.dropMessage, async ({ params }, ctx) => {
    await dropMessage(ctx, params.id);
    return okay;
  });
  route(table, api.settleEnquiry, async ({ params }, ctx) => {
    await settleEnquiry(ctx, params.id);
    return okay;
  });
  route(table, settings.getMessageSettings, readMessageSettings);
  route(table, settings.updateMessageHours, async ({ body }, ctx) => {
    authorizeWords(ctx);
    return { hours: await updateMessageHours(ctx, body) };
  });
  route(table, settings.updateMessageKind, async ({ params, body }, ctx) => {
    authorizeWords(ctx);
    return { kind: await updateMessageKind(ctx, params.kind, body) };
  });
  route(table, settings.previewMessage, ({ params, body }, ctx) =>
    previewMessage(deliveries, params.kind, body, ctx.now()),
  );

  const { stops } = deliveries;
  publicRoute(table, api.getUnsubscribe, ({ params }, now) => followStopLink(stops, params.token, null, now()));
  publicRoute(table, api.unsubscribe, ({ params }, now) => followStopLink(stops, params.token, 'stop', now()));
  publicRoute(table, api.subscribeAgain, ({ params }, now) => followStopLink(stops, params.token, 'go_on', now()));

  const callOf = (req: Request, secret: string | null) => ({
    ...{ secret, signature: req.get(SIGNATURE_HEADER), body: req.body as unknown },
  });
  publicRoute(table, api.takeMailEvent, async (_input, now, { req }) => {
    await takeMailEvent(callOf(req, hookSecrets.mail), now());
    return okay;
  });
  publicRoute(table, api.takeTextEvent, async (_input, now, { req }) => {
    await takeTextEvent(callOf(req, hookSecrets.texts), now());
    return okay;
  });
}

function authorizeWords({ ability }: Ctx): void {
  authorize(ability, 'update', tag('Settings', { id: 1 }));
}
