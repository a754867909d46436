import { describe, expect, it } from 'vitest';
import { exact, fractionText } from './exact.ts';
import { centsText, decimalText, shortText, toCents, toCentsDown, toCentsUp } from './rounding.ts';

describe('rounding', () => {
  it('rounds halves up, and negative ones as their mirror', () => {
    expect(['0.005', '0.0049', '2.675', '-0.005'].map((value) => toCents(exact(value)))).toEqual([1, 0, 268, -1]);
  });

  it('rounds a legal floor up and the most that may be taken down', () => {
    expect([toCentsUp(exact('1/3')), toCentsUp(exact('0.34')), toCentsDown(exact('2/3'))]).toEqual([34, 34, 66]);
  });

  it('writes decimals, short figures and cents', () => {
    expect(decimalText(exact('228/7'), 4)).toBe('32.5714');
    expect(decimalText(exact('-1/3'), 2)).toBe('-0.33');
    expect(decimalText(exact('7/2'), 0)).toBe('4');
    expect([shortText(exact('42.25')), shortText(exact('124/3')), shortText(exact('40'))]).toEqual([
      '42.25',
      '41.3333',
      '40',
    ]);
    expect([centsText(101224), centsText(-795), centsText(100000000), centsText(5)]).toEqual([
      '1,012.24',
      '-7.95',
      '1,000,000.00',
      '0.05',
    ]);
  });
});

describe('exact numbers', () => {
  it('reads decimals and fractions without loss', () => {
    expect(fractionText(exact('0.1').add(exact('0.2')))).toBe('3/10');
    expect(fractionText(exact('169/4'))).toBe('169/4');
  });

  it.each(['', '12,50', '1e5', 'abc', '1/0', '--1'])('refuses "%s"', (text) => {
    expect(() => exact(text)).toThrow(RangeError);
  });
});
