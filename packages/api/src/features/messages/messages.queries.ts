import type { EnquiryDto, MessageDto, MessageView } from '@driprail/shared/contracts/messages.contract';
import { messageGroupNames } from '@driprail/shared/domain/messages/kinds';
import type { MessageGroup } from '@driprail/shared/domain/messages/kinds';
import { select } from '../../db/sequelize.ts';
import { Customer } from '../../db/models/index.ts';
import { notFound } from '../../http/errors.ts';

const iso = (column: string) => `to_json(${column}) #>> '{}'`;

const messageSql = `SELECT m.id, m.kind, m.channel, m.state, m.customer_id AS "customerId", c.name AS "customerName",
    m.job_id AS "jobId", j.number AS "jobNumber", m.reason, m.last_error AS "lastError", m.tries,
    ${iso('m.created_at')} AS "createdAt", ${iso('m.next_try_at')} AS "nextTryAt", ${iso('m.sent_at')} AS "sentAt",
    ${iso('m.bounced_at')} AS "bouncedAt", m.recipient, m.subject, m.body
  FROM messages m JOIN customers c ON c.id = m.customer_id JOIN jobs j ON j.id = m.job_id`;

const enquirySql = `SELECT e.id, e.customer_id AS "customerId", coalesce(c.name, '') AS "customerName", e.sender, e.body,
    ${iso('e.received_at')} AS "receivedAt", ${iso('e.settled_at')} AS "settledAt", coalesce(u.name, '') AS "settledBy"
  FROM enquiries e LEFT JOIN customers c ON c.id = e.customer_id LEFT JOIN users u ON u.id = e.settled_by`;

const states: Record<MessageView, string[]> = {
  open: ['waiting', 'sending'],
  sent: ['sent'],
  dead: ['dead'],
  dropped: ['dropped'],
};

/** What waits comes in the order it goes out, all else the newest first; enquiries that nobody answered, the oldest first. */
export async function listMessages({ show, limit }: { show: MessageView; limit: number }) {
  const order = show === 'open' ? 'm.next_try_at, m.id' : 'coalesce(m.sent_at, m.next_try_at) DESC, m.id DESC';
  const [messages, [counts], enquiries] = await Promise.all([
    select<MessageDto>(`${messageSql} WHERE m.state IN (:states) ORDER BY ${order} LIMIT :limit`, {
      ...{ states: states[show], limit },
    }),
    select<Record<MessageView, number>>(
      `SELECT count(*) FILTER (WHERE state IN ('waiting', 'sending')) AS open, count(*) FILTER (WHERE state = 'sent') AS sent,
              count(*) FILTER (WHERE state = 'dead') AS dead, count(*) FILTER (WHERE state = 'dropped') AS dropped FROM messages`,
    ),
    select<EnquiryDto>(`${enquirySql} WHERE e.settled_at IS NULL ORDER BY e.received_at, e.id LIMIT 200`),
  ]);
  return { messages, counts: counts ?? { open: 0, sent: 0, dead: 0, dropped: 0 }, enquiries };
}

/** @throws 404 */
export async function readCustomerMessages(id: string) {
  if (!(await Customer.findByPk(id))) throw notFound('That customer');
  const [messages, enquiries, stops, bounces] = await Promise.all([
    select<MessageDto>(`${messageSql} WHERE m.customer_id = :id ORDER BY m.created_at DESC, m.id DESC LIMIT 100`, {
      id,
    }),
    select<EnquiryDto>(`${enquirySql} WHERE e.customer_id = :id ORDER BY e.received_at DESC LIMIT 100`, { id }),
    select<{ what: MessageGroup | 'texts'; at: string }>(
      `SELECT what, ${iso('at')} AS at FROM message_stops WHERE customer_id = :id ORDER BY at`,
      { id },
    ),
    select<{ address: string; reason: string; at: string }>(
      `SELECT address, reason, ${iso('at')} AS at FROM mail_bounces WHERE customer_id = :id ORDER BY at`,
      { id },
    ),
  ]);
  const named = stops.map(({ what, at }) => ({
    what: what === 'texts' ? 'texts' : `mail with ${messageGroupNames[what]}`,
    at,
  }));
  return { messages, enquiries, stops: named, bounces };
}
