import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exact, type Exact } from '../../money/exact.ts';
import {
  concentrateShare,
  MixError,
  ratioFromAmounts,
  ratioOfPercent,
  ratioText,
  type DilutionRatio,
} from './dilution-ratio.ts';
import { doseInto, lanceBottleRatio } from './dose.ts';
import { costOfJob, drawFor } from './draw-from-stock.ts';
import { fillLine, mixByMarks } from './jug-marks.ts';
import { mixFromConcentrate, mixToFill, mixWithWater } from './mix.ts';
import { readRatio } from './read-ratio.ts';
import { mostLeftFor, topUpTo, topUpWith } from './top-up.ts';

const tenths = (most: number) => fc.integer({ min: 1, max: most * 10 }).map((value) => exact(value).div(10));
const amounts = tenths(640);
const ratios = tenths(256).map((waterParts): DilutionRatio => ({ waterParts }));
const shares = fc.integer({ min: 0, max: 100 }).map((value) => exact(value).div(100));

function same(found: Exact, wanted: Exact): void {
  expect(found.toFraction()).toBe(wanted.toFraction());
}

describe('volumes conserve', () => {
  it('fills a bottle with exactly its size, at exactly the ratio', () => {
    fc.assert(
      fc.property(amounts, ratios, (size, ratio) => {
        const { concentrate, water } = mixToFill(size, ratio);
        same(concentrate.add(water), size);
        same(ratioFromAmounts(concentrate, water).waterParts, ratio.waterParts);
      }),
    );
  });

  it('makes as much from a concentrate as the filled size needs of it', () => {
    fc.assert(
      fc.property(amounts, ratios, (concentrate, ratio) => {
        const { total } = mixFromConcentrate(concentrate, ratio);
        same(mixToFill(total, ratio).concentrate, concentrate);
      }),
    );
  });

  it('adds to water what a fill to the larger total takes', () => {
    fc.assert(
      fc.property(amounts, ratios, (water, ratio) => {
        const { concentrate, total } = mixWithWater(water, ratio);
        same(mixToFill(total, ratio).concentrate, concentrate);
      }),
    );
  });

  it('pours by marks no more and no less than the bottle, and names the ratio that gives', () => {
    fc.assert(
      fc.property(amounts, ratios, tenths(4), (size, ratio, step) => {
        fc.pre(step.lte(size));
        const marked = mixByMarks(size, ratio, step);
        same(marked.concentrateMark.add(marked.water), size);
        same(mixToFill(size, marked.ratio).concentrate, marked.concentrateMark);
        // The nearest mark is at most half a step off, but for the smallest one.
        const off = marked.concentrateMark.sub(marked.exact.concentrate).abs();
        expect(off.lte(step.div(2)) || marked.concentrateMark.equals(step)).toBe(true);
      }),
    );
  });

  it('costs a job what its concentrate costs', () => {
    fc.assert(
      fc.property(amounts, ratios, tenths(90), (amount, ratio, cost) => {
        const { concentrate } = drawFor(amount, ratio, exact(0));
        same(costOfJob([{ amount, ratio, costOfConcentrate: cost }]), concentrate.mul(cost));
      }),
    );
  });

  it('gives the wanted ratio at the panel through a lance', () => {
    fc.assert(
      fc.property(ratios, tenths(20), (bottle, drawn) => {
        const atPanel = { waterParts: bottle.waterParts.add(1).mul(drawn.add(1)).sub(1) };
        same(lanceBottleRatio(atPanel, drawn).waterParts, bottle.waterParts);
      }),
    );
  });
});

describe('top-up', () => {
  it('reaches the target, or says why it can’t and how much may be left', () => {
    fc.assert(
      fc.property(amounts, shares, ratios, ratios, (size, share, ratio, target) => {
        const bottle = { size, left: size.mul(share), ratio };
        const most = mostLeftFor(bottle, target);
        if (bottle.left.gt(most)) {
          expect(() => topUpTo(bottle, target)).toThrow(MixError);
          return;
        }
        const added = topUpTo(bottle, target);
        const concentrate = bottle.left.mul(concentrateShare(ratio)).add(added.addConcentrate);
        same(bottle.left.add(added.addConcentrate).add(added.addWater), size);
        same(ratioFromAmounts(concentrate, size.sub(concentrate)).waterParts, target.waterParts);
      }),
    );
  });

  it('with the bottle’s own ratio changes nothing, and with another lands between the two', () => {
    fc.assert(
      fc.property(amounts, shares, ratios, ratios, (size, share, ratio, other) => {
        const bottle = { size, left: size.mul(share), ratio };
        same(topUpWith(bottle, ratio).ratio.waterParts, ratio.waterParts);
        const real = topUpWith(bottle, other).ratio.waterParts;
        const [low, high] = ratio.waterParts.lt(other.waterParts) ? [ratio, other] : [other, ratio];
        expect(real.gte(low.waterParts) && real.lte(high.waterParts)).toBe(true);
      }),
    );
  });
});

describe('a printed ratio', () => {
  it('is read back as itself', () => {
    fc.assert(
      fc.property(ratios, (ratio) => {
        fc.pre(ratio.waterParts.gt(1));
        const read = readRatio(ratioText(ratio));
        expect(read.kind).toBe('ratio');
        if (read.kind === 'ratio') same(read.ratio.waterParts, ratio.waterParts);
      }),
    );
  });

  it('is the same as its share of the mix', () => {
    fc.assert(
      fc.property(ratios, (ratio) => {
        same(ratioOfPercent(concentrateShare(ratio).mul(100)).waterParts, ratio.waterParts);
      }),
    );
  });
});

describe('impossible mixes', () => {
  const ten = { waterParts: exact(10) };
  it.each([
    ['a dose over the bucket', () => doseInto('bucket', exact(5), exact(6), ten), /more than the bucket holds/],
    ['a straight dose', () => doseInto('tank', exact(5), exact(5), { waterParts: exact(0) }), /needs a ratio/],
    ['a neck longer than the bottle', () => fillLine({ brim: exact(32), headroom: exact(32) }), /below the neck/],
    ['a jug too coarse', () => mixByMarks(exact(1), ten, exact(2)), /smaller jug/],
    ['a lance too thin', () => lanceBottleRatio(ten, exact(20)), /lance alone thins more/],
    ['more left than fits', () => topUpWith({ size: exact(32), left: exact(33), ratio: ten }, ten), /more left/],
    ['a negative level', () => topUpWith({ size: exact(32), left: exact(-1), ratio: ten }, ten), /negative/],
    ['negative stock', () => drawFor(exact(32), ten, exact(-1)), /Stock may not be negative/],
    ['water for a straight product', () => mixWithWater(exact(1), { waterParts: exact(0) }), /takes no water/],
  ])('%s', (_name, work, message) => {
    expect(work).toThrow(MixError);
    expect(work).toThrow(message);
  });

  it('tells how much stock lacks', () => {
    same(drawFor(exact(11), ten, exact('0.25')).short, exact('0.75'));
    same(drawFor(exact(11), ten, exact(1)).short, exact(0));
  });
});
