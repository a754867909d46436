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

/** A press that took less to arrive was made with signal; the corrected clocks of two phones differ by seconds. */
const PROMPT_MS = 10_000;

/**
 * A press that arrived at once came after what the server already knew, whatever two phones' clocks say; one that waited
 * in a dead zone keeps its own time.
 * @param known the latest instant on record, null for none
 */
export function afterKnown(times: StampedTimes, known: string | null): StampedTimes {
  const isPrompt = Date.parse(times.receivedAt) - Date.parse(times.occurredAt) <= PROMPT_MS;
  const isEarlier = known !== null && isBefore(times.occurredAt, known) && !isBefore(times.receivedAt, known);
  return isPrompt && isEarlier ? { ...times, occurredAt: known } : times;
}
