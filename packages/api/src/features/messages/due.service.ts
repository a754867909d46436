import type { Transaction } from 'sequelize';
import { addDays, clockOf, dayOf } from '@driprail/shared/domain/time/zone';
import { dayBounds } from '@driprail/shared/domain/time/zone-instants';
import { companyOf } from '../../db/company.ts';
import { MessageSettings } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import { queueMessage } from './queue-message.service.ts';

const MOST = 200;
/** Work that ended longer ago than this after its moment is not asked about any more. */
const ASKED_WITHIN_HOURS = 24;

/** What no press causes but the time: reminders the day before, and the question how it went. Queued once each. */
export async function queueTimely(now: Date): Promise<void> {
  await inTransaction(async (tx) => {
    const settings = await MessageSettings.findByPk(1, { transaction: tx });
    if (!settings || !(await select('SELECT 1 FROM company_settings', {}, tx))[0]) return;
    await queueReminders(tx, settings, now);
    await queueQuestions(tx, settings, now);
  });
}

async function queueReminders(tx: Transaction, settings: MessageSettings, now: Date): Promise<void> {
  const { zone } = await companyOf(tx);
  if (clockOf(now.toISOString(), zone) < settings.reminderAt) return;
  const tomorrow = addDays(dayOf(now.toISOString(), zone), 1);
  const jobs = await select<{ id: string }>(
    `SELECT j.id FROM jobs j WHERE j.window_from >= :startsAt AND j.window_from < :endsAt
        AND EXISTS (SELECT 1 FROM visits v WHERE v.job_id = j.id AND v.progress IN ('unplaced', 'placed'))
        AND NOT EXISTS (SELECT 1 FROM messages m WHERE m.kind = 'reminder' AND m.event_key = 'job:' || j.id || ':' || :tomorrow)
      ORDER BY j.number LIMIT ${MOST}`,
    { ...dayBounds(tomorrow, zone), tomorrow },
    tx,
  );
  for (const { id: jobId } of jobs)
    await queueMessage(tx, now, { kind: 'reminder', jobId, eventKey: `job:${jobId}:${tomorrow}` });
}

async function queueQuestions(tx: Transaction, { feedbackHours }: MessageSettings, now: Date): Promise<void> {
  const until = new Date(now.getTime() - feedbackHours * 3_600_000);
  const jobs = await select<{ id: string }>(
    `SELECT j.id FROM jobs j JOIN visits v ON v.job_id = j.id
      WHERE v.progress IN ('done', 'part_done') AND v.progress_since > :from
        AND NOT EXISTS (SELECT 1 FROM visits o WHERE o.job_id = j.id AND o.progress NOT IN ('done', 'part_done', 'called_off'))
        AND NOT EXISTS (SELECT 1 FROM feedback f WHERE f.job_id = j.id)
        AND NOT EXISTS (SELECT 1 FROM messages m WHERE m.kind = 'feedback' AND m.event_key = 'job:' || j.id)
      GROUP BY j.id, j.number HAVING max(v.progress_since) <= :until ORDER BY j.number LIMIT ${MOST}`,
    { from: new Date(until.getTime() - ASKED_WITHIN_HOURS * 3_600_000), until },
    tx,
  );
  for (const { id: jobId } of jobs) await queueMessage(tx, now, { kind: 'feedback', jobId, eventKey: `job:${jobId}` });
}
