import { describe, expect, it } from 'vitest';
import distances from '../../geo/testing/published-distances.json' with { type: 'json' };
import vins from '../../vehicle/testing/published-vins.json' with { type: 'json' };
import hazards from '../testing/published-hazards.json' with { type: 'json' };
import mixing from '../testing/published-mixing.json' with { type: 'json' };
import { expectPublished, named, type PublishedRow } from '../testing/published-rows.ts';
import vanAndHeat from '../testing/published-van-and-heat.json' with { type: 'json' };
import { checkKit } from './dilute-check.ts';

/** Rows that print a formula or compare two tables, and ask nothing. */
const TEXT_ONLY = ['formula', 'table-mismatches'];

/** Its input, 1/11, is printed to six places, so that the whole number is met within a hundredth only. */
const ROUNDED_INPUT = { 'ate-dilute-conc250-10to1': 0.01 } as Record<string, number>;

const SECTIONS: Record<string, readonly PublishedRow[]> = {
  dilution: mixing.dilution,
  mixtureExamples: hazards.mixtureExamples,
  materialsOfTrade: vanAndHeat.materialsOfTrade,
  heatIndex: vanAndHeat.heatIndex.filter((row) => !TEXT_ONLY.includes(row.id)),
  vin: vins,
  geo: distances,
};

describe.each(Object.entries(SECTIONS))('published figures: %s', (section, rows) => {
  it.each(named(rows))('%s', (_name, row) => {
    const [answer] = checkKit([{ id: row.id, section, inputs: row.inputs }]);
    if (!answer || 'error' in answer) throw new Error(answer?.error);
    expect(answer.id).toBe(row.id);
    expectPublished(answer.result, { ...row, expected: { tolerance: ROUNDED_INPUT[row.id], ...row.expected } });
  });
});
