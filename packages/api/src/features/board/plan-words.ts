import type { Transaction } from 'sequelize';
import { clockOf, dayOf } from '@driprail/shared/domain/time/zone';
import { formatDay } from '@driprail/shared/domain/time/format';
import { Van } from '../../db/models/index.ts';

/** What a plan change did, for the visit's history: "Placed on Dunlin, Thu May 14 13:00". */
export async function wordsOfPlan(
  tx: Transaction,
  plan: { vanId: string | null; from: string | null },
  zone: string,
): Promise<string> {
  if (!plan.vanId || !plan.from) return 'Back to Unplaced';
  const van = await Van.findByPk(plan.vanId, { transaction: tx });
  return `Placed on ${van?.name ?? 'a van'}, ${formatDay(dayOf(plan.from, zone))} ${clockOf(plan.from, zone)}`;
}
