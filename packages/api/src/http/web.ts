import { join } from 'node:path';
import express from 'express';
import type { Express } from 'express';

/** Serves the built screens; every other path is a page of the one web app. */
export function serveWeb(app: Express, dist: string): void {
  app.use(
    '/assets',
    express.static(join(dist, 'assets'), { immutable: true, maxAge: '1y', index: false, fallthrough: false }),
  );
  app.use(express.static(dist, { index: false, maxAge: 0 }));
  app.get(/^\/(?!api\/|socket\.io\/).*/, (_req, res) => {
    res.setHeader('cache-control', 'no-cache');
    res.sendFile(join(dist, 'index.html'));
  });
}
