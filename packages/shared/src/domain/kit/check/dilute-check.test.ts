import { describe, expect, it } from 'vitest';
import { checkKit } from './dilute-check.ts';

function errorOf(section: string, inputs: unknown): string {
  const [answer] = checkKit([{ id: 'x', section, inputs }]);
  if (!answer || 'result' in answer) throw new Error(`Worked out: ${JSON.stringify(answer)}`);
  return answer.error;
}

function resultOf(section: string, inputs: unknown): Record<string, unknown> {
  const [answer] = checkKit([{ id: 'x', section, inputs }]);
  if (!answer || 'error' in answer) throw new Error(answer?.error);
  return answer.result;
}

describe('inputs that make no sense', () => {
  it.each([
    ['no size', 'dilution', {}, /nothing to work out/],
    ['a negative bottle', 'dilution', { ratio: '10:1', bottleFlOz: -32 }, 'bottleFlOz may not be negative.'],
    ['an empty bottle', 'dilution', { ratio: '10:1', bottleFlOz: 0 }, 'The size of the mix must be more than 0.'],
    ['a ratio of zero', 'dilution', { ratio: '0:1', bottleFlOz: 32 }, /may be 0/],
    ['two parts that are not 1', 'dilution', { ratio: '3:2', bottleFlOz: 32 }, /one of the two parts must be 1/],
    ['a bare number', 'dilution', { ratio: '7', bottleFlOz: 32 }, /What does 7 mean\?/],
    ['a ratio that is no text', 'dilution', { ratio: 10, bottleFlOz: 32 }, 'ratio needs text.'],
    ['more product than bottle', 'dilution', { productFlOz: 40, bottleFlOz: 32 }, /more concentrate than the bottle/],
    ['no water to add to', 'dilution', { flOz: 10, gallonsOfWater: 0 }, 'gallonsOfWater must be more than 0.'],
    ['over 100 percent', 'dilution', { stockPercentWW: 101, stockDensity: 1, ratio: '4:1' }, /more than 100 percent/],
    ['a density of zero', 'dilution', { stockPercentWW: 10, stockDensity: 0, ratio: '4:1' }, /density/],
    ['an upside-down range', 'dilution', { stockPercentRange: [6, 5], ratio: '10:1' }, /lower and the upper/],
    ['an unknown class', 'mixtureExamples', { ingredients: [{ pct: 5, class: 'sticky' }] }, /"sticky" is not known/],
    ['more than everything', 'mixtureExamples', { skinCat1Pct: 60, skinCat2Pct: 60 }, /add up to more than 100/],
    ['a pH of 70', 'mixtureExamples', { measuredPH: 70 }, /is no pH/],
    ['no toxicity', 'mixtureExamples', { route: 'oral', ingredients: [{ pct: 1, ate: 0 }] }, /ate must be more than 0/],
    ['an unknown route', 'mixtureExamples', { route: 'nasal', ingredients: [{ pct: 1, ate: 5 }] }, /none of oral/],
    ['half a box', 'materialsOfTrade', { items: [{ grossKg: 2, count: 1.5 }] }, 'items.0.count needs a whole number.'],
    ['no weight', 'materialsOfTrade', { items: [{ what: 'box' }] }, 'items.0.grossKg is missing.'],
    ['no class', 'materialsOfTrade', { colour: 'red' }, /name no class/],
    ['an odd packing group', 'materialsOfTrade', { class: '8', packingGroup: 'IV' }, /none of I, II and III/],
    ['humidity of 120', 'heatIndex', { T: 90, RH: 120 }, /between 0 and 100/],
    ['no humidity', 'heatIndex', { T: 90 }, /RH, the relative humidity/],
    ['air of 900 degrees', 'heatIndex', { T: 900, RH: 20 }, /Air temperature/],
    ['a VIN that is a number', 'vin', { vin: 1234567 }, 'vin needs text.'],
    ['a latitude of 91', 'geo', { from: [91, 0], to: [0, 0] }, /latitude/],
    ['one end only', 'geo', { from: [40, -75] }, 'to needs a list with at least one entry.'],
    ['a speed of zero', 'geo', { straightMi: 3, circuity: 1.3, mph: 0 }, /speed/],
    ['inputs that are a list', 'geo', [], 'The scenario needs inputs, an object.'],
    ['an unknown section', 'towels', {}, /"towels" is not known/],
    ['a section of Object', 'constructor', {}, /"constructor" is not known/],
  ])('%s', (_name, section, inputs, wanted) => {
    expect(errorOf(section, inputs)).toMatch(wanted instanceof RegExp ? wanted : new RegExp(`^${escaped(wanted)}$`));
  });

  it('answers every scenario in order, whatever the others are', () => {
    const answers = checkKit([null, 7, { section: 'vin' }, { id: 3, section: 'vin', inputs: { vin: '' } }]);
    expect(answers.map(({ id }) => id)).toEqual(['#1', '#2', '#3', '3']);
    expect(answers[3]).toEqual({ id: '3', result: { valid: null, reason: 'empty: the VIN is optional' } });
  });
});

describe('inputs in other shapes', () => {
  it.each([
    ['milliliters', 'dilution', { ratio: '10:1', bottleMl: 1100 }, { productMl: 100, waterMl: 1000 }],
    ['a gallon', 'dilution', { ratio: '1:7', bottleGal: 1 }, { productGal: 0.125, productFlOz: 16, waterFlOz: 112 }],
    ['a percentage', 'dilution', { percentVV: 12.5 }, { ratio: '7:1', ratioExact: 7 }],
    ['straight', 'dilution', { ratio: 'straight', bottleFlOz: 16 }, { productFlOz: 16, waterFlOz: 0, percentVV: 100 }],
    [
      'a chart that adds',
      'dilution',
      { waterFlOz: 128, rows: ['1:10'] },
      { rows: [{ ratio: '1:10', exactFlOz: 12.8 }] },
    ],
    [
      'the density that matters',
      'mixtureExamples',
      { stockPercentWW: 30, stockDensity: 1.3, ratio: '10:1', ingredientClass: 'Skin corrosion 1' },
      { skin: 'Category 2', eye: 'Category 1', eyeIfDensityIgnored: 'Category 2' },
    ],
    [
      'a category for an estimate',
      'mixtureExamples',
      { route: 'dermal', ingredients: [{ pct: 1, category: 1 }] },
      { ateMix: 500, category: 3 },
    ],
    [
      'nothing toxic',
      'mixtureExamples',
      { route: 'oral', ingredients: [{ pct: 0, ate: 5 }] },
      { ateMix: null, category: 'not classified' },
    ],
    [
      'inhaled mist',
      'mixtureExamples',
      { route: 'inhalation (mists)', ingredients: [{ pct: 50, ate: 1 }] },
      { ateMix: 2, category: 4 },
    ],
    ['400 gallons', 'materialsOfTrade', { us: '400 gal' }, { unit: 'L', limit: 1500, usExceedsMetric: true }],
    ['440 pounds', 'materialsOfTrade', { us: '440 lb' }, { unit: 'kg', limit: 200, usExceedsMetric: false }],
    [
      'over the edge',
      'materialsOfTrade',
      { items: [{ grossKg: 20.1, count: 10 }] },
      { totalKg: 201, withinAggregate: false },
    ],
    [
      'wash water',
      'materialsOfTrade',
      { items: [{ grossKg: 300, hazardous: false }] },
      { totalKg: 0, withinAggregate: true },
    ],
    ['explosives', 'materialsOfTrade', { classes: ['1'] }, { allowed: false }],
    ['hard work', 'heatIndex', { heatIndex: 95, strenuous: true }, { risk: 'High' }],
    ['full sun', 'heatIndex', { heatIndex: 101, directSun: true }, { risk: 'Very High to Extreme' }],
    ['Celsius', 'heatIndex', { tempC: 32.2222222222, RH: 70 }, { rounded: 106 }],
    ['kilometers', 'geo', { straightKm: 10, circuity: 1.3, kmh: 26 }, { roadKm: 13, minutes: 30 }],
    ['named coordinates', 'geo', { from: { lat: 0, lng: 0 }, to: { lat: 0, lon: 0 } }, { km: 0 }],
  ])('%s', (_name, section, inputs, wanted) => {
    expect(resultOf(section, inputs)).toMatchObject(wanted);
  });
});

function escaped(text: string): string {
  return text.replaceAll(/[.()]/g, String.raw`\$&`);
}
