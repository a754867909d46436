import { describe, expect, test } from 'vitest';
import type { Change, ChangeFacts, ChangeLine } from './judge-change.ts';
import { usualSurcharges } from '../menu/condition-surcharge.ts';
import { judgeChange } from './judge-change.ts';

const at = (clock: string) => `2026-05-14T${clock}:00.000Z`;
const wash: ChangeLine = {
  ...{ id: 'l1', serviceId: 'wash', serviceName: 'Wash and wax', vehicleId: 'car', vehicle: '2019 hatchback' },
  ...{ sizeClass: 'sedan', priceCents: 12_900, minutes: 90, isFinished: false },
};
const engine: ChangeLine = {
  ...wash,
  id: 'l2',
  serviceId: 'engine',
  serviceName: 'Engine bay',
  priceCents: 5500,
  minutes: 30,
};
const offer = (serviceId: string, name: string, priceCents: number, minutes: number, skills: string[] = []) => ({
  ...{
    serviceId,
    name,
    kind: 'single' as const,
    skills,
    weather: '',
    prices: [{ sizeClass: 'sedan' as const, priceCents, minutes }],
  },
});
const facts: ChangeFacts = {
  ...{ zone: 'America/New_York', clock: '12', startedAt: at('15:00'), plannedFrom: at('14:45') },
  ...{ crewSize: 1, crewSkills: [], lines: [wash, engine] },
  offers: [
    offer('wash', 'Wash and wax', 12_900, 90),
    offer('polish', 'One-step polish', 28_000, 165, ['correction']),
    offer('lamps', 'Headlight restoration', 4800, 40),
  ],
  surcharges: usualSurcharges,
  next: { customerName: 'Odette Yarrow', windowTo: at('19:00'), driveMinutes: 15 },
};
const judge = (change: Change, more: Partial<ChangeFacts> = {}, now = at('15:30')) => {
  const judged = judgeChange({ ...facts, ...more }, change, now);
  if (!judged.ok) throw new Error(judged.message);
  return judged.change;
};
const refusal = (change: Change, more: Partial<ChangeFacts> = {}) => {
  const judged = judgeChange({ ...facts, ...more }, change, at('15:30'));
  return judged.ok ? null : judged.message;
};
const addLamps = { kind: 'add', serviceId: 'lamps', vehicleId: 'car', sizeClass: 'sedan' } as const;

describe('a change at the car', () => {
  test('raises the condition by the owner’s percents, price and minutes each by its own', () => {
    const raise = { kind: 'condition', lineId: 'l1', condition: 'dirty', extraCents: 0, extraMinutes: 0 } as const;
    const usual = judge(raise);
    const set = judge(raise, { surcharges: { ...usualSurcharges, dirty: { pricePercent: 35, minutesPercent: 10 } } });
    // 129.00 at 20 percent is 25.80, at 35 percent 45.15; 90 minutes at 20 percent are 18, at 10 percent 9, in fives.
    expect([usual.priceDifferenceCents, usual.minutesDifference]).toEqual([2580, 20]);
    expect([set.priceDifferenceCents, set.minutesDifference]).toEqual([4515, 10]);
  });

  test('adds a service at the menu’s price; the finish moves by the crew’s minutes', () => {
    // 90 + 30 minutes from 15:00 is 17:00; 40 more is 17:40.
    expect(judge(addLamps)).toMatchObject({
      ...{ priceDifferenceCents: 4800, minutesDifference: 40, words: 'Headlight restoration added' },
      ...{ finishBefore: at('17:00'), finishAfter: at('17:40'), hindrances: [] },
    });
    // Two people need 0.6 of the time: 120 becomes 75 (steps of five), 160 becomes 100.
    expect(judge(addLamps, { crewSize: 2 }).minutesDifference).toBe(25);
  });

  test('counts an hour more as an hour later for a crew that is over already', () => {
    const over = judge(addLamps, {}, at('17:20'));
    expect(over.finishBefore).toBe(at('17:20'));
    expect(over.finishAfter).toBe(at('18:00'));
  });

  test('before work has started counts from the plan, or from now when that is past', () => {
    expect(judge(addLamps, { startedAt: null, plannedFrom: at('16:00') }).finishAfter).toBe(at('18:40'));
    expect(judge(addLamps, { startedAt: null }).finishAfter).toBe(at('18:10'));
  });

  test('drops and swaps a line; a drop stands in nobody’s way', () => {
    expect(judge({ kind: 'drop', lineId: 'l2' })).toMatchObject({
      priceDifferenceCents: -5500,
      minutesDifference: -30,
    });
    const swapped = judge({ kind: 'swap', lineId: 'l2', serviceId: 'lamps' });
    expect(swapped).toMatchObject({
      priceDifferenceCents: -700,
      words: 'Engine bay swapped for Headlight restoration',
    });
    expect(swapped.after[1]).toMatchObject({ id: 'l2', serviceId: 'lamps' });
    const late = { next: { customerName: 'x', windowTo: at('16:00'), driveMinutes: 0 } };
    expect(judge({ kind: 'drop', lineId: 'l2' }, late).hindrances).toEqual([]);
  });

  test('raises the condition by the factor of the menu (common practice, no source), or as typed', () => {
    const raise = (condition: 'dirty' | 'very_dirty' | 'other', extraCents = 0, extraMinutes = 0) =>
      judge({ kind: 'condition', lineId: 'l1', condition, extraCents, extraMinutes });
    expect(raise('dirty')).toMatchObject({ priceDifferenceCents: 2580, minutesDifference: 20 });
    expect(raise('very_dirty')).toMatchObject({ priceDifferenceCents: 6450, minutesDifference: 45 });
    expect(raise('other', 2000, 15)).toMatchObject({ priceDifferenceCents: 2000, minutesDifference: 15 });
    expect(refusal({ kind: 'condition', lineId: 'l1', condition: 'other', extraCents: 0, extraMinutes: 0 })).toBe(
      'Give minutes or an amount.',
    );
  });

  test('rounds half a cent of the surcharge up', () => {
    const odd = { lines: [{ ...wash, priceCents: 1003 }, engine] };
    const raised = judge(
      { kind: 'condition', lineId: 'l1', condition: 'very_dirty', extraCents: 0, extraMinutes: 0 },
      odd,
    );
    expect(raised.priceDifferenceCents).toBe(502);
  });
});

describe('what stands in the way', () => {
  test('a skill that nobody in the crew has', () => {
    const polish = { kind: 'add', serviceId: 'polish', vehicleId: 'car', sizeClass: 'sedan' } as const;
    const { hindrances } = judge(polish, { next: null });
    expect(hindrances).toEqual([{ code: 'missing_skill', message: 'Nobody in this crew has the skill correction.' }]);
    expect(judge(polish, { next: null, crewSkills: ['correction'] }).hindrances).toEqual([]);
  });

  test('the van’s next promise, with the drive, to the minute', () => {
    const promised = (clock: string) => ({
      next: { customerName: 'Odette Yarrow', windowTo: at(clock), driveMinutes: 15 },
    });
    // Through at 17:40, there at 17:55.
    expect(judge(addLamps, promised('17:55')).hindrances).toEqual([]);
    expect(judge(addLamps, promised('17:54')).hindrances).toEqual([
      {
        code: 'next_promise',
        message: 'Odette Yarrow is promised by 1:54 pm; the van would be there about 1:55 pm.',
      },
    ]);
    expect(judge(addLamps, { next: { customerName: 'x', windowTo: null, driveMinutes: 15 } }).hindrances).toEqual([]);
  });
});

test.each([
  ['a line that is gone', { kind: 'drop', lineId: 'l9' }, {}, /not on this visit any more/],
  [
    'a finished line',
    { kind: 'drop', lineId: 'l1' },
    { lines: [{ ...wash, isFinished: true }, engine] },
    /finished one stays/,
  ],
  ['the last line', { kind: 'drop', lineId: 'l1' }, { lines: [wash] }, /at least one service/],
  ['what is not sold', { kind: 'swap', lineId: 'l1', serviceId: 'polish' }, { offers: [] }, /not on the menu/],
  ['the same service', { kind: 'swap', lineId: 'l1', serviceId: 'wash' }, {}, /it is already/],
] as [string, Change, Partial<ChangeFacts>, RegExp][])(
  '%s is refused with what to do',
  (_what, change, more, words) => {
    expect(refusal(change, more)).toMatch(words);
  },
);
