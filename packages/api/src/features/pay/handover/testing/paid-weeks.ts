import type TestAgent from 'supertest/lib/agent.js';
import { parse } from 'csv-parse/sync';
import { v7 as uuid } from 'uuid';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import { ClockEntry } from '../../../../db/models/index.ts';

/** A clock entry on a day of New York’s summer time, from "07:00" to "12:30". */
export async function worked(
  personId: string,
  day: string,
  from: string,
  to: string,
  kind: ClockKindName = 'shop',
  visitId: string | null = null,
): Promise<void> {
  const at = (clock: string) => new Date(`${day}T${clock}:00-04:00`);
  await ClockEntry.create({ id: uuid(), personId, kind, visitId, startedAt: at(from), endedAt: at(to) });
}

export async function hourly(owner: TestAgent, personId: string, value: string): Promise<void> {
  const rate = { kind: 'hourly', personId, serviceId: null, clockKind: null, value, startsOn: '2026-01-01' };
  await owner.post('/api/pay/rates').send(rate).expect(200);
}

/** What an endpoint answers as bytes. */
export async function bytesOf(agent: TestAgent, path: string): Promise<{ status: number; type: string; body: Buffer }> {
  const answer = await agent
    .get(path)
    .buffer(true)
    .parse((res, done) => {
      const parts: Buffer[] = [];
      res.on('data', (part: Buffer) => parts.push(part));
      res.on('end', () => done(null, Buffer.concat(parts)));
    });
  return { status: answer.status, type: answer.type, body: answer.body as Buffer };
}

/** Rows of a file by column name. */
export function rowsOf(csv: string): Record<string, string>[] {
  return parse(csv, { columns: true, record_delimiter: '\r\n' });
}
