import { describe, expect, it } from 'vitest';
import { exact } from '../../money/exact.ts';
import mixing from '../testing/published-mixing.json' with { type: 'json' };
import { expectPublished, named } from '../testing/published-rows.ts';
import { chartRatio } from './chart-ratio.ts';
import { mixCosts } from './mix-cost.ts';

const quart = { size: exact(32), unit: 'US fl oz' } as const;

describe('what a mix costs', () => {
  it.each(named(mixing.dilution.filter(({ id }) => id.startsWith('cost-'))))('%s', (_name, row) => {
    const { ratio, costPerGal } = row.inputs as { ratio: string; costPerGal: number };
    const price = exact(costPerGal).mul(5);
    const costs = mixCosts({ price, size: exact(5), unit: 'US gal' }, chartRatio(ratio), quart);
    expectPublished({ costPerReadyGal: costs.perGallon.valueOf() }, row);
    expect(costs.perBottle.mul(4).equals(costs.perGallon)).toBe(true);
  });

  it('goes from metric to US sizes by the exact factors (computed by hand from the rule)', () => {
    const tenth = mixCosts({ price: exact(22), size: exact(1), unit: 'L' }, chartRatio('10:1'), quart);
    expect(tenth.perLiter.toFraction()).toBe('2');
    expect(tenth.perGallon.valueOf()).toBe(7.570823568);
  });

  it('refuses a container without a size and a negative price', () => {
    const ratio = chartRatio('10:1');
    expect(() => mixCosts({ price: exact(1), size: exact(0), unit: 'L' }, ratio, quart)).toThrow('container');
    expect(() => mixCosts({ price: exact(-1), size: exact(1), unit: 'L' }, ratio, quart)).toThrow('negative');
  });
});
