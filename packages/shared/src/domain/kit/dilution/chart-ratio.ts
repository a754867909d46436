import { exact, ONE } from '../../money/exact.ts';
import { MixError, ratioOf, type DilutionRatio } from './dilution-ratio.ts';
import { oneInRatio, readRatio } from './read-ratio.ts';

const PRINTED = /^(\d+(?:\.\d+)?)\s*:\s*(\d+(?:\.\d+)?)\s*(\(\s*one\s+(?:part\s+)?in\b.*\))?$/i;

/**
 * A ratio as a supplier's chart prints it, in detailing order (10:1) or janitorial order (1:10): the larger number is the
 * water (three suppliers' charts). Public health charts mean one part in so many and say so: "1:100 (one in a hundred)".
 * Use it where the convention is known; people's own words go through readRatio, which asks.
 * @throws {MixError} where the order can't be told
 */
export function chartRatio(text: string): DilutionRatio {
  const [, first, second, oneIn] = PRINTED.exec(text.trim()) ?? [];
  if (first === undefined || second === undefined) return onlyReading(text);
  const [a, b] = [exact(first), exact(second)];
  if (oneIn !== undefined) {
    if (a.lte(0)) throw new MixError('Neither part of a ratio may be 0.');
    return oneInRatio(b.div(a));
  }
  if (a.lte(0) || b.lte(0))
    throw new MixError('Neither part of a ratio may be 0; an undiluted product is called straight.');
  if (!a.equals(ONE) && !b.equals(ONE)) throw new MixError(`"${text}": one of the two parts must be 1, such as 10:1.`);
  if (a.lt(ONE) || b.lt(ONE))
    throw new MixError(`"${text}": which part is water? Write N:1 or 1:N with N of 1 or more.`);
  return ratioOf(a.gt(b) ? a : b);
}

function onlyReading(text: string): DilutionRatio {
  const read = readRatio(text);
  if (read.kind === 'ratio') return read.ratio;
  throw new MixError(
    read.kind === 'question'
      ? `"${text}": ${read.question} ${read.readings.map((item) => item.label).join('; or ')}.`
      : read.reason,
  );
}
