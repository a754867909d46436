import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { channels } from '@driprail/shared/domain/customer/consent';
import type { MessageKind } from '@driprail/shared/domain/messages/kinds';
import { companyOf } from '../../db/company.ts';
import { run } from '../../db/sequelize.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { closedBecause, readReach } from './reach.queries.ts';

/** What happened that a customer is told of. */
export interface MessageEvent {
  kind: MessageKind;
  jobId: string;
  visitId?: string;
  /** Names what happened: the same is told once. */
  eventKey: string;
  /** The visit event, payment, refund or invoice. */
  causeId?: string;
  amountCents?: number;
}

/** Pressed by somebody who may take it back: these wait out the undo time. */
const waitsForUndo: MessageKind[] = ['booked', 'moved', 'on_the_way', 'called_off', 'receipt'];

/** After so many hours a message of its kind is of no use; the others end with the visit's window. */
const usefulHours: Partial<Record<MessageKind, number>> = {
  on_the_way: 3,
  called_off: 24,
  done: 7 * 24,
  receipt: 7 * 24,
  refund: 7 * 24,
  feedback: 3 * 24,
};

/**
 * A promise to tell the customer, as rows in the transaction of what happened: one mail, and one text where the customer
 * said yes to texts. What can't be told by mail is noted as dropped with its reason. Words are made when it goes out.
 */
export async function queueMessage(tx: Transaction, now: Date, event: MessageEvent): Promise<void> {
  const { kind, jobId } = event;
  const reach = await readReach(tx, jobId, kind);
  if (!reach.isOn) return;
  const { undoSeconds } = await companyOf(tx);
  const wait = waitsForUndo.includes(kind) ? undoSeconds : 0;
  const hours = usefulHours[kind];
  for (const channel of channels) {
    const reason = closedBecause(reach, kind, channel);
    if (reason && channel === 'text') continue;
    await run(
      `INSERT INTO messages (id, kind, channel, event_key, customer_id, job_id, visit_id, cause_id, amount_cents, state, reason,
                             created_at, next_try_at, last_moment)
       VALUES (:id, :kind, :channel, :eventKey, :customerId, :jobId, :visitId, :causeId, :amountCents, :state, :reason,
               :now, :nextTryAt, :lastMoment)
       ON CONFLICT (kind, event_key, channel) DO NOTHING`,
      {
        ...{ id: uuid(), kind, channel, eventKey: event.eventKey, customerId: reach.customerId, jobId, now },
        ...{ visitId: event.visitId ?? null, causeId: event.causeId ?? null, amountCents: event.amountCents ?? null },
        ...{ state: reason ? 'dropped' : 'waiting', reason: reason ?? '' },
        nextTryAt: new Date(now.getTime() + wait * 1000),
        lastMoment: hours === undefined ? null : new Date(now.getTime() + hours * 3_600_000),
      },
      tx,
    );
  }
  hintAfterCommit(tx, ['desk'], 'message', reach.customerId);
}
