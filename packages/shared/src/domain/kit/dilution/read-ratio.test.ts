import { describe, expect, it } from 'vitest';
import { chartRatio } from './chart-ratio.ts';
import { ratioText } from './dilution-ratio.ts';
import { readRatio } from './read-ratio.ts';
import { topUpHindrance } from './top-up.ts';

function readingsOf(text: string): string[] {
  const read = readRatio(text);
  if (read.kind === 'unreadable') throw new Error(read.reason);
  return read.kind === 'ratio' ? [ratioText(read.ratio)] : read.readings.map(({ ratio }) => ratioText(ratio));
}

describe('what people write for a ratio', () => {
  it.each([
    ['10:1', '10:1'],
    [' 10 : 1 ', '10:1'],
    ['7-1', '7:1'],
    ['7 to 1', '7:1'],
    ['7/1', '7:1'],
    ['2,5:1', '2.5:1'],
    ['1:1', '1:1'],
    ['straight', 'straight'],
    ['Undiluted', 'straight'],
    ['12,5 %', '7:1'],
    ['12.5%', '7:1'],
    ['10 %', '9:1'],
    ['100 %', 'straight'],
    ['1 in 10', '9:1'],
    ['one in 10', '9:1'],
  ])('"%s" has one meaning: %s', (text, ratio) => {
    expect(readRatio(text).kind).toBe('ratio');
    expect(readingsOf(text)).toEqual([ratio]);
  });

  it.each([
    ['1:7', ['7:1', '6:1', '0.1429:1']],
    ['1-7', ['7:1', '6:1', '0.1429:1']],
    ['3:2', ['1.5:1', '0.6667:1']],
    ['7', ['7:1', '6:1', '13.2857:1']],
    ['128', ['128:1', '127:1']],
    ['4 oz per gallon', ['32:1', '31:1']],
    ['4 fl oz/gal', ['32:1', '31:1']],
  ])('"%s" is asked about', (text, ratios) => {
    expect(readRatio(text).kind).toBe('question');
    expect(readingsOf(text)).toEqual(ratios);
  });

  it('says in words what each reading means', () => {
    const read = readRatio('1:7');
    expect(read).toMatchObject({ kind: 'question', question: 'Which part is water?' });
    if (read.kind !== 'question') throw new Error('Understood though it has several meanings.');
    expect(read.readings.map(({ label }) => label)).toEqual([
      '7 parts water to 1 part concentrate (7:1)',
      '1 part in 7: 6 parts water to 1 part concentrate',
      '0.1429 parts water to 1 part concentrate (0.1429:1)',
    ]);
  });

  it.each([
    ['', /is no ratio/],
    ['a splash', /is no ratio/],
    ['-7:1', /negative/],
    ['0:1', /may be 0/],
    ['10:0', /may be 0/],
    ['0', /may not be 0/],
    ['0 %', /more than 0 and at most 100/],
    ['120 %', /more than 0 and at most 100/],
    ['1,500:1', /without a comma/],
    ['200 oz per gallon', /128 fl oz/],
    ['1 in 0.5', /more than the whole/],
    ['10:1:1', /is no ratio/],
  ])('"%s" is not read', (text, reason) => {
    const read = readRatio(text);
    expect(read.kind).toBe('unreadable');
    if (read.kind === 'unreadable') expect(read.reason).toMatch(reason);
  });
});

describe('a printed chart', () => {
  it('takes the larger number for the water, in either order (three suppliers’ charts)', () => {
    expect(chartRatio('1:10')).toEqual(chartRatio('10:1'));
  });

  it('reads one part in so many where it says so (public health fact sheets)', () => {
    expect(ratioText(chartRatio('1:10 (one in ten)'))).toBe('9:1');
    expect(ratioText(chartRatio('1:100 (one in a hundred)'))).toBe('99:1');
  });

  it('does not guess an order that can’t be told', () => {
    expect(() => chartRatio('0.5:1')).toThrow('which part is water');
  });
});

describe('a bottle that is never topped up', () => {
  it('is emptied and rinsed (common practice, no source)', () => {
    expect(topUpHindrance(['bleach', 'expired'])).toBe(
      'A bleach is never topped up: empty the bottle, rinse it, and mix afresh.',
    );
    expect(topUpHindrance([])).toBeNull();
  });
});
