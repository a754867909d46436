import { expect, test } from 'vitest';
import { computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import type { CrewSplit } from '@driprail/shared/domain/pay/pay-week.types';
import { aDoneLine, aRate, aTip, aWeek, aWorkedWeek } from '@driprail/shared/domain/pay/testing/pay-week.factory';
import { ownPart } from './own-lines.ts';

test.each([['equal'], ['weights'], ['minutes']] as [CrewSplit][])(
  'of work and tips shared %s only the own share is told, whatever the engine’s words',
  (crewSplit) => {
    const crew = [
      { personId: 'ada', position: 0, weight: 1, isTrainee: false, minutes: 50 },
      { personId: 'bo', position: 1, weight: 3, isTrainee: false, minutes: 71 },
    ];
    const week = aWeek({
      rates: [aRate('commission_percent', '10')],
      doneLines: [aDoneLine(1, 43_210, { crew })],
      tips: [aTip('t', 3_333, { crew })],
    });
    const input = { ...week, rules: { ...week.rules, crewSplit } };
    const lines = computePayWeek(input).people[0]?.lines ?? [];
    expect(lines.map((line) => line.kind)).toEqual(['commission', 'tip']);
    const told = JSON.stringify(
      lines.map(ownPart).map((line) => line.working.map(({ sources: _ids, ...step }) => step)),
    );
    for (const secret of ['43.21', '432.10', '33.33', 'half', '71', '121', '4 parts'])
      expect(told).not.toContain(secret);
    expect(lines.map(ownPart).every((line) => line.working.at(-1)?.arithmetic === 'own share')).toBe(true);
  },
);

test('the own overtime and commission alone keep their whole working', () => {
  const week = aWeek({
    entries: aWorkedWeek([600, 600, 600, 600, 600]),
    rates: [aRate('hourly', '20'), aRate('commission_percent', '10')],
    doneLines: [aDoneLine(1, 43_210)],
  });
  const lines = computePayWeek(week).people[0]?.lines ?? [];
  expect(lines.map((line) => line.kind)).toEqual(['hourly', 'commission', 'overtime_premium']);
  expect(lines.map(ownPart)).toEqual(lines);
});
