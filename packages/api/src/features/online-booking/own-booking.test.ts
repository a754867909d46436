import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Response } from 'supertest';
import type { ErrorBody } from '@driprail/shared/contracts/error.contract';
import type { OwnBookingDto } from '@driprail/shared/contracts/online-booking.contract';
import { select } from '../../db/sequelize.ts';
import { NOON, useApp } from '../../testing/app.ts';
import { aCompany, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { jobByNumber, openOnline, strangers } from './testing/book-online.ts';

const test = useApp();
let company: TestCompany;
beforeAll(async () => {
  company = await aCompany(test);
  await openOnline(company);
});
beforeEach(async () => {
  test.time.now = NOON;
  await select(`UPDATE visits SET progress = 'called_off'`);
});
const { bookOne } = strangers(test, () => company);
const faultOf = (answer: Response) => (answer.body as ErrorBody).error;
const jobOf = (number: number) => jobByNumber(company, number);

describe('called off by the link', () => {
  const later = '2026-05-14T18:30:00.000Z';
  const ofPath = (path: string) => path.slice(3);
  const own = async (path: string) =>
    (
      (
        await test
          .anonymous()
          .get(`/api/customer-pages/${ofPath(path)}/booking`)
          .expect(200)
      ).body as {
        booking: OwnBookingDto;
      }
    ).booking;
  const press = (path: string, feeCents: number) =>
    test
      .anonymous()
      .post(`/api/customer-pages/${ofPath(path)}/call-off`)
      .send({ feeCents });

  it('is free until the hours of the accepted terms, and the place is free again', async () => {
    const { path, jobNumber } = await bookOne({}, { from: later });
    expect(await own(path)).toMatchObject({ mayChange: true, feeCents: 0, freeUntil: '2026-05-14T16:30:00.000Z' });
    await press(path, 0).expect(200);
    expect(first((await jobOf(jobNumber)).visits).progress).toBe('called_off');
    expect(await own(path)).toMatchObject({ mayChange: false });
    await press(path, 0).expect(422);
  });

  it('costs the fee that was shown after that: written on the job, billed to nobody', async () => {
    const { path, jobNumber } = await bookOne({}, { from: later });
    test.time.now = '2026-05-14T16:30:01.000Z';
    expect(faultOf(await press(path, 0).expect(409)).message).toContain('50.00');
    expect(await own(path)).toMatchObject({ mayChange: true, feeCents: 5000 });
    await press(path, 5000).expect(200);
    const job = await jobOf(jobNumber);
    expect(first(job.visits).reason).toContain('a fee of 50.00 is proposed');
    expect(await select('SELECT proposed_fee_cents FROM online_bookings WHERE job_id = :id', { id: job.id })).toEqual([
      { proposed_fee_cents: 5000 },
    ]);
    expect(await select('SELECT id FROM invoices WHERE job_id = :id', { id: job.id })).toEqual([]);
  });

  it('is not for a crew that has set off, nor for a job of the desk', async () => {
    const { path, jobNumber } = await bookOne({}, { from: later });
    const { id } = await jobOf(jobNumber);
    await select(`UPDATE visits SET progress = 'on_the_way' WHERE job_id = :id`, { id });
    expect((await own(path)).mayChange).toBe(false);
    await press(path, 0).expect(422);
    const { job } = await company.aJob();
    const { url } = (await (await company.owner()).post(`/api/jobs/${job.id}/pay-link`).expect(200)).body as {
      url: string;
    };
    expect(await own(`/c/${url.split('/c/')[1] ?? ''}`)).toMatchObject({ mayChange: false, policy: null });
  });
});
