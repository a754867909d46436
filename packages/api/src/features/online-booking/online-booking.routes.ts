import { rateLimit } from 'express-rate-limit';
import * as api from '@driprail/shared/contracts/online-booking.contract';
import { AppError, notFound } from '../../http/errors.ts';
import type { RouteTable } from '../../http/route.ts';
import { publicRoute, route } from '../../http/route.ts';
import type { Geocoder } from '../../integrations/maps/index.ts';
import type { CustomerLinks } from '../billing/index.ts';
import { resolveAsk } from './ask.ts';
import { bookHeld } from './book-held.service.ts';
import { holdWindow } from './holds.service.ts';
import { readOnlineMenu } from './menu.queries.ts';
import { callOffOwn, readOwnBooking } from './own-booking.service.ts';
import { sendCode } from './proof.service.ts';
import { readOnlineSettings } from './settings.queries.ts';
import { updateOnlineSettings } from './settings.service.ts';
import { readWindows } from './windows.queries.ts';

export interface OnlineBookingParts {
  geocoder: Geocoder | null;
  links: CustomerLinks;
}

/** In ten minutes from one address: a person looks at some days and changes their mind, a program does more. */
const slowDown = (limit: number) =>
  rateLimit({
    windowMs: 10 * 60_000,
    limit,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    validate: { trustProxy: false },
    handler: (_req, _res, next) =>
      next(
        new AppError(
          429,
          'slow_down',
          'That was a lot at once. Wait ten minutes and go on; what you filled in is still here.',
        ),
      ),
  });

/** What anybody may do without an account, and the owner's settings of it. */
export function onlineBookingRoutes(table: RouteTable, { geocoder, links }: OnlineBookingParts): void {
  table.router.post('/api/online-booking/windows', slowDown(60));
  table.router.post('/api/online-booking/holds', slowDown(20));
  const onHold = slowDown(40);
  for (const { path } of [api.proveEmail, api.bookHeld]) table.router.post(path, onHold);

  publicRoute(table, api.getOnlineMenu, async (_input, now) => ({ menu: await readOnlineMenu(now()) }));
  publicRoute(table, api.findWindows, async ({ body }, now) => {
    const { work } = await resolveAsk(geocoder, body, now());
    return { days: await readWindows(work, now()) };
  });
  publicRoute(table, api.holdWindow, async ({ body: { from, insteadOf, ...ask } }, now) => {
    const asked = await resolveAsk(geocoder, ask, now());
    return { hold: await holdWindow(asked, { from, insteadOf }, now()) };
  });
  publicRoute(table, api.proveEmail, async ({ params, body }, now) => ({
    expiresAt: await sendCode(params.id, body, now()),
  }));
  publicRoute(table, api.bookHeld, async ({ params, body }, now) => ({
    booked: await bookHeld(links, params.id, body.code, now()),
  }));
  const jobOf = async (token: string, now: Date): Promise<string> => {
    const jobId = await links.jobOf(token, now);
    if (!jobId) throw notFound('That page');
    return jobId;
  };
  publicRoute(table, api.getOwnBooking, async ({ params }, now) => ({
    booking: await readOwnBooking(await jobOf(params.token, now()), now()),
  }));
  publicRoute(table, api.callOffOwn, async ({ params, body }, now) => ({
    booking: await callOffOwn(await jobOf(params.token, now()), body.feeCents, now()),
  }));
  route(table, api.getOnlineSettings, async () => ({ settings: await readOnlineSettings() }));
  route(table, api.updateOnlineSettings, async ({ body }, ctx) => ({
    settings: await updateOnlineSettings(ctx, body),
  }));
}
