import { useCallback, useEffect, useRef, useState } from 'react';
import { dropDraft, keepDraft, readDraft } from '../../../lib/outbox/drafts.ts';

/**
 * What is begun and not finished, kept on the phone at every change, also when the app is closed.
 * `value` is null until it was looked for.
 */
export function useWalkDraft<T>(
  name: string,
  begin: () => T,
): { value: T | null; set: (next: T) => void; drop: () => void } {
  const [value, setValue] = useState<T | null>(null);
  const first = useRef(begin);
  useEffect(() => {
    let isGone = false;
    void readDraft<T>(name)
      .catch(() => null)
      .then((kept) => {
        if (!isGone) setValue(kept ?? first.current());
      });
    return () => {
      isGone = true;
    };
  }, [name]);
  const set = useCallback(
    (next: T) => {
      setValue(next);
      // A full phone still shows what was entered; finishing it sends it from here.
      keepDraft(name, next).catch(() => undefined);
    },
    [name],
  );
  const drop = useCallback(() => void dropDraft(name), [name]);
  return { value, set, drop };
}
