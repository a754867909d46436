import { expect, test } from 'vitest';
import type { WorkingStep } from '@driprail/shared/domain/pay/pay-week.types';
import { arithmeticParts, dayOfSource, numberSteps, stepSources, withCustomer } from './working.ts';
import { aPayLine } from './testing/pay-line.factory.ts';

const aStep = (parts: Partial<WorkingStep>): WorkingStep => ({
  label: '',
  note: '',
  arithmetic: '',
  result: '1',
  sources: [],
  ...parts,
});

test('steps are numbered, and what does not count is not', () => {
  const steps = numberSteps([aStep({}), aStep({ result: '' }), aStep({})]);
  expect(steps.map((step) => step.number)).toEqual([1, null, 2]);
});

test('words and figures of the arithmetic are told apart, minus signs become true ones', () => {
  expect(arithmeticParts('half of 21.6090 times 2.25 h')).toEqual([
    { text: 'half of', isWord: true },
    { text: '21.6090', isWord: false },
    { text: 'times', isWord: true },
    { text: '2.25 h', isWord: false },
  ]);
  expect(arithmeticParts('-24.00')).toEqual([{ text: '−24.00', isWord: false }]);
});

test('clock entries become one link a day to the hours of that day', () => {
  const entry = (id: string, day: string) => ({ kind: 'clock_entry' as const, id, label: `Job work, ${day}` });
  const sources = [entry('a', '2026-05-05'), entry('b', '2026-05-04'), entry('c', '2026-05-05')];
  const found = stepSources(aStep({ sources }), aPayLine({}), []);
  expect(found.lead).toBe('3 clock entries:');
  expect(found.links.map((link) => [link.label, link.to])).toEqual([
    ['Mon', '/hours?day=2026-05-04'],
    ['Tue', '/hours?day=2026-05-05'],
  ]);
  expect(dayOfSource({ label: 'Federal: over 40 hours a week' })).toBeNull();
});

test('jobs become their numbers, each to the board of its day', () => {
  const job = { kind: 'job' as const, id: 'j1', label: 'Job 4127' };
  const line = aPayLine({ jobId: 'j1', jobNumber: 4127, workedOn: '2026-05-04' });
  const found = stepSources(aStep({ note: 'Job 4127', sources: [job] }), aPayLine({}), [line]);
  expect(found).toEqual({
    note: '',
    lead: 'Job',
    links: [{ key: 'j1', label: '4127', to: '/board/2026-05-04?job=j1' }],
  });
});

test('a rate leads to its band and another line to its own working', () => {
  const sources = [
    { kind: 'rate' as const, id: 'r1', label: '19.50 since 2026-03-01' },
    { kind: 'pay_line' as const, id: 'hourly:r1:all', label: 'Hours by the clock' },
  ];
  const { links } = stepSources(aStep({ sources }), aPayLine({}), []);
  expect(links.map((link) => link.to)).toEqual(['/pay-rates?rate=r1', '?line=hourly%3Ar1%3Aall']);
});

test('the step that tells of a job says whose it was', () => {
  const line = aPayLine({ jobId: 'j1', jobNumber: 4127 });
  const step = aStep({ note: 'Job 4127. After discounts' });
  expect(withCustomer(step, line, { j1: 'Galloway' }).note).toBe('Job 4127, Galloway. After discounts');
  expect(withCustomer(step, line, {}).note).toBe('Job 4127. After discounts');
  expect(withCustomer(aStep({ note: '6 % since May 1' }), line, { j1: 'Galloway' }).note).toBe('6 % since May 1');
});
