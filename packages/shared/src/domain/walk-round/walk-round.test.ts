import { describe, expect, test } from 'vitest';
import { bodyOf } from './body.ts';
import type { WalkRoundFacts } from './lacking.ts';
import { lackingIn } from './lacking.ts';
import type { Mark } from './marks.ts';
import { marksToAsk, unanswered, withCarried } from './marks.ts';
import { middleOf, placeAt, placeNames } from './places.ts';
import { largestSet, missingViews, usualPhotoSet } from './views.ts';

const mark = (id: string, more: Partial<Mark> = {}): Mark => ({
  ...{ id, x: 500, y: 200, place: 'hood', kind: 'chip', size: 'small', note: '', carriedFrom: null, answer: null },
  ...more,
});

describe('photo sets', () => {
  test('the largest of the lines is asked for; none asks for nothing', () => {
    expect(largestSet(['none', 'full', 'quick'])).toBe('full');
    expect(largestSet([])).toBe('none');
    expect(usualPhotoSet('add_on')).toBe('none');
    expect(usualPhotoSet('package')).toBe('quick');
  });
  test('missing views come in the order of a walk round the car', () => {
    expect(missingViews('quick', ['rear', 'odometer'])).toEqual(['front', 'left', 'right']);
    expect(missingViews('full', []).length).toBe(9);
    expect(missingViews('none', [])).toEqual([]);
  });
});

describe('marks of last time', () => {
  const last = [
    mark('a'),
    mark('b', { answer: 'gone', carriedFrom: 'x' }),
    mark('c', { answer: 'worse', carriedFrom: 'y' }),
  ];
  test('are asked about unless they were gone', () => {
    expect(marksToAsk(last).map(({ id }) => id)).toEqual(['a', 'c']);
  });
  test('lack an answer until each has one', () => {
    const answers = [mark('n', { carriedFrom: 'a', answer: 'still_there' }), mark('o', { carriedFrom: 'c' })];
    expect(unanswered(last, answers).map(({ id }) => id)).toEqual(['c']);
  });
  test('that the phone did not know of are kept, unanswered', () => {
    const kept = withCarried(last, [mark('n', { carriedFrom: 'a', answer: 'gone' })], () => 'made');
    expect(kept.map(({ id, carriedFrom, answer }) => [id, carriedFrom, answer])).toEqual([
      ['n', 'a', 'gone'],
      ['made', 'c', null],
    ]);
  });
});

describe('places', () => {
  test('every place on the outline is found again from its middle', () => {
    for (const place of placeNames) {
      const middle = middleOf(place);
      if (middle) expect(placeAt(middle.x, middle.y)).toBe(place);
    }
    expect(middleOf('front seats')).toBeNull();
    expect(placeAt(120, 400)).toBe('left rear door');
  });
});

test('the outline follows the car’s words, else its size class', () => {
  expect(bodyOf('sedan', '2019 hatchback')).toBe('hatchback');
  expect(bodyOf('large_suv', '2021 pickup')).toBe('pickup');
  expect(bodyOf('small_suv', '2021 SUV')).toBe('suv');
});

describe('a walk-round lacks', () => {
  const whole: WalkRoundFacts = {
    ...{ paint: 'good', interior: 'fair', hasItems: false, mayMove: true, missingReason: '', absentReason: 'At work' },
    ...{ initials: null, photoViews: [{ view: 'front' }, { view: 'left' }, { view: 'rear' }, { view: 'right' }] },
  };
  test('nothing when all is answered', () => {
    expect(lackingIn(whole, 'quick')).toEqual({});
  });
  test('views without a reason, and both or neither of signature and reason', () => {
    expect(Object.keys(lackingIn({ ...whole, photoViews: [] }, 'quick'))).toEqual(['missingReason']);
    expect(lackingIn({ ...whole, photoViews: [], missingReason: 'Raining' }, 'quick')).toEqual({});
    expect(Object.keys(lackingIn({ ...whole, absentReason: '' }, 'quick'))).toEqual(['initials']);
    expect(Object.keys(lackingIn({ ...whole, initials: [[1, 2]] }, 'quick'))).toEqual(['initials']);
    expect(Object.keys(lackingIn({ ...whole, mayMove: null, paint: null }, 'none'))).toEqual(['paint', 'mayMove']);
  });
});
