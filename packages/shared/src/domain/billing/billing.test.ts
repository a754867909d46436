import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { owedCents } from './balance.ts';
import { creditAmounts } from './credit.ts';
import { invoiceAmounts, percentOf } from './invoice-amounts.ts';
import { taxesInForce } from './tax-rates.ts';
import type { TaxClass, TaxRate } from './tax-rates.ts';

const state: TaxRate = {
  name: 'State sales tax',
  taxClass: 'standard',
  place: '',
  percent: '6.25',
  startsOn: '2026-01-01',
};

describe('taxes in force', () => {
  it('are of each name the one that started last, a town’s own before the one for everywhere, and names add up', () => {
    const rates: TaxRate[] = [
      state,
      { ...state, percent: '7', startsOn: '2026-06-01' },
      { ...state, place: 'Ternmouth', percent: '5', startsOn: '2026-02-01' },
      { ...state, name: 'City tax', place: ' ternmouth ', percent: '1.5' },
    ];
    const on = (day: string, place: string) =>
      taxesInForce(rates, day, place).map(({ name, percent }) => `${name} ${percent}`);
    expect(on('2026-05-31', 'Elsewhere')).toEqual(['State sales tax 6.25']);
    expect(on('2026-06-01', 'Elsewhere')).toEqual(['State sales tax 7']);
    expect(on('2026-06-01', 'TERNMOUTH')).toEqual(['City tax 1.5', 'State sales tax 5']);
    expect(on('2025-12-31', 'Ternmouth')).toEqual([]);
  });

  it('end with zero percent', () => {
    expect(taxesInForce([state, { ...state, percent: '0', startsOn: '2026-07-01' }], '2026-07-01', 'x')).toEqual([]);
  });
});

describe('a percent of cents', () => {
  it('rounds the third decimal half up (Streamlined Sales and Use Tax Agreement section 324, from memory)', () => {
    // Computed by hand from the rule: 8.25 % of 10.00 is .825, of 10.06 is .82995, of 1.00 is .0825.
    expect(percentOf(1000, '8.25')).toBe(83);
    expect(percentOf(1006, '8.25')).toBe(83);
    expect(percentOf(100, '8.25')).toBe(8);
    expect(percentOf(149_00 + 48_00, '6')).toBe(11_82);
  });
});

describe('an invoice’s amounts', () => {
  it('tax what is left after the discount, each class by its own rates', () => {
    const lines = [
      { id: 'a', priceCents: 20_000, taxClass: 'standard' as const },
      { id: 'b', priceCents: 10_000, taxClass: 'untaxed' as const },
    ];
    const { startsOn: _day, ...rate } = state;
    const amounts = invoiceAmounts(lines, 3000, [rate]);
    expect(amounts.lines.map((line) => line.netCents)).toEqual([18_000, 9000]);
    expect(amounts.taxes).toMatchObject([{ baseCents: 18_000, taxCents: 1125 }]);
    expect(amounts).toMatchObject({ netCents: 27_000, taxCents: 1125, totalCents: 28_125 });
  });

  it('are nothing, not less, when the discount is larger than the price', () => {
    expect(invoiceAmounts([{ id: 'a', priceCents: 500, taxClass: 'standard' }], 900, []).totalCents).toBe(0);
  });
});

const classes: TaxClass[] = ['standard', 'reduced', 'untaxed'];
const invoices = fc.record({
  prices: fc.array(fc.record({ priceCents: fc.nat(200_000), taxClass: fc.constantFrom(...classes) }), {
    minLength: 1,
    maxLength: 6,
  }),
  discountCents: fc.nat(100_000),
  percents: fc.record({ standard: fc.nat(100_000), reduced: fc.nat(100_000) }),
});

describe('credits in any steps', () => {
  it('give back an invoice’s tax exactly, never more, and leave nothing owed', () => {
    fc.assert(
      fc.property(invoices, fc.array(fc.nat(99), { minLength: 40, maxLength: 40 }), (made, shares) => {
        const amounts = invoiceAmounts(
          made.prices.map((line, index) => ({ ...line, id: String(index) })),
          made.discountCents,
          (['standard', 'reduced'] as const).map((taxClass) => ({
            ...{ name: 'Tax', place: '', taxClass, percent: (made.percents[taxClass] / 1000).toFixed(3) },
          })),
        );
        const lines = amounts.lines.map((line) => ({ ...line, creditedCents: 0 }));
        const taxes = amounts.taxes.map((tax) => ({ ...tax, id: tax.taxClass, creditedCents: 0 }));
        let credited = 0;
        const credit = (picks: { id: string; netCents: number }[]): void => {
          const back = creditAmounts(lines, taxes, picks);
          credited += back.totalCents;
          for (const { id, netCents } of back.lines) lines.find((line) => line.id === id)!.creditedCents += netCents;
          for (const { id, taxCents } of back.taxes) taxes.find((tax) => tax.id === id)!.creditedCents += taxCents;
          for (const tax of taxes) expect(tax.creditedCents).toBeLessThanOrEqual(tax.taxCents);
        };
        for (const share of shares) {
          const line = lines[share % lines.length]!;
          const part = Math.floor(((line.netCents - line.creditedCents) * share) / 100);
          if (part > 0) credit([{ id: line.id, netCents: part }]);
        }
        const rest = lines
          .filter((line) => line.netCents > line.creditedCents)
          .map((line) => ({ id: line.id, netCents: line.netCents - line.creditedCents }));
        if (rest.length > 0) credit(rest);
        const ledger = { invoicedCents: amounts.totalCents, creditedCents: credited, paidCents: 0, refundedCents: 0 };
        expect(owedCents(ledger)).toBe(0);
      }),
    );
  });

  it('refuse more than is left of a line, and a line that is not there', () => {
    const line = { id: 'a', taxClass: 'standard' as const, netCents: 1000, creditedCents: 400 };
    expect(() => creditAmounts([line], [], [{ id: 'a', netCents: 601 }])).toThrow(RangeError);
    expect(() => creditAmounts([line], [], [{ id: 'b', netCents: 1 }])).toThrow(RangeError);
    expect(() =>
      creditAmounts(
        [line],
        [],
        [
          { id: 'a', netCents: 400 },
          { id: 'a', netCents: 400 },
        ],
      ),
    ).toThrow(RangeError);
  });
});
