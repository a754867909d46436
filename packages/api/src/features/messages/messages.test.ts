import { beforeAll, describe, expect, test } from 'vitest';
import { Message } from '../../db/models/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany, aCustomer, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';
import { deliveryParts } from '../../deliveries.ts';
import { localTexts } from '../../integrations/texts/index.ts';
import { createCustomer } from '../customers/index.ts';
import { createJob } from '../booking/index.ts';
import type { DeliveryParts } from './index.ts';
import { sendDueMessages } from './index.ts';

const app = useApp();
let company: TestCompany;
let parts: DeliveryParts;
const now = () => new Date(app.time.now);
const texts = localTexts(now);
beforeAll(async () => {
  company = await aCompany(app);
  parts = deliveryParts({
    ...{ secret: 'only for tests', sendMail: app.send, texts, mailKnowsRepeats: true },
    baseUrl: () => 'http://127.0.0.1:4600',
  });
});
const later = (seconds: number) => {
  app.time.now = new Date(now().getTime() + seconds * 1000).toISOString();
};
const deliver = () => sendDueMessages(parts, now);

async function aCustomerWith(email: string, consents: object[] = []) {
  return createCustomer(company.ctx, { ...aCustomer('Hana Okafor'), email, consents } as never);
}
async function aJob(
  customer: Awaited<ReturnType<typeof aCustomerWith>>,
  window = ['2026-05-15T14:00:00.000Z', '2026-05-15T15:00:00.000Z'],
) {
  return createJob(company.ctx, {
    ...{ customerId: customer.id, addressId: first(customer.addresses).id },
    ...{ windowFrom: window[0] ?? null, windowTo: window[1] ?? null, notes: '', discountCents: 0, discountReason: '' },
    lines: [{ serviceId: company.wash.id, vehicleId: first(customer.vehicles).id, sizeClass: 'sedan' }],
  });
}

describe('booked', () => {
  test('goes out after the undo time with a calendar file, and names no code', async () => {
    const customer = await aCustomerWith('hana@mail.example');
    await aJob(customer);
    expect(await deliver()).toBe(0);
    later(300);
    expect(await deliver()).toBe(1);
    const mail = first(app.taken());
    expect(mail).toMatchObject({ to: 'hana@mail.example', subject: 'Booked: Fri May 15, 10:00 to 11:00 am' });
    expect(mail.calendar).toContain('DTSTART:20260515T140000Z');
    expect(mail.text).toMatch(/Open your page: http:\/\/127\.0\.0\.1:4600\/c\/\S{20,}/);
    expect(JSON.stringify(mail)).not.toMatch(/4471|Saltpan|Dog/);
    expect(await Message.count({ where: { customerId: customer.id, state: 'sent' } })).toBe(1);
    expect(await deliver()).toBe(0);
  });
});
