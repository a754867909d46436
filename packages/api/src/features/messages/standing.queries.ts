import type { Transaction } from 'sequelize';
import type { MessageStanding } from '@driprail/shared/domain/messages/standing';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { Message } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { readVisits } from '../board/index.ts';

/** The visit a message is about: its own, else the next one, else the last. */
export async function readShownVisit(
  tx: Transaction,
  { jobId, visitId }: Pick<Message, 'jobId' | 'visitId'>,
): Promise<VisitDto | null> {
  const visits = await readVisits({ jobId }, tx);
  const own = visits.find(({ id }) => id === visitId);
  const open = visits.filter(({ progress }) => !['part_done', 'done', 'called_off'].includes(progress));
  const next = open.toSorted((a, b) => (a.from ?? '9').localeCompare(b.from ?? '9'))[0];
  const lastWorked = visits.findLast(({ progress }) => progress !== 'called_off');
  return own ?? next ?? lastWorked ?? visits.at(-1) ?? null;
}

/** What a message looks at just before it goes out. */
export async function readStanding(
  tx: Transaction,
  message: Message,
  visit: VisitDto | null,
): Promise<MessageStanding & { isUnsettled: boolean }> {
  const { kind, jobId, channel, causeId } = message;
  const [row] = await select<{
    told: MessageStanding['told'];
    isUndone: boolean;
    isUnsettled: boolean;
    hasFeedback: boolean;
  }>(
    `SELECT (SELECT json_build_object('windowFrom', m.told_from, 'windowTo', m.told_to) FROM messages m
              WHERE m.job_id = :jobId AND m.channel = :channel AND m.kind IN ('booked', 'moved') AND m.state = 'sent'
              ORDER BY m.sent_at DESC, m.id DESC LIMIT 1) AS told,
            EXISTS (SELECT 1 FROM visit_events e WHERE e.id = :causeId AND e.is_undone)
              OR EXISTS (SELECT 1 FROM invoices i WHERE i.id = :causeId AND i.voided_at IS NOT NULL)
              OR EXISTS (SELECT 1 FROM refunds r WHERE r.payment_id = :causeId AND r.kind = 'mistake')
              OR EXISTS (SELECT 1 FROM refunds r WHERE r.id = :causeId AND r.state = 'failed') AS "isUndone",
            EXISTS (SELECT 1 FROM refunds r WHERE r.id = :causeId AND r.state = 'asked') AS "isUnsettled",
            EXISTS (SELECT 1 FROM feedback f WHERE f.job_id = :jobId) AS "hasFeedback"`,
    { jobId, channel, causeId },
    tx,
  );
  if (!row) throw new Error('a select without a table answers a row');
  const endsWithWindow = kind === 'booked' || kind === 'moved' || kind === 'reminder';
  return {
    ...{ kind, ...row, progress: visit?.progress ?? null },
    ...{ windowFrom: visit?.windowFrom ?? null, windowTo: visit?.windowTo ?? null },
    lastMoment: message.lastMoment?.toISOString() ?? (endsWithWindow ? (visit?.windowTo ?? null) : null),
  };
}
