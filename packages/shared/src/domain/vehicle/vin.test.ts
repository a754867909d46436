import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { modelYear, yearsOfCode } from './model-year.ts';
import { readVin } from './vin.ts';

/* The published rows are run beside the kit's in ../kit/check. */

const VALID = '1M8GDM9AXKP042788';

describe('the check digit (49 CFR 565.15)', () => {
  it('reads over small letters, spaces and hyphens', () => {
    expect(readVin(' 1m8gdm9ax-kp04 2788')).toMatchObject({ kind: 'checked', normalised: VALID, isValid: true });
  });

  it('is no proof: J for A still passes', () => {
    expect(readVin(VALID.replace('9A', '9J'))).toMatchObject({ isValid: true });
  });

  it.each([
    ['1M8GDM9AXKP0427889', '18 characters'],
    ['A', '1 character'],
    ['1M8GDM9AXKP04278Q', 'letter Q'],
    ['1M8GDM9AXKP04278*', 'character *'],
    ['1M8GDM9AXKP04278É', 'character É'],
  ])('%s: %s', (vin, reason) => {
    expect(readVin(vin)).toMatchObject({ kind: 'malformed', reason });
  });

  it('finds any single digit changed to another', () => {
    fc.assert(
      fc.property(fc.integer({ min: 11, max: 16 }), fc.integer({ min: 1, max: 9 }), (position, step) => {
        const digit = String((Number(VALID[position]) + step) % 10);
        expect(readVin(`${VALID.slice(0, position)}${digit}${VALID.slice(position + 1)}`)).toMatchObject({
          isValid: false,
        });
      }),
    );
  });
});

describe('the model year', () => {
  it('goes by position 7: a digit before 2010, a letter from then on', () => {
    expect(modelYear('1J9RP1A36A1644345')).toBe(2010);
    expect(modelYear('1J9RP1136A1644345')).toBe(1980);
  });

  it.each(['I', 'O', 'Q', 'U', 'Z', '0', '', 'AB'])('"%s" is no code', (code) => {
    expect(yearsOfCode(code)).toBeNull();
  });
});
