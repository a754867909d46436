import { useSyncExternalStore } from 'react';

export function useMedia(query: string): boolean {
  return useSyncExternalStore(
    (watch) => {
      const list = matchMedia(query);
      list.addEventListener('change', watch);
      return () => list.removeEventListener('change', watch);
    },
    () => matchMedia(query).matches,
  );
}
