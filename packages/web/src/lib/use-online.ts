import { useSyncExternalStore } from 'react';

/** Whether the phone believes that it has signal. */
export function useOnline(): boolean {
  return useSyncExternalStore(
    (watch) => {
      window.addEventListener('online', watch);
      window.addEventListener('offline', watch);
      return () => {
        window.removeEventListener('online', watch);
        window.removeEventListener('offline', watch);
      };
    },
    () => navigator.onLine,
  );
}
