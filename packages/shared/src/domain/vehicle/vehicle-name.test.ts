import { expect, it } from 'vitest';
import { nameFromLabel, vehicleLabel } from './vehicle-name.ts';
import { countsAsBare, wheelFinishes } from './wheel-finish.ts';

it.each(['2019 hatchback', 'hatchback', '1966 long pickup', '2019'])('%s says the same in parts', (label) => {
  expect(vehicleLabel(nameFromLabel(label))).toBe(label);
});

it('the year is told from the rest', () => {
  expect(nameFromLabel(' 2019  small SUV ')).toEqual({ year: 2019, make: '', model: 'small SUV' });
  expect(nameFromLabel('3500 van')).toEqual({ year: null, make: '', model: '3500 van' });
});

it('a wheel nobody is sure of counts as bare metal', () => {
  expect(wheelFinishes.filter(countsAsBare)).toEqual(['unsure', 'polished', 'bare']);
});
