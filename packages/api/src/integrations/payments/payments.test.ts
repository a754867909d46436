import { v7 as uuid } from 'uuid';
import { describe, expect, test } from 'vitest';
import { usePayments } from '../../testing/payments.ts';
import type { LinkAsk } from './index.ts';
import { PaymentSignatureError, paymentsFor } from './index.ts';

const rig = usePayments();

const anAsk = (more: Partial<LinkAsk> = {}): LinkAsk => ({
  attemptId: uuid(),
  amountCents: 12_345,
  currency: 'usd',
  label: 'Invoice 1042, Tern & Tide',
  returnUrl: 'http://127.0.0.1:4600/bill/1042',
  ...more,
});

/** A link that has been paid, with the payment behind it. */
async function aPayment(more: Partial<LinkAsk> = {}) {
  const ask = anAsk(more);
  const link = await rig.payments.createLink(ask);
  await rig.press(link.url, 'pay');
  const { paymentRef } = await rig.arrived('paid');
  return { ask, link, paymentRef };
}

/** The ids of the events that the stand-in has sent or would have sent. */
async function told(type?: string): Promise<string[]> {
  const { events } = await rig.hook<{ events: { id: string; type: string }[] }>('/events');
  return events.filter((event) => !type || event.type === type).map(({ id }) => id);
}

const reason = (error: unknown) => (error as { reason?: string }).reason;
const reasonOf = (work: Promise<unknown>) => work.then(() => 'none', reason);

describe('a link', () => {
  test('leads to a page with the label and the amount, and no field for a card', async () => {
    const { url } = await rig.payments.createLink(anAsk());
    const html = await (await fetch(url)).text();
    expect(html).toContain('Invoice 1042, Tern &amp; Tide');
    expect(html).toContain('Pay $123.45');
    expect(html).toContain('no money moves');
    expect(html).not.toMatch(/<input|<script/);
    const font = await fetch(`${rig.fake.url}/pay/font.woff2`);
    expect([font.status, font.headers.get('content-type')]).toEqual([200, 'font/woff2']);
  });

  test('is the same for the same attempt, and another for another', async () => {
    const ask = anAsk();
    const [first, second] = await Promise.all([rig.payments.createLink(ask), rig.payments.createLink(ask)]);
    expect(second).toEqual(first);
    expect((await rig.payments.createLink(anAsk())).ref).not.toBe(first.ref);
  });

  test('is refused for the same attempt with another amount', async () => {
    const ask = anAsk();
    await rig.payments.createLink(ask);
    expect(await reasonOf(rig.payments.createLink({ ...ask, amountCents: 1 + ask.amountCents }))).toBe('key_reused');
  });

  test('shows what somebody wrote as text', async () => {
    const { url } = await rig.payments.createLink(anAsk({ label: '<b>"O’Hara" & sons</b>' }));
    expect(await (await fetch(url)).text()).toContain('&lt;b&gt;&quot;O’Hara&quot; &amp; sons&lt;/b&gt;');
  });

  test.each([0, -1, 12.5, Number.NaN])('is not asked for with %s cents', async (amountCents) => {
    await expect(rig.payments.createLink(anAsk({ amountCents }))).rejects.toThrow(RangeError);
  });

  test('is refused under 50 cents, in a sentence', async () => {
    await expect(rig.payments.createLink(anAsk({ amountCents: 49 }))).rejects.toThrow('less than a card can pay');
  });

  test.each(['before', 'after'] as const)('comes once through a failure %s the work, by the same key', async (when) => {
    await rig.hook('/faults', { when, times: 1 });
    const ask = anAsk();
    const link = await rig.payments.createLink(ask);
    expect(await rig.payments.createLink(ask)).toEqual(link);
  });

  test('says that the service can’t be reached when it fails again and again', async () => {
    await rig.hook('/faults', { when: 'before', times: 3 });
    expect(await reasonOf(rig.payments.createLink(anAsk()))).toBe('unreachable');
  });
});

describe('paying', () => {
  test('sends the customer back and tells it with the attempt, the payment and the amount', async () => {
    const ask = anAsk();
    const link = await rig.payments.createLink(ask);
    expect(await rig.payments.lookUp(link.ref)).toEqual({ state: 'open', paymentRef: null });
    const answer = await rig.press(link.url, 'pay');
    expect([answer.status, answer.headers.get('location')]).toEqual([303, ask.returnUrl]);
    const paid = await rig.arrived('paid');
    expect(paid).toMatchObject({ ref: link.ref, attemptId: ask.attemptId, amountCents: 12_345 });
    expect(Math.abs(paid.at.getTime() - Date.now())).toBeLessThan(60_000);
    expect(await rig.payments.lookUp(link.ref)).toEqual({ state: 'paid', paymentRef: paid.paymentRef });
  });

  test('in two tabs at once takes the money once', async () => {
    const before = await told('checkout.session.completed');
    const { url } = await rig.payments.createLink(anAsk());
    await Promise.all([rig.press(url, 'pay'), rig.press(url, 'pay')]);
    await rig.press(url, 'pay');
    expect(await told('checkout.session.completed')).toHaveLength(before.length + 1);
    await rig.arrived('paid');
  });

  test('with a refused card tells it, leaves the link open and takes another card', async () => {
    const ask = anAsk();
    const link = await rig.payments.createLink(ask);
    const answer = await rig.press(link.url, 'refuse');
    expect(await (await fetch(new URL(answer.headers.get('location') ?? '', link.url))).text()).toContain(
      'was refused',
    );
    expect(await rig.arrived('failed')).toMatchObject({ attemptId: ask.attemptId });
    expect((await rig.payments.lookUp(link.ref)).state).toBe('open');
    await rig.press(link.url, 'pay');
    expect(await rig.arrived('paid')).toMatchObject({ attemptId: ask.attemptId });
  });

  test('is told again until the app has taken it', async () => {
    rig.failNext(3);
    const { link } = await aPayment();
    expect((await rig.payments.lookUp(link.ref)).state).toBe('paid');
  });

  test('can be told later, the other way round and twice, each time by the same id', async () => {
    await rig.hook('/webhooks', { mode: 'hold' });
    const { url } = await rig.payments.createLink(anAsk());
    await rig.press(url, 'pay');
    const held = (await told()).slice(-2);
    await rig.hook('/webhooks/release', { order: 'reversed' });
    const arrived = () => rig.events.map(({ id }) => id).filter((id) => held.includes(id));
    expect(arrived()).toEqual(held.toReversed());
    const { id } = await rig.arrived('paid');
    await rig.hook(`/events/${id}/send`, { times: 2 });
    expect(arrived()).toEqual([...held.toReversed(), id, id]);
  });

  test('is found by looking up when its events are lost', async () => {
    await rig.hook('/webhooks', { mode: 'drop' });
    const { ref, url } = await rig.payments.createLink(anAsk());
    await rig.press(url, 'pay');
    await rig.hook('/webhooks', { mode: 'deliver' });
    expect((await rig.payments.lookUp(ref)).state).toBe('paid');
    expect(rig.events.filter(({ kind }) => kind === 'paid')).toEqual([]);
  });
});

describe('an event', () => {
  test.each(['wrong', 'stale', 'missing'])('with a %s signature is not believed', async (signature) => {
    await aPayment();
    const { id } = await rig.arrived('paid');
    expect(await rig.hook(`/events/${id}/send`, { signature })).toEqual({ answers: [400] });
    expect([rig.refused(), rig.events.filter((event) => event.id === id).length]).toEqual([1, 1]);
  });

  test('changed on the way is not believed', () => {
    const raw = Buffer.from('{"type":"checkout.session.completed"}');
    expect(() => rig.payments.readEvent(raw, 't=1,v1=00')).toThrow(PaymentSignatureError);
    expect(() => rig.payments.readEvent(raw, '')).toThrow(PaymentSignatureError);
  });
});

describe('a refund', () => {
  test('of a part, and of the rest, is told; the same key gives the same', async () => {
    const { paymentRef } = await aPayment();
    const part = { paymentRef, amountCents: 2345, key: uuid() };
    const { refundRef } = await rig.payments.refund(part);
    expect(await rig.payments.refund(part)).toEqual({ refundRef });
    expect(await rig.arrived('refunded')).toMatchObject({ paymentRef, refundRef, amountCents: 2345 });
    expect(await reasonOf(rig.payments.refund({ paymentRef, amountCents: 10_001, key: uuid() }))).toBe('too_much');
    await rig.payments.refund({ paymentRef, amountCents: 10_000, key: uuid() });
    await expect(rig.payments.refund({ paymentRef, amountCents: 1, key: uuid() })).rejects.toThrow(
      'given back already',
    );
  });

  test('whose answer got lost is made once', async () => {
    const { paymentRef } = await aPayment();
    await rig.hook('/faults', { when: 'after', times: 1 });
    await rig.payments.refund({ paymentRef, amountCents: 12_000, key: uuid() });
    await rig.arrived('refunded');
    expect(await reasonOf(rig.payments.refund({ paymentRef, amountCents: 346, key: uuid() }))).toBe('too_much');
    expect(await reasonOf(rig.payments.refund({ paymentRef, amountCents: 345, key: uuid() }))).toBe('none');
  });

  test('of a payment that never went through, or that nobody knows, is refused', async () => {
    const link = await rig.payments.createLink(anAsk());
    await rig.press(link.url, 'refuse');
    await rig.arrived('failed');
    const { paymentRef } = await rig.payments.lookUp(link.ref);
    const refund = (ref: string) => rig.payments.refund({ paymentRef: ref, amountCents: 100, key: uuid() });
    expect(await reasonOf(refund(paymentRef ?? ''))).toBe('unpaid');
    expect(await reasonOf(refund('pi_unknown'))).toBe('unknown');
  });
});

describe('a link that must take no more money', () => {
  test('is ended, told, and ended again without complaint', async () => {
    const ask = anAsk();
    const { ref, url } = await rig.payments.createLink(ask);
    await rig.payments.expireLink(ref);
    await rig.payments.expireLink(ref);
    expect(await rig.arrived('expired')).toMatchObject({ ref, attemptId: ask.attemptId });
    await rig.press(url, 'pay');
    expect(await rig.payments.lookUp(ref)).toEqual({ state: 'expired', paymentRef: null });
    expect(await (await fetch(url)).text()).toContain('This link has ended');
  });

  test('says so when it was paid before', async () => {
    const { link } = await aPayment();
    await expect(rig.payments.expireLink(link.ref)).rejects.toThrow('has been paid already');
    expect(await reasonOf(rig.payments.expireLink(link.ref))).toBe('paid');
  });

  test('is not known when the service does not know it', async () => {
    expect(await reasonOf(rig.payments.expireLink('cs_test_unknown'))).toBe('unknown');
    expect(await reasonOf(rig.payments.lookUp('cs_test_unknown'))).toBe('unknown');
    expect((await fetch(`${rig.fake.url}/pay/cs_test_unknown`)).status).toBe(404);
  });
});

test.each(['won', 'lost'] as const)('a dispute is told when opened and when %s, and holds refunds', async (as) => {
  const { paymentRef } = await aPayment();
  const { id } = await rig.hook<{ id: string }>('/disputes', { paymentRef });
  expect(await rig.arrived('dispute_opened')).toMatchObject({ paymentRef, disputeRef: id, amountCents: 12_345 });
  expect(await reasonOf(rig.payments.refund({ paymentRef, amountCents: 1, key: uuid() }))).toBe('disputed');
  await rig.hook(`/disputes/${id}/close`, { as });
  expect(await rig.arrived(`dispute_${as}`)).toMatchObject({ paymentRef, disputeRef: id });
});

test('a key the service does not accept is the owner’s to mend, and without any cards are not set up', async () => {
  const wrong = paymentsFor({ ...rig.fake.place, secretKey: 'sk_other' });
  expect(await reasonOf(wrong.createLink(anAsk()))).toBe('not_set_up');
  expect(await reasonOf(paymentsFor(null).createLink(anAsk()))).toBe('not_set_up');
  expect(() => paymentsFor(null).readEvent(Buffer.from('{}'), 't=1,v1=00')).toThrow(PaymentSignatureError);
});
