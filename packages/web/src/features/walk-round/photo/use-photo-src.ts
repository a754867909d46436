import { useEffect, useState } from 'react';
import { fileOf } from '../../../lib/outbox/drafts.ts';
import type { ShownPhoto } from '../components/shown-walk.ts';

/** Where the picture of a photo is: on the server, or still on this phone. Null while it is on another phone. */
export function usePhotoSrc({ id, isStored, isHere }: ShownPhoto): string | null {
  const [local, setLocal] = useState<string | null>(null);
  useEffect(() => {
    if (isStored || !isHere) return undefined;
    let url: string | null = null;
    let isGone = false;
    void fileOf(id).then((blob) => {
      if (!blob || isGone) return;
      url = URL.createObjectURL(blob);
      setLocal(url);
    });
    return () => {
      isGone = true;
      if (url) URL.revokeObjectURL(url);
      setLocal(null);
    };
  }, [id, isStored, isHere]);
  return isStored ? `/api/photos/${id}` : local;
}
