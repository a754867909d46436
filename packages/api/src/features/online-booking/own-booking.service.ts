import type { Transaction } from 'sequelize';
import type { OwnBookingDto } from '@driprail/shared/contracts/online-booking.contract';
import { addMinutes, isBefore } from '@driprail/shared/domain/time/zone';
import { centsText } from '@driprail/shared/domain/money/rounding';
import { inTransaction, run, select } from '../../db/sequelize.ts';
import { conflict, unprocessable } from '../../http/errors.ts';
import { callOff } from '../booking/index.ts';
import { online } from './book-held.service.ts';

interface OwnRow {
  version: number;
  windowFrom: string | null;
  isOpen: boolean;
  policy: OwnBookingDto['policy'];
}

/** What a customer may do with a job by its link, by the terms that were accepted when it was booked. */
export async function readOwnBooking(jobId: string, now: Date, tx?: Transaction): Promise<OwnBookingDto> {
  return toDto(await readRow(jobId, tx), now);
}

/**
 * Calls a job off for its customer. A fee is written on the job for the desk to decide, and charged by nobody.
 * @throws 409 when the fee is not the one that was shown, 422 when the crew is on its way or it was not booked online
 */
export function callOffOwn(jobId: string, feeCents: number, now: Date): Promise<OwnBookingDto> {
  return inTransaction(async (tx) => {
    await run('SELECT 1 FROM jobs WHERE id = :jobId FOR UPDATE', { jobId }, tx);
    const row = await readRow(jobId, tx);
    const own = toDto(row, now);
    if (!row || !own.mayChange)
      throw unprocessable('not_by_link', 'This job can’t be called off here any more. Call us and we sort it out.');
    if (own.feeCents > feeCents)
      throw conflict(
        'fee_changed',
        `It is no longer free: calling off now costs ${centsText(own.feeCents)}. Press again if you still want to.`,
      );
    const fee = own.feeCents > 0 ? ` Late: a fee of ${centsText(own.feeCents)} is proposed by the accepted terms.` : '';
    await callOff(tx, online(now), jobId, row.version, `Called off by the customer by the link.${fee}`);
    await run(
      'UPDATE online_bookings SET proposed_fee_cents = :fee WHERE job_id = :jobId',
      { jobId, fee: own.feeCents },
      tx,
    );
    return readOwnBooking(jobId, now, tx);
  });
}

/** Nothing has happened yet but the plan: nobody is on the way, there or done. */
async function readRow(jobId: string, tx?: Transaction): Promise<OwnRow | null> {
  const [row] = await select<OwnRow>(
    `SELECT j.version, to_json(j.window_from) #>> '{}' AS "windowFrom",
            (SELECT coalesce(bool_and(v.progress IN ('unplaced', 'placed')), false) FROM visits v
              WHERE v.job_id = j.id AND v.progress <> 'called_off') AS "isOpen",
            json_build_object('version', p.version, 'words', p.words, 'freeUntilHours', p.free_until_hours, 'lateFeeCents', p.late_fee_cents) AS policy
       FROM online_bookings b JOIN jobs j ON j.id = b.job_id JOIN online_policies p ON p.version = b.policy_version
      WHERE j.id = :jobId`,
    { jobId },
    tx,
  );
  return row ?? null;
}

function toDto(row: OwnRow | null, now: Date): OwnBookingDto {
  if (!row?.policy || !row.windowFrom) return { mayChange: false, freeUntil: null, feeCents: 0, policy: null };
  const freeUntil = addMinutes(row.windowFrom, -row.policy.freeUntilHours * 60);
  const isFree = !isBefore(freeUntil, now.toISOString());
  return {
    ...{ mayChange: row.isOpen, freeUntil, policy: row.policy },
    feeCents: row.isOpen && !isFree ? row.policy.lateFeeCents : 0,
  };
}
