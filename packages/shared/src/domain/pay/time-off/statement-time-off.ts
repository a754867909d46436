import { z } from 'zod';
import { timeOffKinds, type TimeOffKind } from './time-off-rule.ts';
import type { TimeOffWeek } from './time-off-ledger.ts';

/** One kind of paid time off on a week's statement; exact hours, "n/d" or "n". */
export const statementTimeOff = z.object({
  kind: z.enum(timeOffKinds),
  /** Earned by hours or given in this week, before what a cap left out. */
  earned: z.string(),
  taken: z.string(),
  adjusted: z.string(),
  lost: z.string(),
  /** At the week's end. */
  balance: z.string(),
});
export type StatementTimeOff = z.infer<typeof statementTimeOff>;

/** The statement's row of a kind from its ledger up to the week; null where nothing was ever earned or taken. */
export function statementRow(kind: TimeOffKind, weeks: readonly TimeOffWeek[]): StatementTimeOff | null {
  const week = weeks.at(-1);
  if (!week || weeks.every(({ moves }) => moves.length === 0)) return null;
  const { earned, taken, adjusted, lost, balance } = week;
  return { kind, earned, taken, adjusted, lost, balance };
}
