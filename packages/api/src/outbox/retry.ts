/** Waits before the second try and each after it, in seconds; after the last try it rests. Common practice, no source. */
export const RETRY_SECONDS = [30, 120, 600, 3600, 21_600] as const;
