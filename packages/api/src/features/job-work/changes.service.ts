import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import type { VisitWorkDto, answerJobChange, postJobChange } from '@driprail/shared/contracts/job-work.contract';
import type { Judged } from '@driprail/shared/domain/job-work/judge-change';
import { judgeChange } from '@driprail/shared/domain/job-work/judge-change';
import { stamp } from '@driprail/shared/domain/time/device';
import type { StampedTimes } from '@driprail/shared/domain/time/device';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { audit } from '../../db/audit.ts';
import { companyOf } from '../../db/company.ts';
import { stampOf } from '../../db/models/columns.ts';
import type { Visit } from '../../db/models/index.ts';
import { JobChange } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { AppError, conflict, notFound } from '../../http/errors.ts';
import type { Outcome } from '../../http/once.ts';
import { takeOnce } from '../../http/once.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { authorizeVisit, lockVisit } from '../board/index.ts';
import { agreedPrice } from './agreed-price.ts';
import { applyChange } from './apply-change.ts';
import { surchargesOfDay } from '../service-menu/index.ts';
import { offersOn, readVisitWork } from './job-work.queries.ts';
import { changeFactsOf, toVisitWork } from './visit-work.presenter.ts';
import type { WorkRow } from './work-rows.queries.ts';
import { readWorkRows } from './work-rows.queries.ts';

type ChangePress = z.infer<(typeof postJobChange)['body']>;
type Answer = z.infer<(typeof answerJobChange)['body']>;

/**
 * Changes the job at the car, after the customer's yes, taken once. It is done at once when nothing stands in its way;
 * else the board is asked, or it is kept as a quote. What was quoted stays in the row, beside what it became.
 * @throws 404 for another crew's visit, 403 by row, 409 when the visit or the line has moved on
 */
export async function changeJob(
  ctx: Ctx,
  visitId: string,
  press: ChangePress,
): Promise<{ work: VisitWorkDto; changeId: string; isRepeat: boolean }> {
  const { zone } = await companyOf();
  const taken = await takeOnce<{ changeId: string }>(ctx, press.key, { visitId, ...press }, async (tx) => {
    const visit = await lockVisit(tx, visitId);
    const [row] = await readWorkRows({ visitId }, tx);
    if (!visit || !row) throw notFound('That visit');
    const times = stamp(press.deviceAt, press.offsetMs, ctx.now());
    authorizeVisit(ctx, 'mark', row.visit, zone, times.occurredAt);
    return perform(tx, ctx, visit, row, press, times);
  });
  return { work: await readVisitWork(ctx, visitId), changeId: taken.answer.changeId, isRepeat: taken.isRepeat };
}

async function perform(
  tx: Transaction,
  ctx: Ctx,
  visit: Visit,
  row: WorkRow,
  press: ChangePress,
  times: StampedTimes,
): Promise<Outcome<{ changeId: string }>> {
  const clash = (message: string) => ({ refused: new AppError(409, 'clash', message) });
  if (visit.progress !== 'on_site' && visit.progress !== 'working')
    return clash('A job is changed while the crew is at the car. Call dispatch.');
  const { zone, clock } = await companyOf(tx);
  const work = toVisitWork(row, { now: ctx.now(), zone, isDesk: false });
  const day = dayOf(times.occurredAt, zone);
  const [offers, surcharges] = [await offersOn(day, tx), await surchargesOfDay(day, tx)];
  const judgement = judgeChange(
    changeFactsOf(work, { offers, surcharges, zone, clock }),
    press.change,
    times.occurredAt,
  );
  if (!judgement.ok) return clash(judgement.message);
  const judged = agreedPrice(judgement.change, press.shownCents);
  const state = press.isQuote ? 'quote' : judged.hindrances.length > 0 ? 'asked' : 'done';
  const change = await record(tx, ctx, visit, judged, { press, times, state });
  if (state === 'done') await applyChange(tx, visit, change);
  await tell(tx, ctx, change, row, state === 'done' ? 'changed at the car' : `change at the car, ${state}`);
  return { answer: { changeId: change.id } };
}

function record(
  tx: Transaction,
  { actor }: Ctx,
  visit: Visit,
  judged: Judged,
  { press, times, state }: { press: ChangePress; times: StampedTimes; state: JobChange['state'] },
): Promise<JobChange> {
  const { before, after, words, priceDifferenceCents, minutesDifference, hindrances, finishAfter } = judged;
  return JobChange.create(
    {
      ...{ id: uuid(), visitId: visit.id, jobId: visit.jobId, kind: press.change.kind, state, words },
      ...{ reason: press.reason, before, after, priceDifferenceCents, minutesDifference, hindrances },
      finishAt: new Date(finishAfter),
      isBoardNotAsked: press.isBoardNotAsked && hindrances.length > 0,
      ...{ saidYesBy: press.saidYes.by, saidYesAt: new Date(press.saidYes.at) },
      ...{ userId: actor.userId, personId: actor.personId },
      ...stampOf(times),
    },
    { transaction: tx },
  );
}

/**
 * The desk accepts what a crew asks for, or declines it; then it stays as a quote.
 * @throws 404, 403 by row, 409 when it was answered already or the job has moved on
 */
export function answerChange(ctx: Ctx, id: string, { isAccepted, note }: Answer): Promise<void> {
  return inTransaction(async (tx) => {
    const change = await JobChange.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!change) throw notFound('That change');
    if (change.state !== 'asked') throw conflict('answered', 'Somebody answered this already.');
    const visit = await lockVisit(tx, change.visitId);
    const [row] = await readWorkRows({ visitId: change.visitId }, tx);
    if (!visit || !row) throw notFound('That visit');
    const { zone } = await companyOf(tx);
    authorizeVisit(ctx, 'mark', row.visit, zone);
    if (isAccepted) await applyChange(tx, visit, change);
    const state = isAccepted ? 'accepted' : 'declined';
    const answered = { state, answer: note, answeredBy: ctx.actor.userId, answeredAt: ctx.now() } as const;
    await change.update(answered, { transaction: tx });
    await tell(tx, ctx, change, row, `change at the car, ${state}`);
  });
}

async function tell(tx: Transaction, ctx: Ctx, change: JobChange, row: WorkRow, action: string): Promise<void> {
  const { words, before, after, priceDifferenceCents, jobId, id: changeId } = change;
  const details = { changeId, words, priceDifferenceCents, before, after };
  await audit(tx, { userId: ctx.actor.userId, at: ctx.now() }, 'job', jobId, action, details);
  const personIds = row.visit.crew.map((person) => person.personId);
  hintAfterCommit(tx, ['desk', { personIds }], 'job', jobId);
}
