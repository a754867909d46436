import type TestAgent from 'supertest/lib/agent.js';
import { v4 as key } from 'uuid';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import type { TestApp } from './app.ts';
import type { TestCompany } from './company.ts';

/** The pay weeks as an owner reads and locks them. */
export function payWeeks(owner: TestAgent) {
  const read = async (day: string) => (await owner.get(`/api/pay/weeks/${day}`).expect(200)).body as PayWeekDto;
  return {
    read,
    lock: async (day: string) => {
      for (const to of ['checked', 'locked']) {
        const { week } = await read(day);
        await owner.post(`/api/pay/weeks/${day}/state`).send({ to, version: week.version }).expect(200);
      }
    },
  };
}

/** A job of 240.00 that Sefa finishes on May 14 at 12:30 company time; the app's clock stands there afterwards. */
export async function aDoneJob(app: TestApp, company: TestCompany, owner: TestAgent) {
  const { job, visit } = await company.aJob();
  const move = { visitId: visit.id, planVersion: 0, vanId: company.vans.gannet.id };
  const times = { from: '2026-05-14T15:30:00Z', to: '2026-05-14T17:00:00Z' };
  await owner
    .post('/api/board/moves')
    .send({ moves: [{ ...move, ...times }] })
    .expect(200);
  const sefa = await company.sefa();
  const presses = [
    ['set_off', '15:10'],
    ['arrive', '15:20'],
    ['start_work', '15:30'],
    ['finish', '16:30'],
  ] as const;
  for (const [kind, at] of presses) {
    app.time.now = `2026-05-14T${at}:00Z`;
    await sefa.post(`/api/visits/${visit.id}/actions`).send({ key: key(), kind, deviceAt: app.time.now }).expect(200);
  }
  return { job, visit };
}
