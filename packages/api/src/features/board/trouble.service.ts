import { audit } from '../../db/audit.ts';
import { VisitEvent } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';

/** Says how a trouble that a crew reported was settled; it leaves the board, its record stays. */
export function settleTrouble({ actor, now }: Ctx, id: string, outcome: string): Promise<void> {
  return inTransaction(async (tx) => {
    const event = await VisitEvent.findOne({ where: { id, kind: 'trouble' }, transaction: tx, lock: tx.LOCK.UPDATE });
    if (!event) throw notFound('That report');
    if (event.settledAt) throw conflict('settled', 'Somebody settled this already.');
    await event.update({ settledAt: now(), settledBy: actor.userId, outcome }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'visit', event.visitId, 'trouble settled', { outcome });
    hintAfterCommit(tx, ['desk'], 'visit', event.visitId);
  });
}
