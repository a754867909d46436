/** A Node-style callback that settles a promise. */
export function settled(resolve: () => void, reject: (error: Error) => void): (error: unknown) => void {
  return (error) => {
    if (!error) resolve();
    else reject(error instanceof Error ? error : new Error('failed', { cause: error }));
  };
}
