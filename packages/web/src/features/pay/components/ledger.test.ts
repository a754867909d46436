import { describe, expect, test } from 'vitest';
import { howText, ledgerGroups, lineWords, rateText } from './ledger.ts';
import { aPayLine } from './testing/pay-line.factory.ts';

describe('the ledger', () => {
  test('groups add up to the gross, and what was received already stays out of it', () => {
    const lines = [
      aPayLine({ key: 'tip:1', kind: 'tip', amountCents: 500, workedOn: '2026-05-06' }),
      aPayLine({ key: 'hourly:1', kind: 'hourly', amountCents: 82_388 }),
      aPayLine({ key: 'tip:2', kind: 'tip_already_received', amountCents: 900, isPayable: false }),
      aPayLine({ key: 'overtime_premium', kind: 'overtime_premium', amountCents: 2_431 }),
      aPayLine({ key: 'deduction:1', kind: 'deduction', amountCents: -2_400 }),
    ];
    const groups = ledgerGroups({ lines });
    expect(groups.map((group) => [group.title, group.cents])).toEqual([
      ['Hours', 84_819],
      ['Tips', 500],
      ['Tips already received', 900],
      ['Adjustments', -2_400],
    ]);
    const paid = groups.filter((group) => group.isPayable).reduce((sum, group) => sum + group.cents, 0);
    expect(paid).toBe(lines.filter((line) => line.isPayable).reduce((sum, line) => sum + line.amountCents, 0));
  });

  test('commission at one rate says it in the title, at two rates it does not', () => {
    const six = aPayLine({ key: 'a', kind: 'commission', rate: '6' });
    const eight = aPayLine({ key: 'b', kind: 'commission', rate: '8' });
    expect(ledgerGroups({ lines: [six] })[0]?.title).toBe('Commission, 6% of the line');
    expect(ledgerGroups({ lines: [six, eight] })[0]?.title).toBe('Commission');
  });

  test('lines stand by date', () => {
    const late = aPayLine({ key: 'late', kind: 'tip', workedOn: '2026-05-09' });
    const soon = aPayLine({ key: 'soon', kind: 'tip', workedOn: '2026-05-04' });
    expect(ledgerGroups({ lines: [late, soon] })[0]?.lines.map((line) => line.key)).toEqual(['soon', 'late']);
  });
});

describe('how a line came about', () => {
  test('hours at a rate, and the premium at half the exact regular rate', () => {
    expect(howText(aPayLine({ kind: 'hourly', hours: '169/4', rate: '19.5' }))).toBe('42:15 at 19.50');
    // 912.98 / 42.25 h is 21.6090; half is 10.8045 (arithmetic of the drawn week).
    expect(howText(aPayLine({ kind: 'overtime_premium', hours: '9/4', rate: '91298/4225' }))).toBe('2:15 at 10.8045');
  });

  test('a share says of what', () => {
    const step = { label: '', note: '', arithmetic: '240.00', result: '240.00', sources: [] };
    const commission = aPayLine({ kind: 'commission', rate: '6', working: [step, step] });
    expect(howText(commission)).toBe('6% of 240.00');
    expect(howText({ ...commission, working: [step, step, step] })).toBe('share of 6% of 240.00');
  });

  test('the job number is not said twice', () => {
    const tip = aPayLine({ kind: 'tip', label: 'Tip, job 4127, by card', jobId: 'j1', jobNumber: 4127 });
    expect(lineWords(tip, {})).toBe('Tip, by card');
  });

  test('the customer of the job stands beside what was done, as long as there is one', () => {
    const polish = aPayLine({ kind: 'commission', label: 'One-step polish', jobId: 'j1', jobNumber: 4127 });
    expect(lineWords(polish, { j1: 'Galloway' })).toBe('One-step polish, Galloway');
    expect(lineWords(polish, { j2: 'Nakagawa' })).toBe('One-step polish');
  });

  test('rates keep the places they have', () => {
    expect(['19.5', '18', '19.125'].map(rateText)).toEqual(['19.50', '18.00', '19.125']);
  });
});
