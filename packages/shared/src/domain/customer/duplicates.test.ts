import { describe, expect, it } from 'vitest';
import { mayWrite, mergeConsents } from './consent.ts';
import { areAlike, likelyDuplicates } from './duplicates.ts';
import type { KnownCustomer } from './duplicates.ts';
import { planMerge } from './merge.ts';

const known = (id: string, more: Partial<KnownCustomer>): KnownCustomer => ({
  ...{ id, name: `Customer ${id}`, phone: '', email: '', places: [], plates: [], vins: [] },
  ...more,
});

describe('likely duplicates', () => {
  it.each([
    ['phone', { phone: '555-555-0142' }, { phone: '+1 (555) 555.0142' }],
    ['email', { email: 'ada@quay.example' }, { email: 'Ada@Quay.example' }],
    ['plate', { plates: ['TT 014'] }, { plates: ['tt-014'] }],
    ['vin', { vins: ['1M8GDM9AXKP042788'] }, { vins: ['1m8gdm9axkp042788'] }],
    [
      'name',
      { name: 'Ada Galloway', places: ['70 Old Slip, Ternmouth'] },
      { name: 'Ada Gallowey', places: ['70 old slip Ternmouth'] },
    ],
  ] as const)('by %s', (why, a, b) => {
    expect(likelyDuplicates([known('b', a), known('a', b), known('c', {})])).toEqual([{ ids: ['a', 'b'], why: [why] }]);
  });

  it('all that speaks for a pair is said once, and the likeliest pair comes first', () => {
    const twin = { phone: '555-0142', email: 'a@quay.example' };
    const pairs = likelyDuplicates([
      known('a', { plates: ['ZZ 900'] }),
      known('b', { ...twin, plates: ['ZZ900'] }),
      known('c', twin),
    ]);
    expect(pairs).toEqual([
      { ids: ['b', 'c'], why: ['phone', 'email'] },
      { ids: ['a', 'b'], why: ['plate'] },
    ]);
  });

  it('a number that a whole office shares, an empty one and a part of one are no likeness', () => {
    const office = Array.from({ length: 9 }, (_, index) => known(String(index), { phone: '555-0142' }));
    expect(likelyDuplicates(office)).toEqual([]);
    expect(likelyDuplicates([known('a', { phone: '0142' }), known('b', { phone: '0142' })])).toEqual([]);
    expect(likelyDuplicates([known('a', {}), known('b', {})])).toEqual([]);
  });

  it.each([
    ['Ada Galloway', 'galloway, ada', true],
    ['A. Galloway', 'Ada Galloway', true],
    ["Maire O'Dell", 'Máire ODell', true],
    ['Ada Galloway', 'Adá Gallowey', true],
    ['A. G.', 'Ada Galloway', false],
    ['Ada Galloway', 'Piet Galloway', false],
    ['Lio', 'Noa', false],
  ])('%s and %s: %s', (one, other, isAlike) => {
    expect(areAlike(one, other)).toBe(isAlike);
    expect(areAlike(other, one)).toBe(isAlike);
  });
});

describe('a merge', () => {
  const fields = {
    ...{ name: 'Ada Galloway', isCompany: false, phone: '555-0142', email: '', notes: 'Rings twice.' },
    ...{ isScentFree: false, ringsFirst: false, mustKnow: '', tags: ['Fleet'] },
  };

  it('throws nothing away', () => {
    const goes = {
      ...fields,
      name: 'A. Galloway',
      phone: '555-0143',
      email: 'a@quay.example',
      notes: 'No wax.',
      tags: ['fleet', 'Early'],
    };
    const { fields: merged, problems } = planMerge(fields, { ...goes, isScentFree: true, mustKnow: 'Blind dog.' });
    expect(merged).toMatchObject({
      name: 'Ada Galloway',
      phone: '555-0142',
      email: 'a@quay.example',
      isScentFree: true,
    });
    expect(merged.notes).toBe('Rings twice.\nNo wax.\nAlso known: A. Galloway, 555-0143.');
    expect(merged).toMatchObject({ mustKnow: 'Blind dog.', tags: ['Fleet', 'Early'] });
    expect(problems).toEqual([]);
  });

  it('of what is the same says it once', () => {
    expect(planMerge(fields, { ...fields, phone: '(555-0142)' })).toMatchObject({ fields, words: [] });
  });

  it('refuses what would not fit any more', () => {
    const long = { ...fields, notes: 'x'.repeat(9_990) };
    expect(planMerge(long, { ...fields, mustKnow: 'y'.repeat(200) }).problems).toEqual([
      'Together the notes are over 10,000 letters. Shorten one of them first.',
    ]);
  });
});

describe('consent', () => {
  const said = (isGiven: boolean) => [{ channel: 'text' as const, isGiven, on: '2026-05-01', how: 'By phone' }];

  it('texts need a yes, mail only no no', () => {
    expect([mayWrite('text', []), mayWrite('text', said(true)), mayWrite('text', said(false))]).toEqual([
      false,
      true,
      false,
    ]);
    expect([mayWrite('mail', []), mayWrite('mail', [{ ...said(false)[0]!, channel: 'mail' }])]).toEqual([true, false]);
  });

  it.each([
    ['a no of either stands', said(true), said(false), true, false],
    ['a yes to the same number counts', [], said(true), true, true],
    ['a yes to another number does not', [], said(true), false, undefined],
    ['the own answer comes first', said(true), said(true), false, true],
  ])('in a merge %s', (_what, stays, goes, isSame, answer) => {
    expect(mergeConsents(stays, goes, { mail: isSame, text: isSame })[0]?.isGiven).toBe(answer);
  });
});
