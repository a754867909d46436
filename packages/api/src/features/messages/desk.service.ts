import { audit } from '../../db/audit.ts';
import { Enquiry, Message } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';

/** What could not be delivered starts over, now. @throws 404, 409 when it is not dead any more */
export function retryMessage({ now, actor }: Ctx, id: string): Promise<void> {
  return inTransaction(async (tx) => {
    const message = await Message.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!message) throw notFound('That message');
    if (message.state !== 'dead') throw conflict('not_dead', 'That message is not among the undelivered any more.');
    await message.update({ state: 'waiting', tries: 0, nextTryAt: now() }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'message', id, 'tried again');
    hintAfterCommit(tx, ['desk'], 'message', message.customerId);
  });
}

/** @throws 404, 409 when it has gone out or was dropped */
export function dropMessage({ now, actor, name }: Ctx, id: string): Promise<void> {
  return inTransaction(async (tx) => {
    const message = await Message.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!message) throw notFound('That message');
    if (message.state !== 'dead' && message.state !== 'waiting')
      throw conflict('gone', 'That message has gone out or was dropped already.');
    await message.update({ state: 'dropped', reason: `Dropped at the desk by ${name}.` }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'message', id, 'dropped');
    hintAfterCommit(tx, ['desk'], 'message', message.customerId);
  });
}

/** Marks what a customer wrote as answered; twice is once. @throws 404 */
export function settleEnquiry({ now, actor }: Ctx, id: string): Promise<void> {
  return inTransaction(async (tx) => {
    const enquiry = await Enquiry.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!enquiry) throw notFound('That enquiry');
    if (enquiry.settledAt) return;
    await enquiry.update({ settledAt: now(), settledBy: actor.userId }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'enquiry', id, 'answered');
    hintAfterCommit(tx, ['desk'], 'message', enquiry.customerId ?? id);
  });
}
