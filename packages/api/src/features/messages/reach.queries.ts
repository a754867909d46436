import type { Transaction } from 'sequelize';
import type { Channel, Consent } from '@driprail/shared/domain/customer/consent';
import { mayWrite } from '@driprail/shared/domain/customer/consent';
import { groupOf } from '@driprail/shared/domain/messages/kinds';
import type { MessageKind } from '@driprail/shared/domain/messages/kinds';
import { select } from '../../db/sequelize.ts';

/** How a job's customer is reached, and what the customer has said about it. */
export interface Reach {
  customerId: string;
  name: string;
  isCompany: boolean;
  email: string;
  phone: string;
  consents: Consent[];
  stops: string[];
  hasBounced: boolean;
  isOn: boolean;
}

export async function readReach(tx: Transaction, jobId: string, kind: MessageKind): Promise<Reach> {
  const [row] = await select<Reach>(
    `SELECT c.id AS "customerId", c.name, c.is_company AS "isCompany", c.email, c.phone,
            coalesce((SELECT json_agg(json_build_object('channel', o.channel, 'isGiven', o.is_given, 'on', o.given_on, 'how', o.how))
                FROM (SELECT DISTINCT ON (channel) * FROM customer_consents WHERE customer_id = c.id
                       ORDER BY channel, recorded_at DESC, id DESC) o), '[]') AS consents,
            ARRAY(SELECT what FROM message_stops WHERE customer_id = c.id) AS stops,
            EXISTS (SELECT 1 FROM mail_bounces WHERE customer_id = c.id AND address = c.email) AS "hasBounced",
            coalesce((SELECT is_on FROM message_kinds WHERE kind = :kind), true) AS "isOn"
       FROM jobs j JOIN customers c ON c.id = j.customer_id WHERE j.id = :jobId`,
    { jobId, kind },
    tx,
  );
  if (!row) throw new Error('a message is about a job of a customer');
  return row;
}

/** Why a channel is closed to a kind of message, in a sentence; null: it is open. */
export function closedBecause(reach: Reach, kind: MessageKind, channel: Channel): string | null {
  if (!reach.isOn) return 'This kind of message is switched off.';
  if (channel === 'text') {
    if (reach.phone === '') return 'No phone is known.';
    if (!mayWrite('text', reach.consents)) return 'The customer has not said yes to texts.';
    return reach.stops.includes('texts') ? 'The customer answered STOP.' : null;
  }
  if (reach.email === '') return 'No e-mail address is known.';
  if (!mayWrite('mail', reach.consents)) return 'The customer said no to mail.';
  if (reach.stops.includes(groupOf(kind))) return 'The customer stopped such mails by the link in one.';
  return reach.hasBounced ? 'Mail to this address came back. Ask for another one.' : null;
}
