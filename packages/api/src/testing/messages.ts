import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import { rangeOf } from '../db/models/columns.ts';
import { Message, Visit } from '../db/models/index.ts';
import { createJob } from '../features/booking/index.ts';
import { createCustomer } from '../features/customers/index.ts';
import { sendDueMessages } from '../features/messages/index.ts';
import type { TestApp } from './app.ts';
import { aCustomer, first } from './company.ts';
import type { TestCompany } from './company.ts';

const TEN_MINUTES = 600_000;

/** Customers with jobs, and a clock that is moved on by hand. */
export function messageStage(app: TestApp, company: () => TestCompany) {
  const now = () => new Date(app.time.now);
  const later = (seconds: number) => {
    app.time.now = new Date(now().getTime() + seconds * 1000).toISOString();
  };
  const deliver = () => sendDueMessages(app.deliveries, now);
  let count = 0;

  async function someone(more: object = {}) {
    count += 1;
    const [email, phone] = [`guest${count}@mail.example`, `555-01${10 + count}`];
    const fields = { ...aCustomer('Hana Okafor'), email, phone, ...more } as Parameters<typeof createCustomer>[1];
    return { customer: await createCustomer(company().ctx, fields), email, phone };
  }
  type Someone = Awaited<ReturnType<typeof someone>>;

  const fieldsOf = ({ customer }: Someone, windowFrom: string, windowTo: string) => ({
    ...{ customerId: customer.id, addressId: first(customer.addresses).id, windowFrom, windowTo },
    ...{ notes: '', discountCents: 0, discountReason: '' },
    lines: [{ serviceId: company().wash.id, vehicleId: first(customer.vehicles).id, sizeClass: 'sedan' as const }],
  });
  const aJob = (who: Someone, from = '2026-05-15T14:00:00.000Z', to = '2026-05-15T15:00:00.000Z') =>
    createJob(company().ctx, fieldsOf(who, from, to));

  /** A job of today whose visit is placed on the first van, and a press on it. */
  async function onTheVan(who: Someone, agent: TestAgent) {
    const job = await aJob(who, '2026-05-14T13:00:00.000Z', '2026-05-14T21:30:00.000Z');
    const visitId = first(job.visits).id;
    const from = Date.parse('2026-05-14T11:30:00.000Z') + count * TEN_MINUTES;
    await Visit.update(
      {
        ...{ vanId: company().vans.gannet.id, progress: 'placed' as const },
        planned: rangeOf(new Date(from).toISOString(), new Date(from + TEN_MINUTES).toISOString()),
      },
      { where: { id: visitId } },
    );
    const press = (kind: string, more: object = {}) =>
      agent
        .post(`/api/visits/${visitId}/actions`)
        .send({ key: uuid(), kind, deviceAt: app.time.now, ...more })
        .expect(200);
    return { job, visitId, press };
  }

  return {
    ...{ now, later, deliver, someone, fieldsOf, aJob, onTheVan },
    /** Past the undo time, and delivered. */
    settle: async () => {
      later(300);
      return deliver();
    },
    mailsTo: ({ email }: Someone) => app.taken().filter(({ to }) => to === email),
    textsTo: ({ phone }: Someone) => app.takenTexts().filter(({ to }) => to === phone),
    logOf: async (who: Someone) =>
      (
        await Message.findAll({
          where: { customerId: who.customer.id },
          order: [
            ['createdAt', 'ASC'],
            ['id', 'ASC'],
          ],
        })
      ).map(({ kind, channel, state, reason }) => ({ kind, channel, state, reason })),
  };
}
