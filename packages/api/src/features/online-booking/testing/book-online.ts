import type { Test } from 'supertest';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import { sendWaitingMails } from '../../../outbox/send-mails.ts';
import type { TestApp } from '../../../testing/app.ts';
import type { TestCompany } from '../../../testing/company.ts';

export const settings = {
  ...{ isOn: true, places: ['Ternmouth', '02000'], noticeHours: 1, farthestDays: 3 },
  ...{ starts: ['12:30', '14:30'], windowMinutes: 60, policyWords: 'Please be there.' },
  ...{ freeUntilHours: 2, lateFeeCents: 5000 },
};
/** 12:30 in New York on the tests' day: an hour and a half ahead. */
export const WINDOW = '2026-05-14T16:30:00.000Z';

export const who = {
  ...{ name: 'Ada Quill', phone: '555-0177', email: 'ada@mail.example', vehicle: '2019 hatchback', notes: 'Blue door' },
  policyVersion: 2,
};

/** The owner opens online booking with the company's one service. */
export async function openOnline(company: TestCompany): Promise<void> {
  await (
    await company.owner()
  )
    .put('/api/online-booking/settings')
    .send({ ...settings, serviceIds: [company.wash.id], version: 0 })
    .expect(200);
}

/** What strangers press, on a company that is open. */
export function strangers(test: TestApp, company: () => TestCompany) {
  const ask = (more: object = {}) => ({
    ...{ sizeClass: 'sedan', serviceIds: [company().wash.id], line: '3 Brine Street', city: 'ternmouth', postcode: '' },
    ...{ hasWater: true, hasPower: true },
    ...more,
  });
  const post = (path: string, body: object): Test => test.anonymous().post(path).send(body);
  const windows = (more: object = {}) => post('/api/online-booking/windows', ask(more));
  const hold = (more: object = {}) => post('/api/online-booking/holds', { ...ask(), from: WINDOW, ...more });
  const heldId = async (more: object = {}) => ((await hold(more).expect(200)).body as { hold: { id: string } }).hold.id;
  const prove = (id: string, more: object = {}) => post(`/api/online-booking/holds/${id}/code`, { ...who, ...more });
  const bookWith = (id: string, code = '') => post(`/api/online-booking/holds/${id}/booking`, { code });
  /** The latest code that was sent there. */
  const codeFor = async (email: string): Promise<string | undefined> => {
    await sendWaitingMails(test.send, () => new Date(test.time.now));
    const isCode = ({ to, subject }: { to: string; subject: string }) =>
      to === email.toLowerCase() && /^\d{6} is your code/.test(subject);
    return test.taken().find(isCode)?.subject.slice(0, 6);
  };
  /** All the way, as one person does it. */
  const bookOne = async (more: object = {}, holding: object = {}) => {
    const id = await heldId(holding);
    await prove(id, more).expect(200);
    const answer = await bookWith(id, await codeFor({ ...who, ...more }.email)).expect(200);
    return (answer.body as { booked: { jobNumber: number; path: string } }).booked;
  };
  return { windows, hold, heldId, prove, bookWith, codeFor, bookOne };
}

/** A job as the desk sees it, by its number. */
export async function jobByNumber(company: TestCompany, number: number) {
  const dispatcher = await company.dispatcher();
  const found = (await dispatcher.get(`/api/jobs?find=${number}`).expect(200)).body as { jobs: { id: string }[] };
  const { job } = (await dispatcher.get(`/api/jobs/${found.jobs[0]?.id ?? ''}`).expect(200)).body as { job: JobDto };
  return job;
}
