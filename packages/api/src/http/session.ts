import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import passport from 'passport';
import type pg from 'pg';
import { User } from '../db/models/index.ts';
import type { SignedIn } from './route.ts';

const TWO_WEEKS_MS = 14 * 24 * 60 * 60 * 1000;

declare module 'express-session' {
  interface SessionData {
    device: string;
    signedInAt: string;
    lastSeenAt: string;
    /** The user whose session this was before somebody ended it. */
    endedFor: string;
  }
}

/** Session store and Passport, in the order in which both HTTP and the socket handshake run them. */
export function sessionChain(
  pool: pg.Pool,
  secret: string,
  options: { isSecure: boolean },
): { chain: RequestHandler[]; close: () => void } {
  const store = new (connectPgSimple(session))({ pool, tableName: 'session', pruneSessionInterval: false });
  const chain = [
    session({
      store,
      secret,
      name: 'driprail',
      resave: false,
      saveUninitialized: false,
      rolling: true,
      cookie: { httpOnly: true, sameSite: 'lax', secure: options.isSecure, maxAge: TWO_WEEKS_MS },
    }),
    passport.initialize(),
    passport.session(),
  ] as RequestHandler[];
  return { chain, close: () => void store.close() };
}

/** A session names its user; a login that was switched off is nobody at once. */
export function registerUsers(): void {
  passport.serializeUser((user, done) => done(null, user.id));
  passport.deserializeUser((id: string, done) => {
    User.findByPk(id).then(
      (user) => done(null, user?.isActive ? asSignedIn(user) : false),
      (error: unknown) => done(error),
    );
  });
}

export function asSignedIn(user: User): SignedIn & { readonly kind: 'user' } {
  return { kind: 'user', id: user.id, name: user.name, email: user.email, role: user.role, personId: user.personId };
}
