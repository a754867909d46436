import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Response } from 'supertest';
import type { ErrorBody } from '@driprail/shared/contracts/error.contract';
import type { OfferedDays, OnlineMenuDto, OnlineSettingsDto } from '@driprail/shared/contracts/online-booking.contract';
import { select } from '../../db/sequelize.ts';
import { createCustomer } from '../customers/index.ts';
import { NOON, useApp } from '../../testing/app.ts';
import { aCompany, aCustomer, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { removeOverHolds } from './index.ts';
import { WINDOW, jobByNumber, openOnline, settings, strangers, who } from './testing/book-online.ts';

const test = useApp();
let company: TestCompany;
beforeAll(async () => {
  company = await aCompany(test);
  await openOnline(company);
});
beforeEach(async () => {
  test.time.now = NOON;
  await select(`DELETE FROM booking_holds`);
  await select(`UPDATE visits SET progress = 'called_off'`);
});

const { windows, hold, heldId, prove, bookWith, codeFor, bookOne } = strangers(test, () => company);
const daysOf = (answer: Response) => (answer.body as { days: OfferedDays }).days;
const faultOf = (answer: Response) => (answer.body as ErrorBody).error;
const jobOf = (number: number) => jobByNumber(company, number);

it('tells nobody but the owner how it is set, and strangers only what they need', async () => {
  const owner = await company.owner();
  const kept = (await owner.get('/api/online-booking/settings').expect(200)).body as { settings: OnlineSettingsDto };
  expect(kept.settings).toMatchObject({ ...settings, policyVersion: 2, version: 1 });
  await (await company.dispatcher()).get('/api/online-booking/settings').expect(403);
  await owner
    .put('/api/online-booking/settings')
    .send({ ...settings, serviceIds: [company.wash.id], version: 0 })
    .expect(409);
  const none = await owner
    .put('/api/online-booking/settings')
    .send({ ...settings, serviceIds: [], version: 1 })
    .expect(400);
  expect(faultOf(none).fields).toHaveProperty('serviceIds');
  const { menu } = (await test.anonymous().get('/api/online-booking').expect(200)).body as { menu: OnlineMenuDto };
  expect(menu.services.map(({ name }) => name)).toEqual(['Wash and wax']);
  expect(menu.policy).toMatchObject({ version: 2, words: 'Please be there.' });
});

it('accepted terms are never changed', async () => {
  await expect(select(`UPDATE online_policies SET words = 'other' WHERE version = 2`)).rejects.toThrow(/never change/);
});

describe('windows', () => {
  it('are free while a van with a crew is, from the notice on', async () => {
    const [today, ...later] = daysOf(await windows());
    expect(today?.windows).toMatchObject([
      { from: WINDOW, isFree: true, minutes: 90 },
      { from: '2026-05-14T18:30:00.000Z', isFree: true },
    ]);
    // Nobody rides on the days after.
    expect(later.flatMap((day) => day.windows).filter(({ isFree }) => isFree)).toEqual([]);
    test.time.now = '2026-05-14T16:00:00.000Z';
    expect(daysOf(await windows())[0]?.windows).toHaveLength(1);
  });

  it('a place outside the area, a service that is not offered and a size that is not priced are said at the field', async () => {
    const far = await windows({ city: 'Elsewhere' }).expect(422);
    expect(faultOf(far).fields?.['city']).toContain('Elsewhere');
    await windows({ city: 'x', postcode: '02000-1234' }).expect(200);
    const size = await windows({ sizeClass: 'van' }).expect(422);
    expect(faultOf(size).fields?.['serviceIds']).toContain('Wash and wax');
    const bare = await windows({ line: ' ' }).expect(400);
    expect(faultOf(bare).fields).toEqual({ line: 'Give the street and number.' });
  });
});

describe('a hold', () => {
  it('of many at once only as many get it as there are places', async () => {
    const answers = await Promise.all(Array.from({ length: 6 }, () => hold()));
    // Two vans, each with room for one wash that starts within the hour.
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 200, 409, 409, 409, 409]);
    expect(faultOf(answers.find(({ status }) => status === 409)!).code).toBe('window_gone');
    expect(daysOf(await windows())[0]?.windows[0]?.isFree).toBe(false);
  });

  it('is let go after ten minutes, and sooner for another time', async () => {
    const id = await heldId();
    await hold().expect(200);
    await hold().expect(409);
    await hold({ insteadOf: id, from: '2026-05-14T18:30:00.000Z' }).expect(200);
    await hold().expect(200);
    test.time.now = '2026-05-14T15:10:00.000Z';
    expect(daysOf(await windows())[0]?.windows[0]?.isFree).toBe(true);
    expect(faultOf(await prove(id).expect(409)).code).toBe('hold_over');
    await removeOverHolds(new Date(test.time.now));
    expect(await select('SELECT id FROM booking_holds')).toEqual([]);
  });

  it('is no job before the code is typed; five wrong ones end it', async () => {
    const id = await heldId();
    await bookWith(id, '123456').expect(409);
    expect(faultOf(await prove(id, { policyVersion: 1 }).expect(409)).code).toBe('new_terms');
    await prove(id).expect(200);
    const code = await codeFor(who.email);
    const wrong = code === '000000' ? '000001' : '000000';
    for (let tries = 0; tries < 5; tries += 1)
      expect(faultOf(await bookWith(id, wrong).expect(422)).fields).toHaveProperty('code');
    await bookWith(id, code).expect(422);
    expect(await select(`SELECT job_id FROM online_bookings`)).toEqual([]);
  });

  it('a program that fills in what nobody sees gets no mail', async () => {
    const id = await heldId();
    await prove(id, { email: 'robot@mail.example', website: 'https://spam.example' }).expect(200);
    expect(await codeFor('robot@mail.example')).toBeUndefined();
  });
});

describe('a booked job', () => {
  it('stands on the board in its window, at the price shown, with the terms accepted', async () => {
    const booked = await bookOne();
    const job = await jobOf(booked.jobNumber);
    expect(job).toMatchObject({ customerName: 'Ada Quill', windowFrom: WINDOW, totalCents: 24_000 });
    expect(job.notes).toBe('Booked online.\nBlue door');
    expect(first(job.visits)).toMatchObject({ progress: 'placed', from: WINDOW });
    expect(await select('SELECT policy_version FROM online_bookings WHERE job_id = :id', { id: job.id })).toEqual([
      { policy_version: 2 },
    ]);
    await test
      .anonymous()
      .get(`/api/customer-pages/${booked.path.slice(3)}`)
      .expect(200);
  });

  it('finds the customer by e-mail and phone together, and says nothing of it', async () => {
    const known = await createCustomer(company.ctx, { ...aCustomer('Known Name'), email: 'known@mail.example' });
    const same = await jobOf((await bookOne({ email: 'Known@mail.example', phone: '(555) 0142' })).jobNumber);
    expect(same.customerId).toBe(known.id);
    const other = await jobOf((await bookOne({ email: 'known@mail.example', phone: '555-0199' })).jobNumber);
    expect(other.customerId).not.toBe(known.id);
    const parts = await select<{ places: number; cars: number }>(
      `SELECT (SELECT count(*)::int FROM addresses WHERE customer_id = :id) AS places, (SELECT count(*)::int FROM vehicles WHERE customer_id = :id) AS cars`,
      { id: known.id },
    );
    // The street is a new one, the car the one that was known.
    expect(parts).toEqual([{ places: 2, cars: 1 }]);
  });

  it('goes to Unplaced with its promise when dispatch has used up the places', async () => {
    const id = await heldId();
    await prove(id).expect(200);
    await select(`UPDATE vans SET is_active = false`);
    const booked = (await bookWith(id, await codeFor(who.email)).expect(200)).body as { booked: { jobNumber: number } };
    await select(`UPDATE vans SET is_active = true`);
    const job = await jobOf(booked.booked.jobNumber);
    expect(first(job.visits).progress).toBe('unplaced');
    expect(job).toMatchObject({ windowFrom: WINDOW, notes: expect.stringContaining('find another') as string });
    // One van's place goes to that promise.
    await hold().expect(200);
    await hold().expect(409);
  });
});
