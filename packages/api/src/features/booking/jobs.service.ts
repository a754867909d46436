import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import { visitMinutes } from '@driprail/shared/domain/board/crew-time';
import { centsText } from '@driprail/shared/domain/money/rounding';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { audit } from '../../db/audit.ts';
import { companyOf } from '../../db/company.ts';
import type { CompanySettings } from '../../db/models/index.ts';
import { Address, Invoice, Job, JobLine, Visit, VisitLine } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx, Doer } from '../../http/context.ts';
import { conflict, notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { wakeAfterCommit } from '../../realtime/wake.ts';
import { createVisit, lockVisit, setVisitLines } from '../board/index.ts';
import { queueMessage, queueWindow } from '../messages/index.ts';
import { refuseGoneCustomer } from './job-customer.service.ts';
import type { LineFields, PricedLine } from './job-lines.ts';
import { keepLines, priceLines } from './job-lines.ts';
import { readJob } from './jobs.queries.ts';

export interface JobFields {
  customerId: string;
  addressId: string;
  windowFrom: string | null;
  windowTo: string | null;
  notes: string;
  discountCents: number;
  discountReason: string;
  lines: LineFields[];
}

/** Orders a job; its first visit lands on Unplaced with the minutes of one person. */
export function createJob(ctx: Ctx, fields: JobFields, id = uuid()): Promise<JobDto> {
  return inTransaction((tx) => orderJob(tx, ctx, fields, id));
}

/** The same inside a caller's transaction. */
export async function orderJob(tx: Transaction, ctx: Doer, fields: JobFields, id = uuid()): Promise<JobDto> {
  await refuseGoneCustomer(tx, fields.customerId);
  const company = await companyOf(tx);
  const lines = await check(tx, fields, dayOf(fields.windowFrom ?? ctx.now().toISOString(), company.zone));
  refuseLargeDiscount(ctx, company, fields.discountCents, lines);
  const { lines: _asked, windowFrom, windowTo, ...columns } = fields;
  const windows = { windowFrom: date(windowFrom), windowTo: date(windowTo) };
  await Job.create(
    { id, ...columns, ...windows, createdBy: ctx.actor.userId, createdAt: ctx.now() },
    { transaction: tx },
  );
  const { ids } = await keepLines(tx, id, lines);
  const minutes = visitMinutes(
    lines.map((line) => line.minutes),
    1,
  );
  await createVisit(tx, { jobId: id, addressId: fields.addressId, minutes, lineIds: ids });
  if (windows.windowFrom) await queueWindow(tx, ctx.now(), { jobId: id, version: 0 });
  return saved(tx, ctx, id, 'booked');
}

/** Changes a job. New lines join the first visit that has not begun; what was finished stays. */
export function updateJob(
  ctx: Ctx,
  id: string,
  { version, ...fields }: JobFields & { version: number },
): Promise<JobDto> {
  return inTransaction(async (tx) => {
    const job = await lockJob(tx, id, version);
    const company = await companyOf(tx);
    const lines = await check(tx, fields, dayOf(fields.windowFrom ?? ctx.now().toISOString(), company.zone));
    const isPriceMoved = fields.discountCents !== job.discountCents;
    if (isPriceMoved) refuseLargeDiscount(ctx, company, fields.discountCents, lines);
    const { lines: _asked, windowFrom, windowTo, ...columns } = fields;
    const isWindowMoved = !isSameTime(job.windowFrom, windowFrom) || !isSameTime(job.windowTo, windowTo);
    await job.update(
      { ...columns, windowFrom: date(windowFrom), windowTo: date(windowTo), version: version + 1 },
      { transaction: tx },
    );
    const { newIds, goneIds } = await keepLines(tx, id, lines);
    if (isPriceMoved || newIds.length > 0 || goneIds.length > 0) await refuseBilled(tx, id);
    if (newIds.length > 0 || goneIds.length > 0) await giveToVisit(tx, job, newIds);
    if (isWindowMoved && windowFrom) await queueWindow(tx, ctx.now(), { jobId: id, version: version + 1 });
    return saved(tx, ctx, id, 'changed');
  });
}

/** An invoice stays as it went out: what is added is another job, what was too much is credited. @throws 422 */
async function refuseBilled(tx: Transaction, jobId: string): Promise<void> {
  const invoice = await Invoice.findOne({ where: { jobId, voidedAt: null }, transaction: tx });
  if (!invoice) return;
  throw unprocessable(
    'billed',
    `Invoice ${invoice.number} has gone out. Book what is added as another job, or credit what was too much.`,
  );
}

/** The owner sets how much the desk gives alone. @throws 422 at the discount */
function refuseLargeDiscount(ctx: Doer, company: CompanySettings, discountCents: number, lines: PricedLine[]): void {
  if (ctx.actor.role === 'owner' || discountCents === 0) return;
  const gross = lines.reduce((sum, line) => sum + line.priceCents, 0);
  const most = Math.floor((gross * company.deskDiscountPercent) / 100);
  if (discountCents <= most) return;
  const message = `At most ${centsText(most)} (${company.deskDiscountPercent} percent) without the owner.`;
  throw unprocessable('large_discount', message, { fields: { discountCents: message } });
}

async function giveToVisit(tx: Transaction, job: Job, newIds: string[]): Promise<void> {
  const visits = await Visit.findAll({ where: { jobId: job.id }, order: [['part', 'ASC']], transaction: tx });
  const open = visits.find((visit) =>
    ['unplaced', 'placed', 'on_the_way', 'on_site', 'working'].includes(visit.progress),
  );
  if (!open) {
    if (newIds.length > 0)
      await createVisit(tx, {
        jobId: job.id,
        addressId: job.addressId,
        minutes: await minutesOf(tx, newIds),
        lineIds: newIds,
      });
    return;
  }
  const links = await VisitLine.findAll({ where: { visitId: open.id }, transaction: tx });
  const lineIds = [...links.map((link) => link.jobLineId), ...newIds];
  await setVisitLines(tx, open.id, lineIds);
  // A placed visit keeps its planned span; the dispatcher sees and stretches it. An unplaced one takes its new length.
  const minutes = open.progress === 'unplaced' && lineIds.length > 0 ? await minutesOf(tx, lineIds) : open.minutes;
  await open.update({ minutes, planVersion: open.planVersion + 1, version: open.version + 1 }, { transaction: tx });
}

async function minutesOf(tx: Transaction, lineIds: string[]): Promise<number> {
  const lines = await JobLine.findAll({ where: { id: lineIds }, transaction: tx });
  return visitMinutes(
    lines.map((line) => line.minutes),
    1,
  );
}

/** The same again, unplaced, at the prices of the day. */
export async function copyJob(ctx: Ctx, id: string): Promise<JobDto> {
  const job = await readJob(id);
  if (!job) throw notFound('That job');
  const lines = job.lines.map(({ serviceId, vehicleId, sizeClass }) => ({ serviceId, vehicleId, sizeClass }));
  return createJob(ctx, {
    customerId: job.customerId,
    addressId: job.addressId,
    windowFrom: null,
    windowTo: null,
    notes: job.notes,
    discountCents: 0,
    discountReason: '',
    lines,
  });
}

/** Visits that have not been worked are called off with the job; what was done stays. */
export function callOffJob(ctx: Ctx, id: string, version: number, reason: string): Promise<JobDto> {
  return inTransaction((tx) => callOff(tx, ctx, id, version, reason));
}

/** The same inside a caller's transaction. */
export async function callOff(
  tx: Transaction,
  ctx: Doer,
  id: string,
  version: number,
  reason: string,
): Promise<JobDto> {
  const job = await lockJob(tx, id, version);
  const visits = await Visit.findAll({
    where: { jobId: id },
    order: [['id', 'ASC']],
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  });
  if (visits.some((visit) => visit.progress === 'working')) {
    throw unprocessable('working', 'A crew is at work on this job. They end it from the run sheet.');
  }
  const open = visits.filter((visit) => ['unplaced', 'placed', 'on_the_way', 'on_site'].includes(visit.progress));
  if (open.length === 0) throw conflict('ended', 'This job has ended already.');
  for (const visit of open) {
    await visit.update(
      {
        progress: 'called_off',
        progressSince: ctx.now(),
        reason,
        planVersion: visit.planVersion + 1,
        version: visit.version + 1,
      },
      { transaction: tx },
    );
  }
  await job.update({ calledOffReason: reason, version: version + 1 }, { transaction: tx });
  const eventKey = `job:${id}:v${version + 1}`;
  await queueMessage(tx, ctx.now(), {
    kind: 'called_off',
    jobId: id,
    ...(open[0] && { visitId: open[0].id }),
    eventKey,
  });
  return saved(tx, ctx, id, 'called off', { reason });
}

/** Another going-out to the job: a second day, or a second crew side by side at the same parking place. */
export function addVisit(
  ctx: Ctx,
  id: string,
  visit: { minutes: number; lineIds: string[]; besideVisitId: string | null },
): Promise<JobDto> {
  return inTransaction(async (tx) => {
    const job = await Job.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!job) throw notFound('That job');
    const own = new Set(
      (await JobLine.findAll({ where: { jobId: id, finishedAt: null }, transaction: tx })).map((line) => line.id),
    );
    if (visit.lineIds.some((lineId) => !own.has(lineId)))
      throw unprocessable('foreign_line', 'Choose lines of this job that are not finished.');
    const beside = visit.besideVisitId ? await lockVisit(tx, visit.besideVisitId) : null;
    if (visit.besideVisitId && !beside) throw notFound('The visit beside');
    await createVisit(tx, {
      jobId: id,
      addressId: job.addressId,
      minutes: visit.minutes,
      lineIds: visit.lineIds,
      ...(beside && { stopId: beside.stopId }),
    });
    return saved(tx, ctx, id, 'visit added');
  });
}

async function lockJob(tx: Transaction, id: string, version: number): Promise<Job> {
  const job = await Job.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
  if (!job) throw notFound('That job');
  if (job.version !== version) {
    const newer = await readJob(id, tx);
    throw conflict(
      'stale',
      `Somebody changed job ${job.number} meanwhile. Look at the newer one; what you entered is still here.`,
      newer && { ...newer, tips: [] },
    );
  }
  return job;
}

async function check(tx: Transaction, fields: JobFields, on: string): Promise<PricedLine[]> {
  const address = await Address.findByPk(fields.addressId, { transaction: tx });
  if (address?.customerId !== fields.customerId) {
    const message = 'Choose one of this customer’s addresses.';
    throw unprocessable('foreign_address', message, { fields: { addressId: message } });
  }
  const lines = await priceLines(tx, fields.lines, on, fields.customerId);
  const total = lines.reduce((sum, line) => sum + line.priceCents, 0);
  if (fields.discountCents > total) {
    const message = 'The discount is more than the job.';
    throw unprocessable('discount', message, { fields: { discountCents: message } });
  }
  return lines;
}

async function saved(
  tx: Transaction,
  { actor, now }: Doer,
  id: string,
  action: string,
  details: Record<string, unknown> = {},
): Promise<JobDto> {
  await audit(tx, { userId: actor.userId, at: now() }, 'job', id, action, details);
  const job = await readJob(id, tx);
  if (!job) throw notFound('That job');
  const personIds = [...new Set(job.visits.flatMap((visit) => visit.crew.map((p) => p.personId)))];
  hintAfterCommit(tx, ['desk', { personIds }], 'job', id, job.version);
  wakeAfterCommit(
    tx,
    personIds,
    job.visits.map((visit) => visit.from),
  );
  return job;
}

function isSameTime(was: Date | null, instant: string | null): boolean {
  return (was?.getTime() ?? null) === (instant ? Date.parse(instant) : null);
}

function date(instant: string | null): Date | null {
  return instant ? new Date(instant) : null;
}
