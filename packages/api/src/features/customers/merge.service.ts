import type { Transaction } from 'sequelize';
import type { MergePreview } from '@driprail/shared/contracts/customers-merge.contract';
import { mergeConsents } from '@driprail/shared/domain/customer/consent';
import { folded, phoneDigits } from '@driprail/shared/domain/customer/fold';
import { planMerge } from '@driprail/shared/domain/customer/merge';
import { audit } from '../../db/audit.ts';
import { Customer, CustomerConsent, CustomerCrew } from '../../db/models/index.ts';
import { inTransaction, run, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { moveJobs } from '../booking/index.ts';
import { moveMessages } from '../messages/index.ts';
import { findCustomer } from './customers.queries.ts';
import { lockCustomer } from './customers.service.ts';
import { keepConsents } from './keep-parts.ts';

/** What would move, and what stands against it. @throws 404, 409 for a record that was merged or erased, 422 for one with itself */
export function previewOf(staysId: string, goesId: string): Promise<MergePreview> {
  return inTransaction(async (tx) => (await readBoth(tx, staysId, goesId)).preview);
}

/**
 * One record goes into another, whole or not at all. Consents come along only where they were given for the same number
 * or mailbox; a no of either stands.
 * @throws 404, 409 when either was changed meanwhile, 422 with what must be put right first
 */
export function mergeCustomers(
  ctx: Ctx,
  staysId: string,
  { goesId, version, goesVersion }: { goesId: string; version: number; goesVersion: number },
): Promise<{ id: string }> {
  return inTransaction(async (tx) => {
    const { stays, goes, plan, preview } = await readBoth(tx, staysId, goesId);
    if (stays.version !== version || goes.version !== goesVersion)
      throw conflict('stale', 'Somebody changed one of the two meanwhile. Look at what moves again.');
    if (plan.problems.length > 0) throw unprocessable('too_much', plan.problems.join(' '));
    const at = ctx.now();
    await moveParts(tx, staysId, goesId);
    await moveConsents(tx, ctx, stays, goes);
    await moveJobs(tx, goesId, staysId);
    await moveMessages(tx, goesId, staysId);
    await stays.update({ ...plan.fields, version: version + 1 }, { transaction: tx });
    await Customer.update({ mergedInto: staysId }, { where: { mergedInto: goesId }, transaction: tx });
    await goes.update({ mergedInto: staysId, mergedAt: at, version: goesVersion + 1 }, { transaction: tx });
    const by = { userId: ctx.actor.userId, at };
    await audit(tx, by, 'customer', staysId, 'took in another record', { record: goesId, ...preview.moves });
    await audit(tx, by, 'customer', goesId, 'merged', { into: staysId });
    for (const id of [staysId, goesId]) hintAfterCommit(tx, ['desk'], 'customer', id);
    return { id: staysId };
  });
}

async function readBoth(tx: Transaction, staysId: string, goesId: string) {
  if (staysId === goesId) throw unprocessable('same', 'Choose two different records.');
  // Always in the same order, so that two merges at once wait for each other and never both.
  const locked = new Map<string, Customer>();
  for (const id of [staysId, goesId].sort()) locked.set(id, await lockCustomer(tx, id));
  const [stays, goes] = [locked.get(staysId), locked.get(goesId)];
  if (!stays || !goes) throw notFound('That customer');
  const plan = planMerge(fieldsOf(stays), fieldsOf(goes));
  const [moves] = await select<MergePreview['moves']>(
    `SELECT (SELECT count(*) FROM addresses WHERE customer_id = :goesId AND is_active)::integer AS addresses,
            (SELECT count(*) FROM vehicles WHERE customer_id = :goesId AND is_active)::integer AS vehicles,
            (SELECT count(*) FROM jobs WHERE customer_id = :goesId)::integer AS jobs,
            (SELECT count(*) FROM photos p JOIN visits v ON v.id = p.visit_id JOIN jobs j ON j.id = v.job_id
              WHERE j.customer_id = :goesId AND p.stored_at IS NOT NULL)::integer AS photos`,
    { goesId },
    tx,
  );
  if (!moves) throw notFound('That customer');
  const named = ({ id, name, version }: Customer) => ({ id, name, version });
  const { words, problems } = plan;
  return { stays, goes, plan, preview: { stays: named(stays), goes: named(goes), moves, words, problems } };
}

function fieldsOf({ name, isCompany, phone, email, notes, isScentFree, ringsFirst, mustKnow, tags }: Customer) {
  return { name, isCompany, phone, email, notes, isScentFree, ringsFirst, mustKnow, tags };
}

/** Addresses, vehicles and people come after those that are there. */
async function moveParts(tx: Transaction, staysId: string, goesId: string): Promise<void> {
  for (const table of ['addresses', 'vehicles'])
    await run(
      `UPDATE ${table} SET customer_id = :staysId,
              position = position + 1 + coalesce((SELECT max(position) FROM ${table} WHERE customer_id = :staysId), -1)
        WHERE customer_id = :goesId`,
      { staysId, goesId },
      tx,
    );
  const own = await CustomerCrew.findAll({ where: { customerId: staysId }, transaction: tx });
  const theirs = await CustomerCrew.findAll({ where: { customerId: goesId }, order: ['position'], transaction: tx });
  const fresh = theirs.filter(({ personId }) => !own.some((row) => row.personId === personId));
  await CustomerCrew.destroy({ where: { customerId: goesId }, transaction: tx });
  await CustomerCrew.bulkCreate(
    fresh.map(({ personId }, index) => ({ customerId: staysId, personId, position: own.length + index })),
    { transaction: tx },
  );
}

async function moveConsents(tx: Transaction, ctx: Ctx, stays: Customer, goes: Customer): Promise<void> {
  const [own, theirs] = await Promise.all([findCustomer(stays.id, tx), findCustomer(goes.id, tx)]);
  const isSame = {
    text: phoneDigits(stays.phone) === phoneDigits(goes.phone) || stays.phone === '',
    mail: folded(stays.email) === folded(goes.email) || stays.email === '',
  };
  const merged = mergeConsents(own?.consents ?? [], theirs?.consents ?? [], isSame);
  for (const { channel } of merged)
    await CustomerConsent.update(
      { customerId: stays.id },
      { where: { customerId: goes.id, channel }, transaction: tx },
    );
  // Of the answers that lie together now, the one that counts is the last.
  await keepConsents(tx, ctx, stays.id, merged);
}
