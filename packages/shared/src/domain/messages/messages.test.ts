import { describe, expect, test } from 'vitest';
import { messageKinds } from './kinds.ts';
import { fillPlaceholders, placeholderFault, placeholders, unknownPlaceholders } from './placeholders.ts';
import type { PlaceholderValues } from './placeholders.ts';
import { afterQuiet } from './quiet-hours.ts';
import { overtakenBy } from './standing.ts';
import type { MessageStanding } from './standing.ts';
import { ourTemplates } from './templates.ts';

const values = Object.fromEntries(placeholders.map((word) => [word, `<${word}>`])) as PlaceholderValues;

describe('placeholders', () => {
  test('are filled once, and a value with braces stays as it is', () => {
    expect(fillPlaceholders('Hello {name}, {day}', { ...values, name: '{phone}', day: 'Thu' })).toBe(
      'Hello {phone}, Thu',
    );
  });
  test('that are unknown are named with the list of the known', () => {
    expect(unknownPlaceholders('{name} {gate_code} {gate_code} {}')).toEqual(['gate_code', '']);
    expect(placeholderFault('{gate_code}')).toMatch(/^\{gate_code\} is not known here\. Use \{name\} \{company\}/);
    expect(placeholderFault('Hello {name}')).toBeNull();
  });
  test.each(messageKinds)('our own words for %s hold known ones only', (kind) => {
    const { subject, body, text } = ourTemplates[kind];
    for (const part of [subject, body, text]) expect(placeholderFault(part)).toBeNull();
    expect(subject).not.toContain('\n');
  });
});

describe('quiet hours', () => {
  const zone = 'America/New_York';
  const night = { from: '21:00', to: '08:00' };
  test.each([
    ['in the day', '2026-05-14T15:00:00.000Z', '2026-05-14T15:00:00.000Z'],
    ['at 21:00 sharp', '2026-05-15T01:00:00.000Z', '2026-05-15T12:00:00.000Z'],
    ['after midnight', '2026-05-15T05:00:00.000Z', '2026-05-15T12:00:00.000Z'],
    ['at 08:00 sharp', '2026-05-15T12:00:00.000Z', '2026-05-15T12:00:00.000Z'],
    // The United States' change days of 2026: March 8 and November 1 (15 USC 260a).
    ['over the night that loses an hour', '2026-03-08T02:30:00.000Z', '2026-03-08T12:00:00.000Z'],
    ['over the night that gains an hour', '2026-11-01T01:30:00.000Z', '2026-11-01T13:00:00.000Z'],
  ])('%s', (_when, at, until) => {
    expect(afterQuiet(at, night, zone)).toBe(until);
  });
  test('within one day, and none at all', () => {
    expect(afterQuiet('2026-05-14T17:00:00.000Z', { from: '12:00', to: '14:00' }, zone)).toBe(
      '2026-05-14T18:00:00.000Z',
    );
    expect(afterQuiet('2026-05-14T17:00:00.000Z', { from: '12:00', to: '12:00' }, zone)).toBe(
      '2026-05-14T17:00:00.000Z',
    );
  });
  test('in the hour that comes twice, never goes back', () => {
    const second = '2026-11-01T06:15:00.000Z';
    expect(afterQuiet(second, { from: '01:00', to: '01:30' }, zone)).toBe(second);
  });
});

describe('what is overtaken', () => {
  const standing: MessageStanding = {
    kind: 'on_the_way',
    progress: 'on_the_way',
    windowFrom: '2026-05-14T14:00:00Z',
    windowTo: '2026-05-14T15:00:00Z',
    told: null,
    isUndone: false,
    hasFeedback: false,
    lastMoment: '2026-05-14T17:00:00Z',
  };
  const now = '2026-05-14T14:10:00Z';
  test.each<[Partial<MessageStanding>, RegExp | null]>([
    [{}, null],
    [{ isUndone: true }, /taken back/],
    [{ progress: 'on_site' }, /arrived/],
    [{ progress: 'called_off' }, /called off/],
    [{ lastMoment: now }, /too late/],
    [
      { kind: 'moved', told: { windowFrom: '2026-05-14T10:00:00-04:00', windowTo: '2026-05-14T15:00:00Z' } },
      /knows this time/,
    ],
    [{ kind: 'moved', told: { windowFrom: '2026-05-13T14:00:00Z', windowTo: '2026-05-13T15:00:00Z' } }, null],
    [{ kind: 'booked', windowFrom: null, windowTo: null }, /taken away/],
    [{ kind: 'called_off', progress: 'placed' }, /stands again/],
    [{ kind: 'feedback', progress: 'done', hasFeedback: true }, /said how it went/],
    [{ kind: 'receipt', progress: 'called_off' }, null],
    [{ kind: 'reminder', progress: 'working' }, /begun/],
  ])('%j', (change, reason) => {
    const why = overtakenBy(now, { ...standing, ...change });
    if (reason) expect(why).toMatch(reason);
    else expect(why).toBeNull();
  });
});
