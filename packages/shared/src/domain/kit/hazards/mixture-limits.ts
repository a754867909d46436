import { exact } from '../../money/exact.ts';

/**
 * Generic limits for classing a mixture, in percent by weight: 29 CFR 1910.1200 Appendix A, figures read from a public copy
 * that quotes each table cell.
 */
export const SKIN_LIMITS = {
  /** Table A.2.3, sum of Skin corrosion 1: at or above is Category 1. */
  corrosive: exact(5),
  /** Table A.2.3, sum of Skin corrosion 1: at or above, and below 5, is Category 2. */
  corrosiveToIrritant: exact(1),
  /** Table A.2.3, sum of Skin irritation 2, and 10 x corrosion 1 + irritation 2. */
  irritant: exact(10),
};

export const EYE_LIMITS = {
  /** Table A.3.3, sum of Skin corrosion 1 and Eye damage 1. */
  damaging: exact(3),
  /** Table A.3.3; the copy prints "more than 3%" at the upper end, plainly a misprint of "less than 3%". */
  damagingToIrritant: exact(1),
  /** Table A.3.3, sum of Eye irritation 2, and 10 x (skin 1 + eye 1) + eye 2. */
  irritant: exact(10),
};

/** Ingredients that need not add up: strong acids and bases and the like (Tables A.2.4 and A.3.4). */
export const NON_ADDITIVE_LIMITS = {
  corrosive: exact(1),
  /** From memory. */
  irritant: exact(3),
};

/** An ingredient counts from here, unless less is suspected to matter (A.1.3.3(a)). */
export const RELEVANT_FROM = exact(1);

/** pH at or under, and at or over, with no better data: skin 1 and eye 1 (EU CLP Annex I 3.2.3.1.2; A.2 and A.3 alike). */
export const EXTREME_PH = { low: 2, high: 11.5 } as const;

/** Single-ingredient limits, percent; the same category as the ingredient. */
export const INGREDIENT_LIMITS = {
  'Skin sensitization 1': { from: exact('0.1'), source: 'Table A.4.5' },
  'Skin sensitization 1A': { from: exact('0.1'), source: 'Table A.4.5' },
  'Skin sensitization 1B': { from: exact(1), source: 'Table A.4.5' },
  'Respiratory sensitization 1': { from: exact('0.1'), source: 'Table A.4.5' },
  'Respiratory sensitization 1A': { from: exact('0.1'), source: 'Table A.4.5' },
  'Respiratory sensitization 1B': { from: exact(1), source: 'Table A.4.5, solids and liquids' },
  'STOT SE 1': { from: exact(1), source: 'Table A.8.2' },
  'STOT SE 2': { from: exact(1), source: 'Table A.8.2' },
  'STOT RE 1': { from: exact(1), source: 'Table A.9.3' },
  'STOT RE 2': { from: exact(1), source: 'Table A.9.3' },
  'Carcinogenicity 1': { from: exact('0.1'), source: 'Table A.6.1' },
  'Carcinogenicity 2': { from: exact('0.1'), source: 'Table A.6.1' },
  'Mutagenicity 1': { from: exact('0.1'), source: 'Table A.5.1' },
  'Mutagenicity 2': { from: exact(1), source: 'Table A.5.1' },
  'Reproductive toxicity 1': { from: exact('0.1'), source: 'Table A.7.1' },
  'Reproductive toxicity 2': { from: exact('0.1'), source: 'Table A.7.1' },
  'Effects on or via lactation': { from: exact('0.1'), source: 'Table A.7.1' },
  /** A guide, not a fixed limit: expert judgment. Summed over ingredients of the same effect. */
  'STOT SE 3': { from: exact(20), source: 'A.8.3.4' },
} as const;

export type LimitedHazard = keyof typeof INGREDIENT_LIMITS;
