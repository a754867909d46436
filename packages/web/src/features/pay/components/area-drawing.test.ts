import { expect, test } from 'vitest';
import { areaDrawing, moreThanHourly } from './area-drawing.ts';
import { aPayLine, aPersonWeek } from './testing/pay-line.factory.ts';

// The drawn week, by arithmetic: 42.25 h at 19.50 is 823.88, commission 89.10, together 912.98; half the regular
// rate on 2.25 h is 24.31.
const step = { label: '', note: '', arithmetic: '', result: '1', sources: [] };
const hourly = aPayLine({ key: 'h', hours: '169/4', rate: '19.5', amountCents: 82_388, inRegularRate: true });
const commission = aPayLine({ key: 'c', kind: 'commission', amountCents: 8_910, inRegularRate: true });
const tip = aPayLine({ key: 't', kind: 'tip', amountCents: 6_700 });
const premium = aPayLine({
  key: 'overtime_premium',
  kind: 'overtime_premium',
  hours: '9/4',
  rate: '91298/4225',
  amountCents: 2_431,
  working: [step, step, step, { ...step, result: '' }, step, step, step],
});
const person = aPersonWeek({
  hoursWorked: '169/4',
  overtimeHours: '9/4',
  regularRate: '91298/4225',
  lines: [hourly, commission, premium, tip],
});

test('layers of the area are the lines of the regular rate, with the numbers of their steps', () => {
  const drawing = areaDrawing(person, premium);
  expect(drawing?.layers).toEqual([
    { step: 2, label: '42.25 h at 19.50 is 823.88', rate: 19.5001 },
    { step: 3, label: 'commission, 2.11 on each hour, is 89.10', rate: 2.1089 },
  ]);
  expect(drawing?.premium).toEqual({ step: 6, label: 'half of 21.61 on 2.25 h is 24.31' });
});

test('the layers fill the regular rate, so that the area is the money', () => {
  const drawing = areaDrawing(person, premium);
  const height = drawing?.layers.reduce((sum, layer) => sum + layer.rate, 0) ?? 0;
  expect(height).toBeCloseTo(drawing?.regularRate ?? 0, 3);
});

test('nothing is drawn for other lines or for a premium that is not half the rate', () => {
  expect(areaDrawing(person, hourly)).toBeNull();
  expect(areaDrawing(person, { ...premium, amountCents: 2_500 })).toBeNull();
});

test('says what overtime on the hourly rate alone would leave out', () => {
  // Half of 19.50 on 2.25 h is 21.94; 24.31 is 2.37 more.
  expect(moreThanHourly(person, premium)).toContain('2.37 more');
  const alone = aPersonWeek({ ...person, lines: [hourly] });
  expect(moreThanHourly(alone, { ...premium, amountCents: 2_194 })).toBeNull();
});
