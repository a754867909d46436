import { exact, type Exact } from '../../money/exact.ts';
import { isVolumeUnit, isWeightUnit, type VolumeUnit, type WeightUnit } from './units.ts';

export type Amount =
  { kind: 'volume'; value: Exact; unit: VolumeUnit } | { kind: 'weight'; value: Exact; unit: WeightUnit };

export type AmountReading =
  Amount | { kind: 'question'; question: string; readings: Amount[] } | { kind: 'unreadable'; reason: string };

/** What people write for a unit; "oz" and "ounces" alone are asked about. */
const UNIT_WORDS: [RegExp, VolumeUnit | WeightUnit][] = [
  [/^(ml|cc|milliliters?|millilitres?)$/, 'mL'],
  [/^(l|liters?|litres?)$/, 'L'],
  [/^((us )?gal|(us )?gallons?)$/, 'US gal'],
  [/^((us )?(liquid )?(qt|quarts?))$/, 'US liquid qt'],
  [/^((us )?(liquid )?(pt|pints?))$/, 'US liquid pt'],
  [/^((us )?cups?)$/, 'US cup'],
  [/^((us )?(fl oz|floz|fluid ounces?|fluid oz))$/, 'US fl oz'],
  [/^((us )?(tbsp|tablespoons?))$/, 'US tbsp'],
  [/^((us )?(tsp|teaspoons?))$/, 'US tsp'],
  [/^(imp(erial)? (gal|gallons?))$/, 'imperial gal'],
  [/^(g|grams?)$/, 'g'],
  [/^(kg|kilograms?|kilos?)$/, 'kg'],
  [/^(lbs?|pounds?)$/, 'lb'],
  [/^(oz \(weight\)|(weight|wt|dry|av) ?(oz|ounces?)|oz (wt|av))$/, 'oz (weight)'],
];

const AMOUNT = /^(\d+(?:[.,]\d+)?)\s*([^\d.,\s].*)$/;

/** Reads "16 fl oz", "1,5 L" or "66 lb" exactly; "16 oz" is asked about, for it may be a volume or a weight. */
export function readAmount(text: string): AmountReading {
  const [, digits = '', unitText = ''] = AMOUNT.exec(text.trim()) ?? [];
  if (digits === '') {
    const reason = text.trim().startsWith('-')
      ? 'An amount may not be negative.'
      : 'Write a number and a unit, such as 16 fl oz or 500 mL.';
    return { kind: 'unreadable', reason };
  }
  // "1,500" may be fifteen hundred or one and a half: three places after a comma are not read.
  if (/,\d{3}$/.test(digits))
    return { kind: 'unreadable', reason: `Write ${digits} without a comma, or with a point before the decimals.` };
  const value = exact(digits.replace(',', '.'));
  const word = unitText.toLowerCase().replaceAll('.', '').replaceAll(/\s+/g, ' ').trim();
  if (/^(oz|ounces?)$/.test(word)) {
    return {
      kind: 'question',
      question: `Is ${digits} oz a volume (fluid ounces) or a weight?`,
      readings: [
        { kind: 'volume', value, unit: 'US fl oz' },
        { kind: 'weight', value, unit: 'oz (weight)' },
      ],
    };
  }
  const unit = UNIT_WORDS.find(([pattern]) => pattern.test(word))?.[1];
  if (unit !== undefined && isVolumeUnit(unit)) return { kind: 'volume', value, unit };
  if (unit !== undefined && isWeightUnit(unit)) return { kind: 'weight', value, unit };
  return {
    kind: 'unreadable',
    reason: `The unit "${unitText.trim()}" is not known here: use fl oz, gal, mL, L, lb or kg.`,
  };
}
