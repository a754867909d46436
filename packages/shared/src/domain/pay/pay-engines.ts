import { computePayWeek, ENGINE_VERSION } from './compute-pay-week.ts';
import type { PayWeekInput, PayWeekResult } from './pay-week.types.ts';

/** Every engine by which a kept week may have been locked, by its version. */
const ENGINES: Record<string, (input: PayWeekInput) => PayWeekResult> = { [ENGINE_VERSION]: computePayWeek };

/**
 * The engine of a stored version, to work out a locked week again from its snapshot.
 * @returns null for a version that this build does not hold
 */
export function payEngine(version: string): ((input: PayWeekInput) => PayWeekResult) | null {
  return ENGINES[version] ?? null;
}
