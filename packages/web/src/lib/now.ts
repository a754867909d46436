import { useEffect, useState } from 'react';
import { serverNow } from './device-clock.ts';

/** The time now by the server's clock, renewed three times a minute. */
export function useNow(): string {
  const [now, setNow] = useState(() => serverNow().toISOString());
  useEffect(() => {
    const timer = setInterval(() => setNow(serverNow().toISOString()), 20_000);
    return () => clearInterval(timer);
  }, []);
  return now;
}
