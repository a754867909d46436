import { expect, test } from 'vitest';
import { commissionTest } from './commission-test.ts';
import { computePayWeek } from './compute-pay-week.ts';
import { aDoneLine, aRate, aWeek, aWorkedWeek } from './testing/pay-week.factory.ts';

const weekAt = (hourly: string, sold: number) => {
  const rates = [aRate('hourly', hourly), aRate('commission_percent', '40')];
  const input = aWeek({ entries: aWorkedWeek([540, 540, 540, 540, 540]), rates, doneLines: [aDoneLine(1, sold)] });
  const [person] = computePayWeek(input).people;
  if (!person) throw new Error('Ada worked.');
  return { minimumWage: '7.25', person };
};

test('29 CFR 779.415, figures ours: more than half from commission, and every overtime week above 10.875', () => {
  // 45 h at 5.00 are 225.00, commission 400.00: 13.89 an hour.
  const good = weekAt('5', 100_000);
  expect(commissionTest([good])).toMatchObject({ isMostlyCommission: true, overtimeWeeks: 1, overtimeWeeksPassed: 1 });
  // 45 h at 8.00 and 40.00 of commission: 8.89 an hour.
  const poor = weekAt('8', 10_000);
  expect(commissionTest([poor])).toMatchObject({ isMostlyCommission: false, overtimeWeeks: 1, overtimeWeeksPassed: 0 });
  expect(commissionTest([good, poor])).toMatchObject({ weeks: 2, commissionCents: 44_000, overtimeWeeksPassed: 1 });
});

test('29 CFR 779.419: the threshold itself fails', () => {
  const { minimumWage, person } = weekAt('5', 100_000);
  const at = { minimumWage, person: { ...person, regularRate: '87/8' } };
  expect(commissionTest([at]).overtimeWeeksPassed).toBe(0);
});
