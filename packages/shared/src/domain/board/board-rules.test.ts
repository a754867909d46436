import { describe, expect, test } from 'vitest';
import { isAccessOpen } from './access-notes.ts';
import { visitMinutes } from './crew-time.ts';
import { nextActions, takeStep } from './progress.ts';
import type { Progress } from './progress.ts';
import { estimateTravel, kilometersBetween } from './travel.ts';

describe('progress', () => {
  test('goes placed, on the way, on site, working, done', () => {
    const way = ['set_off', 'arrive', 'start_work', 'finish'] as const;
    let at: Progress = 'placed';
    for (const action of way) {
      expect(nextActions(at)[0]).toBe(action);
      const step = takeStep(at, action);
      at = step.ok ? step.to : at;
    }
    expect(at).toBe('done');
  });
  test('ends for good: nothing follows done, part done or called off', () => {
    for (const end of ['done', 'part_done', 'called_off'] as const) expect(nextActions(end)).toEqual([]);
  });
  test('a refused step says so in words', () => {
    expect(takeStep('unplaced', 'finish')).toEqual({ ok: false, message: 'Done can’t follow Unplaced.' });
  });
});

describe('travel', () => {
  // One degree of a great circle on a sphere of 6371.0088 km is 111.195 km: arithmetic, pi / 180 times the radius.
  test('a degree of latitude is 111.195 km', () => {
    expect(kilometersBetween({ lat: 0, lng: 0 }, { lat: 1, lng: 0 })).toBeCloseTo(111.195, 3);
    expect(kilometersBetween({ lat: 0, lng: 0 }, { lat: 0, lng: 180 })).toBeCloseTo(20015.1, 0);
  });
  test('takes no time to the same place, and says when a place is unknown', () => {
    expect(estimateTravel({ lat: 41, lng: -70 }, { lat: 41, lng: -70 }).minutes).toBe(0);
    expect(estimateTravel(null, { lat: 41, lng: -70 })).toEqual({ minutes: 15, kilometers: null, isEstimate: true });
  });
});

describe('crew time', () => {
  test('two people do not halve a job, and condition grows it', () => {
    expect(visitMinutes([60, 60], 1)).toBe(120);
    expect(visitMinutes([60, 60], 2)).toBe(75);
    expect(visitMinutes([100], 1, 'very_dirty')).toBe(150);
    expect(visitMinutes([], 1)).toBe(5);
  });
});

describe('access notes', () => {
  test('are open from 12 hours before until the day’s end, also on a day of 25 hours', () => {
    // 1 November 2026: New York's clocks go back, the day ends at 05:00 UTC of the 2nd.
    const from = '2026-11-01T14:00:00.000Z';
    expect(isAccessOpen(from, '2026-11-01T01:59:59.000Z', 'America/New_York')).toBe(false);
    expect(isAccessOpen(from, '2026-11-01T02:00:00.000Z', 'America/New_York')).toBe(true);
    expect(isAccessOpen(from, '2026-11-02T04:59:59.000Z', 'America/New_York')).toBe(true);
    expect(isAccessOpen(from, '2026-11-02T05:00:00.000Z', 'America/New_York')).toBe(false);
  });
});
