import { isBefore, wholeSeconds } from './zone.ts';

/** Corrections of a phone's clock over this are flagged. */
const FLAG_OVER_MS = 2 * 60_000;

export interface StampedTimes {
  deviceAt: string;
  receivedAt: string;
  /** What pay uses: the device's time corrected by its offset at the last contact, never after it was received. */
  occurredAt: string;
  isCorrected: boolean;
}

/** @param offsetMs device time minus server time at the last contact, milliseconds */
export function stamp(deviceAt: string, offsetMs: number, received: Date): StampedTimes {
  const receivedAt = wholeSeconds(received);
  const corrected = wholeSeconds(new Date(Date.parse(deviceAt) - offsetMs));
  const occurredAt = isBefore(receivedAt, corrected) ? receivedAt : corrected;
  const isCorrected = Math.abs(Date.parse(deviceAt) - Date.parse(occurredAt)) > FLAG_OVER_MS;
  return { deviceAt: wholeSeconds(deviceAt), receivedAt, occurredAt, isCorrected };
}
