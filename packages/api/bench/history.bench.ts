import pg from 'pg';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { addDays } from '@driprail/shared/domain/time/zone';
import { TECHNICIANS, addWeek, copyLocked, fillCompany, fillOwner } from './history.ts';
import { median, timed } from './measure.ts';
import type { Ratio } from './measure.ts';
import { openApp, signIn } from './stage.ts';

const OPEN_WEEK = '2026-05-04';
const WEEKS = [4, 26, 52] as const;
const ROUNDS = 15;

/**
 * One open week of 200 technicians, worked out and sent, after 4, 26 and 52 locked weeks of history: the time per
 * technician should not grow with what lies behind.
 */
export async function benchHistory(): Promise<Ratio[]> {
  const app = await openApp(fillOwner);
  const pool = new pg.Pool({ connectionString: app.appUrl, max: 1 });
  try {
    const cookie = await signIn(app.url, 'owner');
    await fillCompany(pool);
    await addWeek(pool, OPEN_WEEK);
    const newest = addDays(OPEN_WEEK, -7);
    await lockWeek(app.url, cookie, pool, newest);
    const times: number[] = [];
    let locked = 1;
    for (const weeks of WEEKS) {
      for (; locked < weeks; locked += 1) await copyLocked(pool, newest, addDays(newest, -7 * locked));
      await pool.query('ANALYZE');
      times.push(await openWeekTime(app.url, cookie));
    }
    const [few = Number.NaN] = times;
    return times.slice(1).map((time, index) => ({
      what: `open pay week per technician, ${WEEKS[index + 1]} / ${WEEKS[0]} weeks of history, ${TECHNICIANS} technicians`,
      ratio: time / few,
      goal: 1.3,
      note: `${(time / TECHNICIANS).toFixed(2)} ms / ${(few / TECHNICIANS).toFixed(2)} ms each, median of ${ROUNDS}`,
    }));
  } finally {
    await pool.end();
    await app.close();
  }
}

async function openWeekTime(url: string, cookie: string): Promise<number> {
  const times: number[] = [];
  for (let round = 0; round < ROUNDS + 3; round += 1) {
    const time = await timed(async () => {
      const week = await read(url, cookie, OPEN_WEEK);
      if (week.people.length !== TECHNICIANS) throw new Error(`the week has ${week.people.length} people`);
    });
    if (round >= 3) times.push(time);
  }
  return median(times);
}

async function read(url: string, cookie: string, day: string): Promise<PayWeekDto> {
  const answer = await fetch(`${url}/api/pay/weeks/${day}`, { headers: { cookie } });
  if (!answer.ok) throw new Error(`the pay week answered ${answer.status}`);
  return (await answer.json()) as PayWeekDto;
}

/** A week of work, checked and locked as an owner does. */
async function lockWeek(url: string, cookie: string, pool: pg.Pool, monday: string): Promise<void> {
  await addWeek(pool, monday);
  const headers = { cookie, 'content-type': 'application/json' };
  let version = 0;
  for (const to of ['checked', 'locked']) {
    const body = JSON.stringify({ to, version });
    const answer = await fetch(`${url}/api/pay/weeks/${monday}/state`, { method: 'POST', headers, body });
    if (!answer.ok) throw new Error(`${to} answered ${answer.status}: ${await answer.text()}`);
    version = ((await answer.json()) as PayWeekDto).week.version;
  }
}
