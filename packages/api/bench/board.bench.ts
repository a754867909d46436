import type { Express } from 'express';
import pg from 'pg';
import { boardSql } from '../src/features/board/index.ts';
import type { BenchStage } from './stage.ts';
import { inTurn, median, timed } from './measure.ts';
import type { Ratio } from './measure.ts';

const ROUNDS = 200;

/** The signed-in board endpoint against a bare route, behind the same session middleware, that runs the same data's one statement. */
export async function benchBoard({ url, cookie, day, now, bare }: BenchStage): Promise<Ratio> {
  const get = (address: string) =>
    timed(async () => {
      const response = await fetch(address, { headers: { cookie } });
      if (!response.ok) throw new Error(`${address} answered ${response.status}`);
      await response.text();
    });
  const [endpoint, plain] = await inTurn(
    ROUNDS,
    20,
    () => get(`${url}/api/board/${day}`),
    () => get(bare),
  );
  const [a, b] = [median(endpoint), median(plain)];
  return {
    what: 'board endpoint / bare route with the same statement',
    ratio: a / b,
    goal: 1.5,
    note: `${a.toFixed(1)} ms / ${b.toFixed(1)} ms, median of ${ROUNDS}, ${now}`,
  };
}

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
