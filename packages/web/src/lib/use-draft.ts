import { useCallback, useState } from 'react';

/** State that survives a reload of this tab until it is saved or given up. */
export function useDraft<T>(
  key: string | null,
  initial: () => T,
): { value: T; set: (next: T) => void; drop: () => void } {
  const [value, setValue] = useState<T>(() => {
    const kept = key === null ? null : sessionStorage.getItem(key);
    return kept === null ? initial() : (JSON.parse(kept) as T);
  });
  const set = useCallback(
    (next: T) => {
      setValue(next);
      if (key !== null) sessionStorage.setItem(key, JSON.stringify(next));
    },
    [key],
  );
  const drop = useCallback(() => {
    if (key !== null) sessionStorage.removeItem(key);
  }, [key]);
  return { value, set, drop };
}
