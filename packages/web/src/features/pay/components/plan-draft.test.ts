import { expect, test } from 'vitest';
import { EMPTY_PLAN, planKinds, planOf } from './plan-draft.ts';
import type { PlanKind } from '@driprail/shared/domain/pay/plans/pay-plan';
import { basePlanWords } from './plan-base-words.ts';

const filled = (kind: PlanKind) => ({
  ...EMPTY_PLAN,
  kind,
  values: Object.fromEntries(planKinds[kind].fields.map(({ name }) => [name, '$20.00'])),
  otherHourly: '12',
  flats: [{ serviceId: '0198f7a2-6d1c-7c3e-8a55-3f1a2b4c5d6e', sizeClass: '', amount: '45' }],
});

test.each(Object.keys(planKinds) as PlanKind[])('%s: what the form asks for makes a plan and words', (kind) => {
  const { plan, faults } = planOf(filled(kind));
  expect(faults).toBeNull();
  expect(plan && basePlanWords(plan)).toBeTruthy();
});

test('what is missing is said at its field', () => {
  expect(planOf(EMPTY_PLAN).faults).toMatchObject({ 'base.hourly': 'Give a number like 19.50.' });
  expect(planOf({ ...filled('draw'), otherHourly: '' }).faults).toHaveProperty(['base.other.hourly']);
  const agreed = { ...filled('draw'), isAgreed: true };
  expect(Object.keys(planOf(agreed).faults ?? {}).sort()).toEqual([
    'base.other.agreement.note',
    'base.other.agreement.signedOn',
  ]);
});

test('tiers are lines of a threshold and a percentage', () => {
  const tiers = [
    { over: '0', percent: '6' },
    { over: '$2,000', percent: '8.5%' },
  ];
  const { plan } = planOf({ ...filled('tiered_percent'), tiers });
  expect(plan && basePlanWords(plan)).toBe('6% over 0.00, 8.5% over 2000.00, marginal, by the week');
});

test('a salary says the hours it covers', () => {
  const { plan } = planOf({ ...filled('salary'), values: { amount: '900', coversHours: '45' } });
  expect(plan && basePlanWords(plan)).toBe('900.00 weekly for 45 h a week');
});

test('premiums are lines of their own, for a kind of work or some hours', () => {
  const lead = { label: 'Lead', perHour: '$1.50', kind: '', from: '', to: '' };
  const late = { label: 'Evening', perHour: '2', kind: 'job', from: '18:00', to: '22:00' };
  const { plan } = planOf({ ...filled('hourly'), premiums: [lead, late] });
  expect(plan?.extras.premiums).toEqual([
    { label: 'Lead', perHour: '1.50', kinds: [], between: null },
    { label: 'Evening', perHour: '2', kinds: ['job'], between: { from: '18:00', to: '22:00' } },
  ]);
  const { faults } = planOf({ ...filled('hourly'), premiums: [{ ...late, to: '' }] });
  expect(faults).toHaveProperty(['extras.premiums.0.between.to']);
});
