import { expect, test } from 'vitest';
import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { changesSince, seenOf } from './changes.ts';

const visit = (id: string, parts: Partial<RunVisitDto> = {}) =>
  ({
    ...{ id, customerName: `Customer ${id}`, from: '2026-05-14T15:00:00Z', address: '8 Old Slip', notes: '' },
    lines: [{ serviceName: 'Wash and wax', vehicle: 'Wagon' }],
    ...parts,
  }) as unknown as RunVisitDto;
const clock = (instant: string) => instant.slice(11, 16);

test('nothing changed, nothing said', () => {
  expect(changesSince(seenOf([visit('a')]), [visit('a')], clock)).toEqual([]);
});

test('new, gone and moved are one sentence each', () => {
  const seen = seenOf([visit('a'), visit('b')]);
  const now = [visit('a', { from: '2026-05-14T15:30:00Z', notes: 'Ring first' }), visit('c')];
  expect(changesSince(seen, now, clock)).toEqual([
    { id: 'a', who: 'Customer a', words: '15:30 instead of 15:00, another note' },
    { id: 'c', who: 'Customer c', words: 'new on this day' },
    { id: 'b', who: 'Customer b', words: 'no longer on this day' },
  ]);
});

test('other work and another place are said', () => {
  const now = visit('a', { address: '9 Old Slip', lines: [{ serviceName: 'Polish', vehicle: 'Wagon' }] as never });
  expect(changesSince(seenOf([visit('a')]), [now], clock)[0]?.words).toBe('another address, now Polish, Wagon');
});
