import type { Request } from 'express';
import { rateLimit } from 'express-rate-limit';
import * as api from '@driprail/shared/contracts/session.contract';
import type { Clock } from '../../clock.ts';
import { User } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import { AppError, unauthorized } from '../../http/errors.ts';
import { settled } from '../../http/settled.ts';
import type { RouteTable, SignedIn } from '../../http/route.ts';
import { okay, publicRoute, route } from '../../http/route.ts';
import { asSignedIn } from '../../http/session.ts';
import { hub } from '../../realtime/hub.ts';
import { readLink, sendLink, usePasswordLink } from './links.service.ts';
import { changeOwnPassword } from './own-password.service.ts';
import { sessionOf, sessionsOf } from './session.queries.ts';
import { endSessionByRef, refOf } from './sessions.service.ts';
import { signInWith } from './sign-in.ts';

export interface AccessOptions {
  hasLocalMail: boolean;
  baseUrlOf: (req: Request) => string;
}

const slowDown = (limit: number) =>
  rateLimit({
    windowMs: 10 * 60_000,
    limit,
    skipSuccessfulRequests: true,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    validate: { trustProxy: false },
    handler: (_req, _res, next) =>
      next(new AppError(429, 'slow_down', 'Too many tries. Wait ten minutes and try again.')),
  });

export function accessRoutes(table: RouteTable, { hasLocalMail, baseUrlOf }: AccessOptions): void {
  table.router.post('/api/session', slowDown(20));
  table.router.post('/api/links/:token', slowDown(20));
  table.router.post(
    '/api/password/reset-requests',
    rateLimit({
      windowMs: 10 * 60_000,
      limit: 20,
      standardHeaders: 'draft-8',
      legacyHeaders: false,
      validate: { trustProxy: false },
    }),
  );

  publicRoute(table, api.createSession, async ({ body }, now, { req }) => {
    const user = await signInWith(body.email, body.password);
    return begin(req, user, now, hasLocalMail);
  });
  route(table, api.getSession, (_input, ctx, { req }) => sessionOf(signedIn(req), ctx.now(), hasLocalMail));
  route(table, api.endSession, async (_input, _ctx, { req }) => {
    const sid = req.sessionID;
    await new Promise<void>((resolve, reject) => req.session.destroy(settled(resolve, reject)));
    hub.signOut(`session:${sid}`);
    return okay;
  });
  route(table, api.listSessions, async (_input, ctx, { req }) => ({
    sessions: (await sessionsOf(ctx.actor.userId)).map((row) => ({
      ref: refOf(row.sid),
      isCurrent: row.sid === req.sessionID,
      device: row.device ?? 'Unknown device',
      signedInAt: row.signedInAt ?? ctx.now().toISOString(),
      lastSeenAt: row.lastSeenAt ?? ctx.now().toISOString(),
    })),
  }));
  route(table, api.endOneSession, async ({ params }, ctx) => {
    await endSessionByRef(ctx.actor.userId, params.ref);
    return okay;
  });
  route(table, api.changePassword, async ({ body }, ctx, { req }) => {
    await changeOwnPassword(ctx, body.current, body.next, req.sessionID);
    return okay;
  });
  publicRoute(table, api.requestReset, async ({ body }, now, { req }) => {
    const user = await User.findOne({ where: { email: body.email, isActive: true } });
    if (user)
      await inTransaction((tx) =>
        sendLink(tx, user, user.passwordHash ? 'reset' : 'invitation', now(), baseUrlOf(req)),
      );
    return okay;
  });
  publicRoute(table, api.getLink, async ({ params }, now) => {
    const { link, user, companyName } = await readLink(params.token, now);
    return { kind: link.kind, email: user.email, companyName };
  });
  publicRoute(table, api.useLink, async ({ params, body }, now, { req }) => {
    const user = await usePasswordLink(params.token, body.password, now);
    return begin(req, user, now, hasLocalMail);
  });
}

/** A new session id at sign-in, so that one planted before is worth nothing. */
export async function begin(req: Request, user: User, now: Clock, hasLocalMail: boolean): Promise<api.SessionDto> {
  const who = asSignedIn(user);
  await new Promise<void>((resolve, reject) => req.logIn(who, settled(resolve, reject)));
  req.session.device = (req.get('user-agent') ?? '').slice(0, 200);
  req.session.signedInAt = now().toISOString();
  req.session.lastSeenAt = now().toISOString();
  await user.update({ lastSeenAt: now() });
  return sessionOf(who, now(), hasLocalMail);
}

function signedIn(req: Request): SignedIn {
  if (!req.user) throw unauthorized();
  return req.user;
}
