import type { BenchStage } from './stage.ts';
import { inTurn, median, timed } from './measure.ts';
import type { Ratio } from './measure.ts';

const ROUNDS = 200;

/** The signed-in board endpoint against a bare route, behind the same session middleware, that runs the same data's one statement. */
export async function benchBoard({ url, cookie, day, now, bare }: BenchStage): Promise<Ratio> {
  const get = (address: string) =>
    timed(async () => {
      const response = await fetch(address, { headers: { cookie } });
      if (!response.ok) throw new Error(`${address} answered ${response.status}`);
      await response.text();
    });
  const [endpoint, plain] = await inTurn(
    ROUNDS,
    20,
    () => get(`${url}/api/board/${day}`),
    () => get(bare),
  );
  const [a, b] = [median(endpoint), median(plain)];
  return {
    what: 'board endpoint / bare route with the same statement',
    ratio: a / b,
    goal: 1.5,
    note: `${a.toFixed(1)} ms / ${b.toFixed(1)} ms, median of ${ROUNDS}, ${now}`,
  };
}
