import { describe, expect, it } from 'vitest';
import type { OnlineMenuDto } from '@driprail/shared/contracts/online-booking.contract';
import { askOf, chosenServices, emptyDraft, reachable } from './book-draft.ts';

const service = (id: string, kind: 'package' | 'add_on') => ({
  ...{ id, kind, name: id, description: '', needsWater: false, needsPower: false },
  prices: [{ sizeClass: 'sedan' as const, priceCents: 1000, minutes: 60 }],
});
const menu: OnlineMenuDto = {
  ...{ isOn: true, companyName: 'Tern & Tide', companyPhone: '555-0100', zone: 'America/New_York', clock: '12' },
  services: [service('wash', 'package'), service('wax', 'add_on')],
  policy: { version: 1, words: '', freeUntilHours: 24, lateFeeCents: 0 },
};
const begun = { ...emptyDraft, sizeClass: 'sedan' as const, serviceIds: ['wash'] };

describe('how far one may go', () => {
  it('is the first step with something missing', () => {
    expect(reachable('code', menu, emptyDraft)).toBe('car');
    expect(reachable('time', menu, begun)).toBe('place');
    expect(reachable('time', menu, { ...begun, line: '3 Brine Street', city: 'Ternmouth' })).toBe('time');
    expect(reachable('work', menu, begun)).toBe('work');
  });
  it('an add-on alone is no work', () => {
    expect(reachable('place', menu, { ...begun, serviceIds: ['wax'] })).toBe('work');
  });
});

it('what is not sold for another size falls out of the order', () => {
  const van = { ...begun, sizeClass: 'van' as const };
  expect(chosenServices(menu, van)).toEqual([]);
  expect(askOf(menu, begun)?.serviceIds).toEqual(['wash']);
  expect(askOf(menu, emptyDraft)).toBeNull();
});
