import { createRequire as requireFrom } from 'node:module';
import express from 'express';
import type { RequestHandler, Response, Router } from 'express';
import type { Books, Session } from './fake-objects.ts';
import { FakeError } from './fake-objects.ts';
import { openPage, overPage, paidPage, unknownPage } from './pay-page.ts';
import { pay, refuse, sessionOf } from './sessions.ts';

const FONT = requireFrom(import.meta.url).resolve('@fontsource/roboto-flex/files/roboto-flex-latin-400-normal.woff2');

/** The page that the service would show: with two buttons in place of a card. */
export function payPageRouter(books: Books): Router {
  const router = express.Router();
  router.use(guarded, express.urlencoded({ extended: false, limit: '1kb' }));

  // Packages lie in a folder whose name begins with a dot.
  router.get('/font.woff2', (_req, res) => res.sendFile(FONT, { maxAge: '1d', dotfiles: 'allow' }));
  router.get('/:session', (req, res) => {
    const session = found(books, req.params.session, res);
    if (session) res.send(pageOf(books, session, req.query['refused'] === '1'));
  });
  router.post('/:session', (req, res) => {
    const session = found(books, req.params.session, res);
    if (!session) return;
    const { press } = (req.body ?? {}) as { press?: string };
    if (press === 'pay') pay(books, session);
    if (press === 'refuse') refuse(books, session);
    if (session.status === 'complete' && session.success_url) res.redirect(303, session.success_url);
    else res.redirect(303, `/pay/${session.id}${press === 'refuse' ? '?refused=1' : ''}`);
  });
  return router;
}

function found(books: Books, id: string, res: Response): Session | null {
  try {
    return sessionOf(books, id);
  } catch (error) {
    if (!(error instanceof FakeError)) throw error;
    res.status(404).send(unknownPage());
    return null;
  }
}

function pageOf(books: Books, session: Session, isRefused: boolean): string {
  const facts = {
    label: books.words.get(session.id)?.label ?? '',
    amountCents: session.amount_total ?? 0,
    backUrl: session.cancel_url ?? '',
  };
  if (session.status === 'complete') return paidPage(facts);
  return session.status === 'expired' ? overPage(facts) : openPage(facts, isRefused);
}

const guarded: RequestHandler = (_req, res, next) => {
  res.setHeader('content-security-policy', "default-src 'none'; style-src 'unsafe-inline'; font-src 'self'");
  res.setHeader('cache-control', 'no-store');
  next();
};
