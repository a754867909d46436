/** Middle value of durations in milliseconds. */
export function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? Number.NaN;
}

/** The tenth of the values below which one in ten lies: what it costs when nothing else disturbs. */
export function tenth(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 10)] ?? Number.NaN;
}

export async function timed(work: () => Promise<unknown>): Promise<number> {
  const start = performance.now();
  await work();
  return performance.now() - start;
}

/** Runs two works in turn, so that a busy moment of the machine touches both. The first rounds only warm up. */
export async function inTurn(
  rounds: number,
  warmUp: number,
  one: () => Promise<number>,
  other: () => Promise<number>,
): Promise<[number[], number[]]> {
  const times: [number[], number[]] = [[], []];
  for (let round = 0; round < rounds + warmUp; round += 1) {
    const a = await one();
    const b = await other();
    if (round < warmUp) continue;
    times[0].push(a);
    times[1].push(b);
  }
  return times;
}

export interface Ratio {
  what: string;
  ratio: number;
  goal: number;
  note: string;
}

export function print({ what, ratio, goal, note }: Ratio): void {
  process.stdout.write(`${ratio.toFixed(2)} (goal ${goal} or less)  ${what}: ${note}\n`);
}

/** Runs a program of benches and ends the process, with 1 when one of them failed. */
export function runBenches(main: () => Promise<void>): void {
  main().then(
    () => process.exit(0),
    (error: unknown) => {
      process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
      process.exit(1);
    },
  );
}
