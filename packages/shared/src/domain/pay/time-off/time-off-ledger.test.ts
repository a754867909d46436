import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { exact, greatest, sum, ZERO } from '../../money/exact.ts';
import { naiveBalances } from './testing/naive-ledger.ts';
import { randomLedger } from './testing/random-ledgers.ts';
import { lowestBalance, timeOffBalance, timeOffLedger } from './time-off-ledger.ts';
import type { LedgerInput } from './time-off-ledger.ts';
import { timeOffRuleOn, type DatedTimeOffRule, type TimeOffRule } from './time-off-rule.ts';

const perThirty: TimeOffRule = {
  earning: { by: 'hours_worked', perHours: '30' },
  ...{ capHours: null, yearStartsOn: '01-01', carryHours: null, pays: { by: 'hourly' } },
};
const aRule = (rule: Partial<TimeOffRule> = {}, parts: Partial<DatedTimeOffRule> = {}): DatedTimeOffRule => ({
  ...{ id: 'rule', kind: 'sick', personId: null, startsOn: '2026-01-05', rule: { ...perThirty, ...rule } },
  ...parts,
});
const weeks = [
  { startsOn: '2026-12-21', endsOn: '2026-12-27', hoursWorked: '40' },
  { startsOn: '2026-12-28', endsOn: '2027-01-03', hoursWorked: '505/12' },
  { startsOn: '2027-01-04', endsOn: '2027-01-10', hoursWorked: '0' },
];
const aLedger = (parts: Partial<LedgerInput> = {}): LedgerInput => ({
  ...{ kind: 'sick', personId: 'ada', rules: [aRule()], weeks, taken: [], adjustments: [] },
  ...parts,
});
const balances = (parts: Partial<LedgerInput>) => timeOffLedger(aLedger(parts)).map((week) => week.balance);

describe('a ledger of paid time off', () => {
  // Figures by hand from the rule; 1 hour for every 30 is what several states ask for, from memory.
  test('earns an hour for every thirty worked, exactly', () => {
    expect(balances({})).toEqual(['4/3', '197/72', '197/72']);
  });

  test('gives the year’s hours on the day the year begins, in the week that holds it', () => {
    expect(balances({ rules: [aRule({ earning: { by: 'year', hours: '56' } })] })).toEqual(['0', '56', '56']);
  });

  test('a new year takes on so many hours before it gives its own', () => {
    const rules = [aRule({ earning: { by: 'year', hours: '40' }, carryHours: '10' })];
    const [, week] = timeOffLedger(
      aLedger({ rules, adjustments: [{ id: 'a', on: '2026-12-21', hours: '25', reason: 'Opening balance' }] }),
    );
    expect(week?.moves.map(({ on, kind, hours, balance }) => [on, kind, hours, balance])).toEqual([
      ['2027-01-01', 'carry_lost', '-15', '10'],
      ['2027-01-01', 'given', '40', '50'],
    ]);
  });

  test('a cap stops what comes in and says what was not kept; hours above it stay', () => {
    const rules = [aRule({ capHours: '2' })];
    expect(balances({ rules })).toEqual(['4/3', '2', '2']);
    expect(timeOffLedger(aLedger({ rules }))[1]).toMatchObject({ earned: '101/72', lost: '53/72' });
    const adjustments = [{ id: 'a', on: '2026-12-21', hours: '9', reason: 'Opening balance' }];
    expect(balances({ rules, adjustments })).toEqual(['9', '9', '9']);
  });

  test('hours for holidays come on their dates', () => {
    const dates = [
      { on: '2026-12-25', name: 'Christmas Day' },
      { on: '2027-01-01', name: 'New Year’s Day' },
    ];
    expect(balances({ rules: [aRule({ earning: { by: 'holidays', hours: '8', dates } })] })).toEqual(['8', '16', '16']);
  });

  test('the person’s own rule goes before the company’s, and a later one takes over from its week on', () => {
    const rules = [
      aRule(),
      aRule(
        { earning: { by: 'hours_worked', perHours: '20' } },
        { id: 'own', personId: 'ada', startsOn: '2026-12-28' },
      ),
      aRule({ earning: { by: 'hours_worked', perHours: '10' } }, { id: 'other', personId: 'bo' }),
      aRule({ earning: { by: 'none' } }, { id: 'stop', personId: 'ada', startsOn: '2027-01-04' }),
    ];
    expect(balances({ rules })).toEqual(['4/3', '55/16', '55/16']);
    expect(timeOffRuleOn(rules, { kind: 'sick', personId: 'ada' }, '2027-02-01')?.id).toBe('stop');
    expect(timeOffRuleOn(rules, { kind: 'vacation', personId: 'ada' }, '2027-02-01')).toBeNull();
  });

  test('the lowest balance from a day on shows what a taking would lack, in later weeks too', () => {
    const taken = [
      { id: 'a', on: '2026-12-22', hours: '1' },
      { id: 'b', on: '2027-01-05', hours: '2' },
    ];
    const ledger = timeOffLedger(aLedger({ taken }));
    expect(lowestBalance(ledger, '2026-12-22').toFraction()).toBe('-1');
    expect(lowestBalance(ledger, '2026-12-28').toFraction()).toBe('-19/72');
  });
});

describe('whatever the rules, weeks and moves', () => {
  test('a second calculation in plain fractions, day by day, comes to the same balances', () => {
    fc.assert(
      fc.property(randomLedger, (input) => {
        expect(timeOffLedger(input).map((week) => week.balance)).toEqual(naiveBalances(input));
      }),
      { numRuns: 300 },
    );
  });

  test('the moves add up to the balance, and what comes in never lifts it above the cap', () => {
    fc.assert(
      fc.property(randomLedger, (input) => {
        const ledger = timeOffLedger(input);
        const moves = ledger.flatMap((week) => week.moves);
        expect(sum(moves.map((move) => exact(move.hours))).equals(timeOffBalance(ledger))).toBe(true);
        let before = ZERO;
        moves.forEach((move, index) => {
          const isCut = moves[index + 1]?.kind === 'cap_lost';
          const after = exact((isCut ? moves[index + 1] : move)?.balance ?? '0');
          const cap = timeOffRuleOn(input.rules, input, move.on)?.rule.capHours ?? null;
          const comesIn = move.kind === 'earned' || move.kind === 'given';
          if (comesIn && cap !== null) expect(after.lte(greatest(exact(cap), before))).toBe(true);
          before = exact(move.balance);
        });
      }),
      { numRuns: 300 },
    );
  });

  test('where nothing is taken beyond the lowest balance, the balance never falls below zero', () => {
    fc.assert(
      fc.property(randomLedger, (input) => {
        const adjustments = input.adjustments.filter((move) => exact(move.hours).gt(0));
        let taken: LedgerInput['taken'] = [];
        for (const move of input.taken) {
          const tried = [...taken, move];
          if (lowestBalance(timeOffLedger({ ...input, adjustments, taken: tried }), move.on).gte(0)) taken = tried;
        }
        const moves = timeOffLedger({ ...input, adjustments, taken }).flatMap((week) => week.moves);
        expect(moves.every((move) => exact(move.balance).gte(0))).toBe(true);
      }),
      { numRuns: 200 },
    );
  });
});
