import { describe, expect, it } from 'vitest';
import { exact } from '../money/exact.ts';
import { decimalText, toCents, toCentsUp } from '../money/rounding.ts';
import { checkPay } from './check/pay-check.ts';
import { halfTimeOnAmount, halfTimePremium, hoursOver, minimumWageShortfall, regularRate } from './regular-rate.ts';
import examples from './testing/published-examples.json' with { type: 'json' };

/*
 * Worked examples of US pay law: each has its source and how it was come by ("published", "from memory" or "computed
 * by hand from the rule"). Where the printed figure was rounded on the way, `exact` is the one the engine is held to.
 */

/** Kinds that state a fact or a choice in words and have nothing to work out. */
const TEXT_ONLY = ['method_choice', 'reference'];
/** Kinds without a scenario of their own; each has its direct test below. */
const DIRECT = ['sham_bonus', 'coefficient_table', 'rounding_money', 'reporting'];

const NUMBER = /^-?\d+(\.\d+)?$/;

/** Compares figures to the fewer places of the two, and everything else as it is. */
function expectSame(found: unknown, wanted: unknown, name: string): void {
  if (Array.isArray(wanted)) {
    expect(found, name).toHaveLength(wanted.length);
    wanted.forEach((item, index) => expectSame((found as unknown[])[index], item, `${name}[${index}]`));
  } else if (typeof wanted === 'object' && wanted !== null) {
    for (const [key, value] of Object.entries(wanted))
      expectSame((found as Record<string, unknown>)[key], value, `${name}.${key}`);
  } else if (typeof wanted === 'string' && typeof found === 'string' && NUMBER.test(wanted) && NUMBER.test(found)) {
    const places = Math.min(placesOf(wanted), placesOf(found));
    expect(decimalText(exact(found), places), name).toBe(decimalText(exact(wanted), places));
  } else {
    expect(found, name).toEqual(wanted);
  }
}

function placesOf(text: string): number {
  return text.split('.')[1]?.length ?? 0;
}

function example(id: string): (typeof examples)[number] {
  const found = examples.find((item) => item.id === id);
  if (!found) throw new Error(`There is no example "${id}".`);
  return found;
}

describe('worked examples through the scenarios', () => {
  const worked = examples.filter((item) => ![...TEXT_ONLY, ...DIRECT].includes(item.kind));

  it.each(worked.map((item) => [`${item.source} (${item.basis}): ${item.title}`, item] as const))(
    '%s',
    (_name, item) => {
      const [answer] = checkPay([{ id: item.id, kind: item.kind, inputs: item.inputs }]);
      if (!answer || 'error' in answer) throw new Error(answer?.error);
      const wanted = { ...item.expected, ...('exact' in item ? item.exact : {}) };
      for (const [name, value] of Object.entries(wanted)) expectSame(answer.result[name], value, name);
    },
  );

  it('prints money and hours with two places and rates with four', () => {
    const [answer] = checkPay([example('cfr-778.110b')]);
    expect(answer).toMatchObject({
      result: { gross_total: '637.00', overtime_hours: '6.00', regular_rate: '13.0000', half_time_rate: '6.5000' },
    });
  });

  it('leaves no kind without a test', () => {
    const tested = new Set([...worked.map((item) => item.kind), ...TEXT_ONLY, ...DIRECT]);
    expect(examples.filter((item) => !tested.has(item.kind))).toEqual([]);
  });
});

describe('worked examples by the rules themselves', () => {
  it('29 CFR 778.503: a bonus that always tops pay up to 300.00 is no bonus; 48 hours are owed 25.00 more', () => {
    const total = exact('300.00');
    const rate = regularRate(total, exact(48)) ?? exact(0);
    expect(decimalText(rate, 2)).toBe('6.25');
    expect(toCents(halfTimePremium(rate, hoursOver(exact(48))))).toBe(2500);
  });

  it('WH-134 as reproduced in a university payroll manual: the extra half time per dollar, to three places', () => {
    const { coefficients } = example('whd-wh134-coefficients').expected as { coefficients: Record<string, string> };
    for (const [hours, coefficient] of Object.entries(coefficients)) {
      expect(decimalText(halfTimeOnAmount(exact(1), exact(hours), hoursOver(exact(hours))), 3)).toBe(coefficient);
    }
    expect(Object.keys(coefficients)).toHaveLength(15);
  });

  it('DOL Fact Sheets #65 and #39B: what the law sets as a floor is never rounded down', () => {
    expect(toCentsUp(exact('5.4375'))).toBe(544);
    expect(toCentsUp(exact('7.66234'))).toBe(767);
    expect(toCentsUp(minimumWageShortfall(exact(0), exact('1/3'), exact('7.25')))).toBe(242);
  });

  it('IRC 225, figures ours: only the half that the federal rule asks for is qualified overtime', () => {
    const qualified = ['45', '45', '38'].map((hours) => toCents(halfTimePremium(exact(20), hoursOver(exact(hours)))));
    expect(qualified).toEqual([5000, 5000, 0]);
  });
});
