import fc from 'fast-check';
import { expect, it } from 'vitest';
import distances from '../../geo/testing/published-distances.json' with { type: 'json' };
import vins from '../../vehicle/testing/published-vins.json' with { type: 'json' };
import hazards from '../testing/published-hazards.json' with { type: 'json' };
import mixing from '../testing/published-mixing.json' with { type: 'json' };
import type { PublishedRow } from '../testing/published-rows.ts';
import vanAndHeat from '../testing/published-van-and-heat.json' with { type: 'json' };
import { checkKit } from './dilute-check.ts';

const SECTIONS: [string, readonly PublishedRow[]][] = [
  ['dilution', mixing.dilution],
  ['mixtureExamples', hazards.mixtureExamples],
  ['materialsOfTrade', vanAndHeat.materialsOfTrade],
  ['heatIndex', vanAndHeat.heatIndex],
  ['vin', vins],
  ['geo', distances],
];

const anything = fc.oneof(
  fc.jsonValue({ maxDepth: 2 }),
  fc.constantFrom(
    0,
    -1,
    1e-7,
    1e21,
    1e308,
    '',
    '1:',
    ':',
    '1e9',
    'NaN',
    '∞',
    '１：１０',
    null,
    [],
    {},
    [91, 0],
    [0, -181],
    [1e21, 0, -1],
  ),
);

/** A published row with one of its fields replaced by anything at all. */
const spoilt = fc.constantFrom(...SECTIONS).chain(([section, rows]) =>
  fc.constantFrom(...rows.filter((row) => Object.keys(row.inputs).length > 0)).chain((row) =>
    fc.record({
      id: fc.constant('x'),
      section: fc.constant(section),
      inputs: fc
        .tuple(fc.constantFrom(...Object.keys(row.inputs)), anything)
        .map(([name, value]): Record<string, unknown> => ({ ...row.inputs, [name]: value })),
    }),
  ),
);

it('answers any spoilt input with a sentence or with figures, and never breaks', () => {
  fc.assert(
    fc.property(spoilt, (scenario) => {
      const [answer] = checkKit([scenario]);
      if (!answer) throw new Error('There is no answer.');
      if ('error' in answer) {
        expect(answer.error).toMatch(/[.?]$/);
        expect(answer.error).not.toContain('could not be worked out');
      } else {
        expectFigures(answer.result);
      }
    }),
    { numRuns: 2000 },
  );
});

/** NaN and Infinity would be printed as null. */
function expectFigures(value: unknown): void {
  if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true);
  else if (typeof value === 'object' && value !== null) Object.values(value).forEach(expectFigures);
}
