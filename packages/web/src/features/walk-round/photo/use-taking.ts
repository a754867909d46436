import { useState } from 'react';
import type { PhotoMoment, PhotoView } from '@driprail/shared/domain/walk-round/views';
import { photoViewNames } from '@driprail/shared/domain/walk-round/views';
import type { useWalkPress } from '../api/use-walk-press.ts';
import { PhotoFault, preparePhoto } from './prepare-photo.ts';

export interface TakingFault {
  view: PhotoView;
  message: string;
  /** Keeps the very photo that could not be kept; null when there is none. */
  retry: (() => Promise<void>) | null;
}

/** Takes photos: makes them small, keeps them on the phone, and says what went wrong without losing one. */
export function useTaking(pressing: ReturnType<typeof useWalkPress>, vehicleId: string | null) {
  const [faults, setFaults] = useState<TakingFault[]>([]);
  const [isBusy, setBusy] = useState(false);
  const settle = (fault: TakingFault) => setFaults((all) => all.filter((other) => other !== fault));

  const keep = async (view: PhotoView, kept: () => Promise<void>): Promise<void> => {
    try {
      await kept();
    } catch {
      const message =
        'This phone is full, so the photo is not kept yet. Leave this page open, make room, then keep it; or wait until photos have been sent.';
      const fault: TakingFault = { view, message, retry: null };
      fault.retry = () => {
        settle(fault);
        return keep(view, kept);
      };
      setFaults((all) => [...all, fault]);
    }
  };
  const take = async (file: Blob, view: PhotoView, moment: PhotoMoment): Promise<void> => {
    setBusy(true);
    try {
      const { blob, sha256 } = await preparePhoto(file);
      const facts = { vehicleId, view, moment, bytes: blob.size, sha256 };
      await keep(view, pressing.photo(facts, blob, `Photo, ${photoViewNames[view].toLowerCase()}`));
    } catch (error) {
      const message = error instanceof PhotoFault ? error.message : 'That photo can’t be read. Take it again.';
      setFaults((all) => [...all, { view, message, retry: null }]);
    } finally {
      setBusy(false);
    }
  };
  return { take, isBusy, faults, settle };
}
