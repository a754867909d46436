import { describe, expect, test } from 'vitest';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { goesBack, readCredit } from './credit-draft.ts';

const bill = {
  owedCents: 0,
  lines: [
    { id: 'wash', taxClass: 'standard', priceCents: 24_000, discountCents: 0, creditedCents: 4000 },
    { id: 'mat', taxClass: 'untaxed', priceCents: 3000, discountCents: 500, creditedCents: 0 },
  ],
  taxes: [{ id: 'tax', taxClass: 'standard', baseCents: 24_000, taxCents: 1500, creditedCents: 250 }],
} as unknown as BillDto;

describe('amounts typed by line', () => {
  test('give back their tax in proportion, to the cent with what went back before', () => {
    expect(readCredit(bill, { wash: '48.00', mat: '' }).amounts).toMatchObject({ netCents: 4800, taxCents: 300 });
    expect(readCredit(bill, { wash: '200', mat: '25' }).amounts).toMatchObject({ netCents: 22_500, taxCents: 1250 });
  });
  test('say at the line what is wrong, and nothing where nothing was typed', () => {
    expect(readCredit(bill, { wash: '200.01' }).faults).toEqual({ wash: 'More than is left of this line.' });
    expect(readCredit(bill, { mat: 'ten' }).faults).toHaveProperty('mat');
    expect(readCredit(bill, { mat: '0' }).faults).toHaveProperty('mat');
    expect(readCredit(bill, { mat: ' ' })).toEqual({ picks: [], faults: {}, amounts: null });
  });
});

test.each([
  ['paid in full: all of the credit', 0, 5100, 10_000, 0, 5100],
  ['not paid yet: nothing moves', 25_500, 5100, 10_000, 0, 0],
  ['partly owed: what is too much then', 2000, 5100, 10_000, 0, 3100],
  ['no more than is left of the payment', 0, 5100, 10_000, 9000, 1000],
  ['paid too much before: that goes back with it', -700, 5100, 10_000, 0, 5800],
])('%s', (_name, owedCents, credit, amountCents, refundedCents, back) => {
  expect(goesBack({ owedCents }, credit, { amountCents, refundedCents })).toBe(back);
  expect(goesBack({ owedCents }, credit, null)).toBe(0);
});
