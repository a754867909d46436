import { benchAvailability } from './availability.bench.ts';
import { benchBoard } from './board.bench.ts';
import { benchDrag } from './drag.bench.ts';
import { benchHistory } from './history.bench.ts';
import { print, runBenches } from './measure.ts';
import { benchPay } from './pay.bench.ts';
import { openStage } from './stage.ts';

/** Prints ratios measured in this one run; absolute times are this machine's at this moment and say little. */
async function main(): Promise<void> {
  const stage = await openStage();
  try {
    for (const bench of [() => benchBoard(stage), () => benchDrag(stage), benchPay, () => benchAvailability(stage)])
      print(await bench());
  } finally {
    await stage.close();
  }
  for (const ratio of await benchHistory()) print(ratio);
}

runBenches(main);
