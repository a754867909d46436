import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { ownDay, visitFrom } from '../board/index.ts';
import { authorizeBill } from './bill-access.ts';
import { readBill } from './bill.presenter.ts';

/** The bills of one's own crew's day, each job once. @throws 404 for a technician's days that are not near */
export async function readDayBills(ctx: Ctx, day: string): Promise<BillDto[]> {
  const { personId } = ctx.actor;
  if (!personId) return [];
  const rows = await select<{ jobId: string }>(
    `SELECT DISTINCT v.job_id AS "jobId" FROM ${visitFrom} CROSS JOIN company_settings s WHERE ${ownDay}`,
    { personId, day },
  );
  const bills: BillDto[] = [];
  for (const { jobId } of rows) {
    await authorizeBill(ctx, 'read', jobId);
    bills.push(await readBill(jobId, ctx.now()));
  }
  return bills;
}
