import { exact, ONE, type Exact } from '../../money/exact.ts';
import { ratioOf, ratioOfPercent, ratioText, STRAIGHT, MixError, type DilutionRatio } from './dilution-ratio.ts';

export interface RatioChoice {
  /** What the choice means, for a button: "7 parts water to 1 part concentrate (7:1)". */
  label: string;
  ratio: DilutionRatio;
}

export type RatioReading =
  | { kind: 'ratio'; ratio: DilutionRatio }
  | { kind: 'question'; question: string; readings: RatioChoice[] }
  | { kind: 'unreadable'; reason: string };

const NUMBER = String.raw`(\d+(?:[.,]\d+)?)`;
const PAIR = new RegExp(`^${NUMBER}\\s*(?::|-|–|/|to|\\+)\\s*${NUMBER}$`);
const LONE = new RegExp(`^${NUMBER}$`);
const PERCENT = new RegExp(`^${NUMBER}\\s*(?:%|percent)$`);
const ONE_IN = new RegExp(`^(?:1|one)\\s+(?:part\\s+)?in\\s+${NUMBER}$`);
const PER_GALLON = new RegExp(`^${NUMBER}\\s*(?:fl\\.?\\s*)?oz\\.?\\s*(?:per|/|to the|to a)\\s*gal(?:lon)?$`);
const STRAIGHT_WORDS = /^(straight|undiluted|neat|ready to use|rtu|as is)$/;
const EXAMPLES = 'Write the parts of water to 1 part of concentrate, such as 10:1, or straight.';

/**
 * Reads a ratio as people write it. "7:1", "7-1", "7 to 1", "1:1", "12,5 %", "1 in 10" and "straight" have one meaning;
 * "1:7" (product first, or one part in seven?), "7" and "4 oz per gallon" have several, and all of them are handed back.
 * Nothing is guessed.
 */
export function readRatio(text: string): RatioReading {
  const plain = text.trim().toLowerCase().replaceAll(/\s+/g, ' ');
  try {
    return reading(plain);
  } catch (error) {
    if (error instanceof MixError) return { kind: 'unreadable', reason: error.message };
    throw error;
  }
}

function reading(plain: string): RatioReading {
  if (STRAIGHT_WORDS.test(plain)) return { kind: 'ratio', ratio: STRAIGHT };
  if (plain.includes('-') && plain.startsWith('-')) return unreadable('A ratio may not be negative.');
  const percent = PERCENT.exec(plain)?.[1];
  if (percent !== undefined) return { kind: 'ratio', ratio: ratioOfPercent(decimal(percent)) };
  const oneIn = ONE_IN.exec(plain)?.[1];
  if (oneIn !== undefined) return { kind: 'ratio', ratio: oneInRatio(decimal(oneIn)) };
  const ounces = PER_GALLON.exec(plain)?.[1];
  if (ounces !== undefined) return ouncesPerGallon(decimal(ounces));
  const lone = LONE.exec(plain)?.[1];
  if (lone !== undefined) return loneNumber(decimal(lone));
  const [, first, second] = PAIR.exec(plain) ?? [];
  if (first === undefined || second === undefined) return unreadable(`"${plain}" is no ratio. ${EXAMPLES}`);
  return pair(decimal(first), decimal(second));
}

/** The house writes water first: "7:1". A 1 in front is the other order, or one part in so many. */
function pair(first: Exact, second: Exact): RatioReading {
  if (first.equals(0) || second.equals(0))
    return unreadable('Neither part of a ratio may be 0; an undiluted product is called straight.');
  if (first.equals(second)) return { kind: 'ratio', ratio: ratioOf(ONE) };
  if (second.equals(ONE) && first.gt(ONE)) return { kind: 'ratio', ratio: ratioOf(first) };
  const readings = [choice(first.gt(second) ? first.div(second) : second.div(first))];
  if (first.equals(ONE) && second.gt(ONE)) readings.push(choice(second.sub(ONE), `1 part in ${plainText(second)}`));
  readings.push(choice(first.gt(second) ? second.div(first) : first.div(second)));
  return { kind: 'question', question: 'Which part is water?', readings };
}

function loneNumber(value: Exact): RatioReading {
  if (value.equals(0)) return unreadable('A ratio may not be 0; an undiluted product is called straight.');
  const readings = [choice(value)];
  if (value.gt(ONE)) readings.push(choice(value.sub(ONE), `1 part in ${plainText(value)}`));
  if (value.lt(100))
    readings.push(choice(ratioOfPercent(value).waterParts, `${plainText(value)} % of the finished mix`));
  return { kind: 'question', question: `What does ${plainText(value)} mean?`, readings };
}

/** Charts pour either into a full gallon of water or up to a gallon in all. */
function ouncesPerGallon(ounces: Exact): RatioReading {
  if (ounces.lte(0) || ounces.gte(128))
    return unreadable('A gallon holds 128 fl oz: give more than 0 and less than that.');
  const added = exact(128).div(ounces);
  return {
    kind: 'question',
    question: 'Is the product added to a full gallon of water, or is the gallon filled up with water?',
    readings: [choice(added, 'Added to a full gallon'), choice(added.sub(ONE), 'Filled up to a gallon')],
  };
}

export function oneInRatio(parts: Exact): DilutionRatio {
  if (parts.equals(ONE)) return STRAIGHT;
  if (parts.lt(ONE)) throw new MixError('One part in less than 1 is more than the whole: write 1 in 10, for example.');
  return ratioOf(parts.sub(ONE));
}

function choice(waterParts: Exact, meaning?: string): RatioChoice {
  const ratio = { waterParts };
  const parts = `${plainText(waterParts)} ${waterParts.equals(ONE) ? 'part' : 'parts'} water to 1 part concentrate`;
  return { ratio, label: meaning ? `${meaning}: ${parts}` : `${parts} (${ratioText(ratio)})` };
}

function plainText(value: Exact): string {
  return ratioText({ waterParts: value }).replace(/:1$/, '').replace('straight', '0');
}

function decimal(text: string): Exact {
  // "1,500:1" would be one and a half or fifteen hundred.
  if (/,\d{3}$/.test(text)) throw new MixError(`Write ${text} without a comma, or with a point before the decimals.`);
  return exact(text.replace(',', '.'));
}

function unreadable(reason: string): RatioReading {
  return { kind: 'unreadable', reason };
}
