import type { Express } from 'express';
import pg from 'pg';
import { boardSql } from '../src/features/board/index.ts';

/** Mounts the bare route: session and user are read as for any endpoint, then plain pg. */
export function mountBare(app: Express, pool: pg.Pool, path: string, day: string, now: string): void {
  const text = asPositional(boardSql, { day, now });
  app.get(path, (_req, res, next) => {
    pool.query<{ board: unknown }>(text).then(
      ({ rows }) => res.json(rows[0]?.board),
      (error: unknown) => next(error),
    );
  });
}

/** The statement's named values written in, as the product's own call does. */
export function asPositional(sql: string, values: Record<string, string>): string {
  return sql.replace(/(?<!:):(\w+)/g, (all, name: string) =>
    name in values ? pg.escapeLiteral(values[name] ?? '') : all,
  );
}
