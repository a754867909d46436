/** Runs work now and then again after each pause, one run at a time; a failure is logged and the next run comes. */
export function every(
  seconds: number,
  work: () => Promise<unknown>,
  log: (error: unknown) => void,
): { poke: () => void; stop: () => Promise<void> } {
  let timer: NodeJS.Timeout | null = null;
  let running: Promise<void> | null = null;
  let isStopped = false;
  const tick = (): void => {
    if (running || isStopped) return;
    if (timer) clearTimeout(timer);
    running = work()
      .then(
        () => undefined,
        (error: unknown) => log(error),
      )
      .finally(() => {
        running = null;
        if (!isStopped) timer = setTimeout(tick, seconds * 1000);
      });
  };
  tick();
  return {
    poke: tick,
    async stop() {
      isStopped = true;
      if (timer) clearTimeout(timer);
      await running;
    },
  };
}
