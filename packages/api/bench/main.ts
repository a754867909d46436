import { benchBoard } from './board.bench.ts';
import { benchDrag } from './drag.bench.ts';
import { benchPay } from './pay.bench.ts';
import { openStage } from './stage.ts';

/** Prints ratios measured in this one run; absolute times are this machine's at this moment and say little. */
async function main(): Promise<void> {
  const stage = await openStage();
  try {
    for (const bench of [() => benchBoard(stage), () => benchDrag(stage), benchPay]) {
      const { what, ratio, goal, note } = await bench();
      process.stdout.write(`${ratio.toFixed(2)} (goal ${goal} or less)  ${what}: ${note}\n`);
    }
  } finally {
    await stage.close();
  }
}

main().then(
  () => process.exit(0),
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  },
);
