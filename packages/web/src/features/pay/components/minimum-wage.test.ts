import { expect, test } from 'vitest';
import { minimumWageOn } from './minimum-wage.ts';

type Places = Parameters<typeof minimumWageOn>[0];

const wage = (startsOn: string, amount: string) => ({ startsOn, amount, source: '', setBy: '' });
const places = {
  places: [{ id: 'shore', name: 'Shore', minimumWages: [wage('2026-01-01', '14'), wage('2026-07-01', '15')] }],
  people: [
    { personId: 'ada', placeId: 'shore', startsOn: '2026-03-02' },
    { personId: 'ada', placeId: null, startsOn: '2026-09-07' },
  ],
} as unknown as Places;

test.each([
  ['before the person was placed', '2026-02-01', '7.25', '7.25'],
  ['at the place', '2026-03-02', '7.25', '14'],
  ['after a raise', '2026-08-01', '7.25', '15'],
  ['where the company’s is higher', '2026-08-01', '16', '16'],
  ['back at the company', '2026-09-07', '7.25', '7.25'],
])('%s', (_when, day, company, expected) => {
  expect(minimumWageOn(places, company, 'ada', day)).toBe(expected);
});

test('the company has its own', () => {
  expect(minimumWageOn(places, '7.25', null, '2026-08-01')).toBe('7.25');
});
