import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { WorkEvent } from './fold-work.ts';
import { foldWork, minutesRun } from './fold-work.ts';
import { missingForDone, stillMissing } from './missing.ts';
import { mustKnowsOf, unconfirmed } from './must-knows.ts';
import { inOrderOfWork, stages } from './stages.ts';
import type { CheckStep } from './step.ts';
import { stepKey } from './step.ts';
import { towelClashes } from './towels.ts';
import type { WorkLine } from './work-plan.ts';
import { nextStep, planWork, upToHere } from './work-plan.ts';

const at = (clock: string) => `2026-05-14T${clock}:00.000Z`;
const step = (id: string, stage: CheckStep['stage'], more: Partial<CheckStep> = {}): CheckStep => ({
  ...{ id, stage, words: id, product: '', ratio: '', pour: null, dose: '', kitCase: null, towel: null },
  ...{ caution: '', isAlone: false, ...more },
});
const line = (lineId: string, steps: CheckStep[], more: Partial<WorkLine> = {}): WorkLine => ({
  ...{ lineId, serviceName: lineId, vehicleId: 'car', vehicle: 'The car', asksNote: false, steps, ...more },
});
let count = 0;
const press = (kind: WorkEvent['kind'], clock: string, more: Partial<WorkEvent> = {}): WorkEvent => ({
  ...{ id: `e${(count += 1)}`, kind, at: at(clock), by: 'Sefa Lund', steps: [], lineId: null, keys: [], words: '' },
  ...more,
});
const tick = (clock: string, ...refs: [string, string][]) =>
  press('tick', clock, { steps: refs.map(([lineId, stepId]) => ({ lineId, stepId })) });
const none = new Map<string, { at: string; by: string }>();

describe('the order of work', () => {
  test('puts the stages in order and keeps the order inside one', () => {
    const any = fc.array(fc.record({ stage: fc.constantFrom(...stages), number: fc.nat() }));
    fc.assert(
      fc.property(any, (steps) => {
        const sorted = inOrderOfWork(steps);
        expect(sorted.map((one) => stages.indexOf(one.stage))).toEqual(
          steps.map((one) => stages.indexOf(one.stage)).sort((a, b) => a - b),
        );
        for (const stage of stages)
          expect(sorted.filter((one) => one.stage === stage)).toEqual(steps.filter((one) => one.stage === stage));
      }),
    );
  });

  test('holds across the services on one car: wax comes after clay, a shared wash is done once', () => {
    const wax = line('wax', [step('rims', 'wheels'), step('Wash', 'wash'), step('Wax', 'protect')]);
    const clay = line('clay', [step('w2', 'wash', { words: 'Wash' }), step('Clay', 'decontaminate')]);
    const [car] = planWork([wax, clay], none);
    expect(car?.stages.map((one) => one.stage)).toEqual(['wheels', 'wash', 'decontaminate', 'protect']);
    expect(car?.stages[1]?.steps).toHaveLength(1);
    expect(car?.stages[1]?.steps[0]?.refs).toEqual([
      { lineId: 'wax', stepId: 'Wash' },
      { lineId: 'clay', stepId: 'w2' },
    ]);
  });

  test('keeps two cars apart', () => {
    const lines = [line('a', [step('x', 'wash')]), line('b', [step('x', 'wash')], { vehicleId: 'other' })];
    expect(planWork(lines, none)).toHaveLength(2);
  });
});

describe('done up to here', () => {
  const lines = [
    line('a', [step('rims', 'wheels'), step('wash', 'wash'), step('measure', 'correct', { isAlone: true })]),
    line('b', [step('wax', 'protect')]),
  ];
  test('ticks what is open so far, but not what is ticked by itself', () => {
    const ticks = new Map([['a/rims', { at: at('10:00'), by: 'x' }]]);
    const [car] = planWork(lines, ticks);
    if (!car) throw new Error('no car');
    expect(upToHere(car, 'correct')).toEqual([{ lineId: 'a', stepId: 'wash' }]);
    expect(nextStep([car])?.planned.step.id).toBe('wash');
  });
  test('leads through all steps, one after another', () => {
    const ticks = new Map<string, { at: string; by: string }>();
    const order: string[] = [];
    for (let next = nextStep(planWork(lines, ticks)); next; next = nextStep(planWork(lines, ticks))) {
      order.push(next.planned.step.id);
      for (const ref of next.planned.refs) ticks.set(stepKey(ref), { at: at('10:00'), by: 'x' });
    }
    expect(order).toEqual(['rims', 'wash', 'measure', 'wax']);
  });
});

describe('what was pressed', () => {
  const stepsOf = new Map([
    ['a', ['a/1', 'a/2']],
    ['b', ['b/1']],
  ]);
  const frame = { startedAt: at('10:00'), stepsOf };

  test('counts in the order of pressing, whichever phone sent first; the first tick stays', () => {
    const late = [press('untick', '10:20', { steps: [{ lineId: 'a', stepId: '1' }] }), tick('10:10', ['a', '1'])];
    expect(foldWork(late, frame).ticks.size).toBe(0);
    const twice = [tick('10:10', ['a', '1']), { ...tick('10:12', ['a', '1']), by: 'Idris Vale' }];
    expect(foldWork(twice, frame).ticks.get('a/1')).toEqual({ at: at('10:10'), by: 'Sefa Lund' });
  });

  test('runs a line’s timer from the start of work, the next from where the last one ended', () => {
    const state = foldWork([tick('10:10', ['a', '1']), tick('10:40', ['a', '2']), tick('11:05', ['b', '1'])], frame);
    expect(minutesRun(state.runs.get('a'), at('12:00'))).toBe(40);
    expect(minutesRun(state.runs.get('b'), at('12:00'))).toBe(25);
  });

  test('is started and stopped by hand as well', () => {
    const events = [
      press('start_line', '10:05', { lineId: 'b' }),
      press('stop_line', '10:15', { lineId: 'b' }),
      press('stop_line', '10:30', { lineId: 'b' }),
      press('start_line', '10:50', { lineId: 'b' }),
    ];
    expect(minutesRun(foldWork(events, frame).runs.get('b'), at('11:00'))).toBe(20);
  });

  test('a key is out until it is handed back', () => {
    const taken = press('key_taken', '10:01', { words: 'Lockbox' });
    expect(foldWork([taken], frame).keyOut).toMatchObject({ words: 'Lockbox' });
    expect(foldWork([press('key_back', '11:00'), taken], frame).keyOut).toBeNull();
  });
});

describe('what Done still needs', () => {
  const lines = [
    line('a', [step('wash', 'wash'), step('measure', 'correct', { isAlone: true })], { asksNote: true }),
    line('b', [step('Tell the customer', 'protect', { isAlone: true })]),
  ];
  test('is each step that is ticked by itself, and a note where one is asked for', () => {
    const missing = missingForDone(lines, { ticks: none, notes: [] });
    expect(missing.map((one) => one.words)).toEqual([
      'measure (The car)',
      'Tell the customer (The car)',
      'A note on a',
    ]);
    const ticks = new Map([['a/measure', { at: at('10:00'), by: 'x' }]]);
    const notes = [{ at: at('10:00'), by: 'x', words: 'All as planned' }];
    expect(missingForDone(lines, { ticks, notes }).map((one) => one.key)).toEqual(['b/Tell the customer']);
  });
  test('is let go only for what the reason was given for', () => {
    const missing = missingForDone(lines, { ticks: none, notes: [] });
    expect(stillMissing(missing, ['a/measure', 'note']).map((one) => one.key)).toEqual(['b/Tell the customer']);
  });
});

describe('must-knows', () => {
  const facts = {
    ...{ isScentFree: true, ringsFirst: true, hasDog: false, shutsGate: false, drainsToCreek: true, takesKey: true },
    ...{ keyGoesBack: 'Front desk', customerNote: '', addressNote: 'Park on the street' },
    vehicles: [{ id: 'v', name: '2019 hatchback', isCoated: true, note: '' }],
  };
  test('are read in the order in which they matter', () => {
    expect(mustKnowsOf(facts).map((one) => one.code)).toEqual([
      ...['ring_first', 'key', 'no_scent', 'coated', 'creek', 'address_note'],
    ]);
  });
  test('a note that changed is to be confirmed again; the key’s place may come later', () => {
    const keys = mustKnowsOf({ ...facts, keyGoesBack: null }).map((one) => one.key);
    expect(unconfirmed(mustKnowsOf(facts), keys)).toEqual([]);
    const changed = mustKnowsOf({ ...facts, addressNote: 'Park in the yard' });
    expect(unconfirmed(changed, keys).map((one) => one.words)).toEqual(['Park in the yard']);
  });
});

test('a towel’s color has one use in the whole house', () => {
  const towel = (use: 'paint' | 'glass', color: string) => ({ towel: { use, color } });
  expect(towelClashes([towel('paint', 'Blue'), towel('glass', 'Green')], []).size).toBe(0);
  expect([...towelClashes([towel('glass', ' blue ')], [towel('paint', 'Blue')]).keys()]).toEqual([0]);
  expect([...towelClashes([towel('paint', 'Blue'), towel('glass', 'Blue')], []).keys()]).toEqual([1]);
});
