import { describe, expect, test } from 'vitest';
import { readConfig } from '../../config.ts';

const read = (env: NodeJS.ProcessEnv) => readConfig({ DATABASE_URL: 'postgres://127.0.0.1/x', ...env });
const keys = { STRIPE_SECRET_KEY: 'sk_test_1', STRIPE_WEBHOOK_SECRET: 'whsec_1' };

describe('the settings of card payments', () => {
  test('name an account, and for tests where its stand-in listens', () => {
    expect(read(keys).payments).toEqual({ secretKey: 'sk_test_1', webhookSecret: 'whsec_1', host: null });
    expect(read({ ...keys, PAYMENTS_HOST: 'http://127.0.0.1:4690' }).payments?.host).toBe('http://127.0.0.1:4690');
    expect(read(keys).hasLocalPayments).toBe(false);
  });

  test('without keys leave the stand-in, on this machine alone', () => {
    expect(read({})).toMatchObject({ payments: null, hasLocalPayments: true });
    expect(read({ PUBLIC_URL: 'http://localhost:4600' }).hasLocalPayments).toBe(true);
    expect(read({ HOST: '0.0.0.0' }).hasLocalPayments).toBe(false);
    expect(read({ PUBLIC_URL: 'https://detail.example' }).hasLocalPayments).toBe(false);
  });

  test.each([
    [{ STRIPE_SECRET_KEY: 'sk_test_1' }, /^STRIPE_WEBHOOK_SECRET: /],
    [{ STRIPE_WEBHOOK_SECRET: 'whsec_1' }, /^STRIPE_SECRET_KEY: /],
    [{ ...keys, PAYMENTS_HOST: 'http://payments.example' }, /^PAYMENTS_HOST: without https/],
    [{ ...keys, PAYMENTS_HOST: 'not a place' }, /^PAYMENTS_HOST: /],
    [{ ...keys, STRIPE_SECRET_KEY: 'sk_live_1', PAYMENTS_HOST: 'http://127.0.0.1:4690' }, /^PAYMENTS_HOST: a live key/],
  ])('that make no sense are refused in a sentence', (env, sentence) => {
    expect(() => read(env)).toThrow(sentence);
  });
});
