import { describe, expect, test } from 'vitest';
import type { Actor } from './actor.ts';
import { abilityFor, tag } from './ability.ts';

const owner: Actor = { userId: 'o', personId: null, role: 'owner' };
const dispatcher: Actor = { userId: 'd', personId: 'pd', role: 'dispatcher' };
const technician: Actor = { userId: 't', personId: 'pt', role: 'technician' };
const visit = (crewPersonIds: string[], daysFromToday: number | null) =>
  tag('Visit', { id: 'v', crewPersonIds, day: daysFromToday === null ? null : '2026-05-14', daysFromToday });

describe('the pay wall', () => {
  test.each([
    ['owner', owner, true],
    ['dispatcher', dispatcher, false],
    ['technician', technician, false],
  ] as const)('%s and rates, weeks, logins', (_name, actor, isAllowed) => {
    const ability = abilityFor(actor);
    expect(ability.can('read', 'Rate')).toBe(isAllowed);
    expect(ability.can('read', 'PayWeek')).toBe(isAllowed);
    expect(ability.can('read', 'Payday')).toBe(isAllowed);
    expect(ability.can('update', 'Login')).toBe(isAllowed);
  });

  test('statements are one’s own, and only when locked', () => {
    for (const actor of [dispatcher, technician]) {
      const ability = abilityFor(actor);
      const personId = actor.personId ?? '';
      expect(ability.can('read', tag('Statement', { personId, state: 'locked' }))).toBe(true);
      expect(ability.can('read', tag('Statement', { personId, state: 'checked' }))).toBe(false);
      expect(ability.can('read', tag('Statement', { personId: 'other', state: 'locked' }))).toBe(false);
    }
    expect(abilityFor(owner).can('read', tag('Statement', { personId: 'other', state: 'draft' }))).toBe(true);
  });
});

test('what is kept about one’s pay is one’s own, and the owner’s to hand out', () => {
  for (const actor of [dispatcher, technician]) {
    const ability = abilityFor(actor);
    expect(ability.can('read', tag('PayRecord', { personId: actor.personId ?? '' }))).toBe(true);
    expect(ability.can('read', tag('PayRecord', { personId: 'other' }))).toBe(false);
  }
  expect(abilityFor(owner).can('read', tag('PayRecord', { personId: 'other' }))).toBe(true);
  const rider: Actor = { userId: 'x', personId: null, role: 'technician' };
  expect(abilityFor(rider).can('read', 'PayRecord')).toBe(false);
});

describe('the running week’s estimate', () => {
  test.each([
    ['technician, the own', technician, 'pt', true],
    ['technician, another’s', technician, 'other', false],
    ['dispatcher, the own', dispatcher, 'pd', false],
    ['owner, who reads the pay week', owner, 'pt', false],
  ] as const)('%s', (_name, actor, personId, isAllowed) => {
    expect(abilityFor(actor).can('read', tag('Estimate', { personId }))).toBe(isAllowed);
  });
});

describe('balances of paid time off', () => {
  test.each([
    ['technician, the own', technician, 'pt', true],
    ['technician, another’s', technician, 'other', false],
    ['dispatcher, the own', dispatcher, 'pd', true],
    ['dispatcher, another’s', dispatcher, 'pt', false],
    ['owner, anybody’s', owner, 'pt', true],
  ] as const)('%s', (_name, actor, personId, isAllowed) => {
    expect(abilityFor(actor).can('read', tag('TimeOffBalance', { personId }))).toBe(isAllowed);
  });
});

describe('cash and bills', () => {
  test.each([
    ['owner', owner, true, true],
    ['dispatcher', dispatcher, true, false],
    ['technician', technician, false, false],
  ] as const)('%s', (_name, actor, counts, refunds) => {
    const ability = abilityFor(actor);
    expect(ability.can('create', tag('Cash', { personId: 'pt' }))).toBe(counts);
    expect(ability.can('read', 'Cash')).toBe(counts);
    const far = tag('Bill', { id: 'j', crewPersonIds: [], day: null, daysFromToday: null });
    expect(ability.can('create', far)).toBe(counts);
    expect(ability.can('refund', far)).toBe(refunds);
  });
});

test('only an owner erases a customer', () => {
  for (const [actor, isAllowed] of [
    [owner, true],
    [dispatcher, false],
    [technician, false],
  ] as const)
    expect(abilityFor(actor).can('erase', tag('Customer', { id: 'c' }))).toBe(isAllowed);
});

describe('a technician', () => {
  const ability = abilityFor(technician);
  test('reads and marks visits of the own crew on near days only', () => {
    expect(ability.can('read', visit(['pt'], 0))).toBe(true);
    expect(ability.can('mark', visit(['pt'], 0))).toBe(true);
    expect(ability.can('read', visit(['pt'], 3))).toBe(false);
    expect(ability.can('mark', visit(['pt'], 1))).toBe(false);
    expect(ability.can('read', visit(['other'], 0))).toBe(false);
    expect(ability.can('read', visit(['pt'], null))).toBe(false);
  });
  test('plans nothing and reads no customer list', () => {
    expect(ability.can('plan', 'Visit')).toBe(false);
    expect(ability.can('read', 'Customer')).toBe(false);
  });
});
