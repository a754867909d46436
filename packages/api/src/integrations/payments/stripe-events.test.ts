import type { Stripe } from 'stripe';
import { describe, expect, test } from 'vitest';
import { paymentEventOf } from './stripe-events.ts';

/** Events the stand-in does not send: shapes by the SDK's types, orders of states by the service's documentation. */
const event = (type: string, object: object, previous_attributes?: object) =>
  ({ id: 'evt_1', created: 1_780_000_000, type, data: { object, previous_attributes } }) as unknown as Stripe.Event;
const kind = (...parts: Parameters<typeof event>) => paymentEventOf(event(...parts)).kind;

const refund = { id: 're_1', amount: 500, payment_intent: 'pi_1' };
const dispute = { id: 'du_1', amount: 500, payment_intent: { id: 'pi_1' } };
const session = {
  id: 'cs_1',
  metadata: { attemptId: 'a1' },
  payment_status: 'paid',
  payment_intent: 'pi_1',
  amount_total: 500,
};

describe('what an event means', () => {
  test('carries the service’s time and id', () => {
    expect(paymentEventOf(event('payout.paid', {}))).toEqual({
      id: 'evt_1',
      kind: 'other',
      at: new Date('2026-05-28T20:26:40Z'),
      type: 'payout.paid',
    });
  });

  test('a session is paid when its money is there, and ours when it names an attempt', () => {
    expect(kind('checkout.session.completed', session)).toBe('paid');
    expect(kind('checkout.session.completed', { ...session, payment_status: 'unpaid' })).toBe('other');
    expect(kind('checkout.session.async_payment_succeeded', session)).toBe('paid');
    expect(kind('checkout.session.async_payment_failed', { ...session, payment_status: 'unpaid' })).toBe('failed');
    expect(kind('checkout.session.completed', { ...session, metadata: {} })).toBe('other');
    expect(kind('checkout.session.expired', { ...session, metadata: null })).toBe('other');
  });

  test('a refund counts once, when it has succeeded', () => {
    expect(kind('refund.created', { ...refund, status: 'succeeded' })).toBe('refunded');
    expect(kind('refund.created', { ...refund, status: 'pending' })).toBe('other');
    expect(kind('refund.updated', { ...refund, status: 'succeeded' }, { status: 'pending' })).toBe('refunded');
    expect(kind('refund.updated', { ...refund, status: 'succeeded' }, { metadata: {} })).toBe('other');
    expect(kind('refund.failed', { ...refund, status: 'failed' })).toBe('other');
  });

  test('a dispute is open once money is held back, not while the bank only asks', () => {
    expect(kind('charge.dispute.created', { ...dispute, status: 'needs_response' })).toBe('dispute_opened');
    expect(kind('charge.dispute.created', { ...dispute, status: 'warning_needs_response' })).toBe('other');
    const held = { ...dispute, status: 'needs_response' };
    expect(kind('charge.dispute.updated', held, { status: 'warning_under_review' })).toBe('dispute_opened');
    expect(kind('charge.dispute.updated', held, { status: 'under_review' })).toBe('other');
    expect(kind('charge.dispute.closed', { ...dispute, status: 'warning_closed' })).toBe('other');
    expect(kind('charge.dispute.closed', { ...dispute, status: 'lost' })).toBe('dispute_lost');
  });
});
