import type { RequestHandler } from 'express';
import express from 'express';
import * as api from '@driprail/shared/contracts/walk-round.contract';
import { badRequest } from '../../http/errors.ts';
import type { HttpExchange, RouteTable } from '../../http/route.ts';
import { route } from '../../http/route.ts';
import type { FileStore } from '../../integrations/storage/index.ts';
import { announcePhoto, takePiece } from './photos.service.ts';
import { addToWalkRound } from './walk-additions.service.ts';
import { readPhoto, showWalkSheet } from './walk-round.queries.ts';
import { finishWalkRound } from './walk-round.service.ts';

/** More than a piece of ours; what is larger is refused unread with 413. */
const readRaw = express.raw({ type: 'application/octet-stream', limit: '512kb' });
/** Nobody sends bytes before signing in. */
const readPiece: RequestHandler = (req, res, next) => (req.user ? readRaw(req, res, next) : next());

export function walkRoundRoutes(table: RouteTable, store: FileStore): void {
  route(table, api.getWalkSheet, async ({ params }, ctx) => ({ sheet: await showWalkSheet(ctx, params.id) }));
  route(table, api.postWalkRound, ({ params, body }, ctx) => finishWalkRound(ctx, params.id, body));
  route(table, api.postWalkAddition, ({ params, body }, ctx) => addToWalkRound(ctx, params.id, body));
  route(table, api.postPhoto, ({ params, body }, ctx) => announcePhoto(ctx, params.id, body));
  table.router.put(api.putPhotoPiece.path, readPiece);
  route(table, api.putPhotoPiece, async ({ params, query }, ctx, { req }) => {
    if (!Buffer.isBuffer(req.body)) throw badRequest('Send the photo’s bytes as application/octet-stream.');
    return { photo: await takePiece(ctx, store, params.id, query.offset, req.body) };
  });
  route(table, api.getPhoto, async ({ params }, ctx, exchange) => {
    const { content, name, tag } = await readPhoto(ctx, store, params.id);
    handOut(exchange, name, tag);
    return content;
  });
}

/** Kept by this browser alone, and asked for again before each use, so that a session that ended sees nothing. */
function handOut({ res }: HttpExchange, name: string, tag: string): void {
  res.setHeader('cache-control', 'private, no-cache');
  res.setHeader('etag', tag);
  res.setHeader('content-disposition', `inline; filename="${name}"`);
  res.setHeader('content-security-policy', "default-src 'none'; sandbox");
}
