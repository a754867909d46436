import { describe, expect, test } from 'vitest';
import { breakDue, type BreakPunch } from './break-reminder.ts';

const at = (clock: string) => `2026-05-14T${clock}:00.000Z`;
const punch = (kind: BreakPunch['kind'], from: string, to: string | null, isInterrupted = false): BreakPunch => ({
  ...{ kind, startedAt: at(from), endedAt: to && at(to) },
  isInterrupted,
});
// From memory: California Labor Code 512 (a meal break before the end of the fifth hour) and IWC wage order 5, section
// 12 (ten minutes' rest for each four hours). Only figures to test with; the owner sets the house's own.
const rules = { mealAfterMinutes: 300, restAfterMinutes: 240 };
const due = (punches: BreakPunch[], now: string) => breakDue(punches, rules, at(now));

describe('a break is due', () => {
  test('for rest, then for a meal, at the minute the rule names', () => {
    const day = [punch('shop', '08:00', '08:30'), punch('job', '08:30', null)];
    expect(due(day, '11:59')).toBeNull();
    expect(due(day, '12:00')).toEqual({ kind: 'rest_break', minutes: 240 });
    expect(due(day, '13:00')).toEqual({ kind: 'meal_break', minutes: 300 });
  });
  test('counted anew after a break; a rest is no meal, a meal is also a rest', () => {
    const rested = [punch('job', '08:00', '11:00'), punch('rest_break', '11:00', '11:10'), punch('job', '11:10', null)];
    expect(due(rested, '12:59')).toBeNull();
    expect(due(rested, '13:00')).toEqual({ kind: 'meal_break', minutes: 300 });
    const fed = [punch('job', '08:00', '11:00'), punch('meal_break', '11:00', '11:30'), punch('job', '11:30', null)];
    expect(due(fed, '15:29')).toBeNull();
    expect(due(fed, '15:30')).toEqual({ kind: 'rest_break', minutes: 240 });
  });
  test('time off the clock relieves too, the second between two presses does not', () => {
    expect(due([punch('job', '08:00', '12:00'), punch('job', '12:40', null)], '13:30')).toBeNull();
    expect(due([punch('job', '08:00', '12:00'), punch('travel', '12:01', null)], '13:01')?.kind).toBe('meal_break');
  });
  test('not by a break one had to work in, nor by a slip of a minute', () => {
    const worked = [
      punch('job', '08:00', '11:00'),
      punch('meal_break', '11:00', '11:30', true),
      punch('job', '11:30', null),
    ];
    expect(due(worked, '13:00')).toEqual({ kind: 'meal_break', minutes: 300 });
    const slip = [punch('job', '08:00', '11:00'), punch('rest_break', '11:00', '11:01'), punch('job', '11:01', null)];
    expect(due(slip, '12:00')?.kind).toBe('rest_break');
  });
  test('never during a break, off the clock, or where the owner set no rule', () => {
    expect(due([punch('job', '08:00', '14:00'), punch('rest_break', '14:00', null)], '14:05')).toBeNull();
    expect(due([punch('job', '08:00', '14:00')], '14:05')).toBeNull();
    expect(due([], '14:05')).toBeNull();
    const none = { mealAfterMinutes: null, restAfterMinutes: null };
    expect(breakDue([punch('job', '08:00', null)], none, at('20:00'))).toBeNull();
  });
});
