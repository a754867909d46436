import pg from 'pg';
import type { Server } from 'socket.io';
import type { Socket } from 'socket.io-client';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import { hintEvent } from '@driprail/shared/realtime/hints';
import { boardSql, visitFrom, visitJson } from '../src/features/board/index.ts';
import { asPositional } from './bare-board.ts';
import { inTurn, median } from './measure.ts';
import type { Ratio } from './measure.ts';
import type { BenchStage } from './stage.ts';

const ROUNDS = 60;

/** From a drag's save to the other client's screen, against the same statements in one plain transaction and a bare emit. */
export async function benchDrag({
  url,
  cookie,
  day,
  now,
  pool,
  socket,
  bareServer,
  bareSocket,
}: BenchStage): Promise<Ratio> {
  const board = (await (await fetch(`${url}/api/board/${day}`, { headers: { cookie } })).json()) as BoardDto;
  const visit = board.visits.filter((v) => v.progress === 'placed').at(-1);
  if (!visit?.from || !visit.to || !visit.vanId) throw new Error('the demo day has a placed visit');
  const { id, vanId, from, to } = visit;
  let { planVersion } = visit;
  let isLater = false;
  const span = () => {
    isLater = !isLater;
    const shift = isLater ? 300_000 : 0;
    return {
      from: new Date(Date.parse(from) + shift).toISOString(),
      to: new Date(Date.parse(to) + shift).toISOString(),
    };
  };
  const product = async () => {
    const heard = once(socket, hintEvent);
    const start = performance.now();
    const warnings = board.reasonKinds.map((code) => code);
    const body = JSON.stringify({ moves: [{ visitId: id, planVersion, vanId, ...span() }], accept: [] });
    const answer = await fetch(`${url}/api/board/moves`, {
      method: 'POST',
      body,
      headers: { cookie, 'content-type': 'application/json' },
    });
    if (!answer.ok)
      throw new Error(`a move answered ${answer.status} (${warnings.join(', ')}): ${await answer.text()}`);
    await heard;
    planVersion += 1;
    return performance.now() - start;
  };
  const plain = async () => {
    const heard = once(bareSocket, 'moved');
    const start = performance.now();
    await plainMove(pool, { id, vanId, day, now, ...span() });
    emit(bareServer);
    await heard;
    planVersion += 1;
    return performance.now() - start;
  };
  const [a, b] = await inTurn(ROUNDS, 10, product, plain);
  return {
    what: 'a drag saved and heard / the same statements in one transaction and a bare emit',
    ratio: median(a) / median(b),
    goal: 3,
    note: `${median(a).toFixed(1)} ms / ${median(b).toFixed(1)} ms, median of ${ROUNDS}`,
  };
}

async function plainMove(
  pool: pg.Pool,
  { id, vanId, day, now, from, to }: { id: string; vanId: string; day: string; now: string; from: string; to: string },
): Promise<void> {
  const client = await pool.connect();
  const one = `SELECT ${visitJson} AS visit FROM ${visitFrom} WHERE v.id = ${pg.escapeLiteral(id)}`;
  try {
    await client.query('BEGIN');
    await client.query('SELECT * FROM visits WHERE id = $1 ORDER BY id FOR UPDATE', [id]);
    await client.query(one);
    await client.query('SELECT * FROM company_settings WHERE id = 1');
    await client.query(asPositional(boardSql, { day, now }));
    await client.query('SET CONSTRAINTS visits_van_at_one_stop DEFERRED');
    await client.query(
      `UPDATE visits SET van_id = $2, planned = tstzrange($3, $4), plan_version = plan_version + 1, version = version + 1 WHERE id = $1`,
      [id, vanId, from, to],
    );
    await client.query('SELECT name FROM vans WHERE id = $1', [vanId]);
    await client.query(
      `INSERT INTO visit_events (id, visit_id, kind, from_progress, to_progress, device_at, received_at, occurred_at)
       VALUES (gen_random_uuid(), $1, 'plan', 'placed', 'placed', now(), now(), now())`,
      [id],
    );
    await client.query('SET CONSTRAINTS visits_van_at_one_stop IMMEDIATE');
    await client.query(one);
    await client.query('COMMIT');
  } finally {
    client.release();
  }
}

function emit(server: Server): void {
  server.emit('moved', { id: 'visit' });
}

function once(socket: Socket, event: string): Promise<void> {
  return new Promise((resolve) => socket.once(event, () => resolve()));
}
