import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exact, type Exact } from '../../money/exact.ts';
import mixing from '../testing/published-mixing.json' with { type: 'json' };
import { expectPublished, named, type PublishedRow } from '../testing/published-rows.ts';
import { readAmount } from './read-amount.ts';
import {
  celsius,
  convertLength,
  convertVolume,
  convertWeight,
  fahrenheit,
  isVolumeUnit,
  isWeightUnit,
  millilitersOf,
} from './units.ts';

function converted({ inputs }: PublishedRow): Exact {
  const { value, from, to } = inputs as { value: number; from: string; to: string };
  const given = exact(value);
  if (isVolumeUnit(from) && isVolumeUnit(to)) return convertVolume(given, from, to);
  if (isWeightUnit(from) && isWeightUnit(to)) return convertWeight(given, from, to);
  if (from === 'mi' && to === 'km') return convertLength(given, from, to);
  if (from === 'degF' && to === 'degC') return celsius(given);
  throw new Error(`No conversion from ${from} to ${to}.`);
}

describe('published factors', () => {
  it.each(named(mixing.units))('%s', (_name, row) => {
    const found = converted(row);
    if (row.expected.exact === true) expect(found.equals(exact(Number(row.expected.value)))).toBe(true);
    expectPublished({ value: found.valueOf(), exact: true }, row);
  });
});

describe('amounts as people write them', () => {
  it.each([
    ['16 fl oz', 'volume', 'US fl oz', '16'],
    ['16 Fl. Oz.', 'volume', 'US fl oz', '16'],
    ['1,5 L', 'volume', 'L', '3/2'],
    ['500ml', 'volume', 'mL', '500'],
    ['5 gal', 'volume', 'US gal', '5'],
    ['1 imperial gallon', 'volume', 'imperial gal', '1'],
    ['66 lb', 'weight', 'lb', '66'],
    ['3 oz wt', 'weight', 'oz (weight)', '3'],
  ])('%s is a %s in %s', (text, kind, unit, value) => {
    const read = readAmount(text);
    if (read.kind === 'question' || read.kind === 'unreadable') throw new Error(`Not understood: ${text}`);
    expect([read.kind, read.unit, read.value.toFraction()]).toEqual([kind, unit, value]);
  });

  it('asks whether an ounce is a volume or a weight', () => {
    const read = readAmount('16 oz');
    expect(read).toMatchObject({ question: 'Is 16 oz a volume (fluid ounces) or a weight?' });
    if (read.kind === 'question') expect(read.readings.map(({ kind }) => kind)).toEqual(['volume', 'weight']);
  });

  it.each([
    ['16', /a number and a unit/],
    ['-1 gal', /negative/],
    ['1,500 mL', /without a comma/],
    ['3 barrels', /"barrels" is not known/],
  ])('%s is not read', (text, reason) => {
    const read = readAmount(text);
    expect(read.kind === 'unreadable' && read.reason).toMatch(reason);
  });

  it('turns a weight into a volume only by the density', () => {
    expect(millilitersOf(exact(1), 'kg', exact('1.25')).toFraction()).toBe('800');
    expect(() => millilitersOf(exact(1), 'kg', exact(0))).toThrow('density');
  });

  it('comes back from any unit as it went', () => {
    fc.assert(
      fc.property(fc.integer({ min: -5000, max: 5000 }), (whole) => {
        const value = exact(whole).div(7);
        expect(
          convertVolume(convertVolume(value, 'US tsp', 'imperial gal'), 'imperial gal', 'US tsp').equals(value),
        ).toBe(true);
        expect(fahrenheit(celsius(value)).equals(value)).toBe(true);
      }),
    );
  });
});
