import type { Transaction } from 'sequelize';
import { Op } from 'sequelize';
import type { ErasurePreview } from '@driprail/shared/contracts/customers-data.contract';
import { tag } from '@driprail/shared/authz/ability';
import { folded } from '@driprail/shared/domain/customer/fold';
import { erasedName } from '@driprail/shared/domain/customer/erasure';
import { authorize } from '../../authz/authorize.ts';
import { audit } from '../../db/audit.ts';
import { todayOf } from '../../db/company.ts';
import { Address, Customer, CustomerApart, CustomerConsent, CustomerCrew, Vehicle } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, unprocessable } from '../../http/errors.ts';
import type { FileStore } from '../../integrations/storage/index.ts';
import { dropMailsTo } from '../../outbox/mails.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { eraseFromBills } from '../billing/index.ts';
import { eraseJobNotes } from '../booking/index.ts';
import { eraseSaidYes } from '../job-work/index.ts';
import { eraseMessages } from '../messages/index.ts';
import { eraseWalkRounds, removeErasedFiles } from '../walk-round/index.ts';
import { eraseFromAnswers } from './erase-answers.service.ts';
import { lockCustomer } from './customers.service.ts';

/** What goes and what stays, counted now. @throws 403, 404, 409 for one that was merged or erased */
export function previewErasure(ctx: Ctx, id: string): Promise<ErasurePreview> {
  return inTransaction(async (tx) => {
    authorize(ctx.ability, 'erase', tag('Customer', { id }));
    const { name, version } = await lockCustomer(tx, id);
    const on = await todayOf(ctx.now(), tx);
    const [counts] = await select<ErasurePreview['goes'] & ErasurePreview['stays']>(
      `SELECT (SELECT count(*) FROM addresses WHERE customer_id = :id)::integer AS addresses,
              (SELECT count(*) FROM vehicles WHERE customer_id = :id)::integer AS vehicles,
              (SELECT count(*) FROM jobs WHERE customer_id = :id)::integer AS jobs,
              (SELECT count(*) FROM invoices i JOIN jobs j ON j.id = i.job_id WHERE j.customer_id = :id)::integer AS invoices,
              (SELECT count(*) FROM photos p JOIN visits v ON v.id = p.visit_id JOIN jobs j ON j.id = v.job_id WHERE j.customer_id = :id)::integer AS photos`,
      { id },
      tx,
    );
    const { addresses = 0, vehicles = 0, photos = 0, jobs = 0, invoices = 0 } = counts ?? {};
    const hindrance = await openWork(tx, id);
    return {
      ...{ name, version, nameAfter: erasedName(on), on, hindrance },
      ...{ goes: { addresses, vehicles, photos }, stays: { jobs, invoices } },
    };
  });
}

/**
 * Takes away all that names a customer, also in records that were merged into this one. Jobs, times and money stay. A
 * booking that comes at the same moment waits here, and then finds the address gone.
 * @throws 403, 404, 409 when it was changed meanwhile, 422 while work is open or the name was typed otherwise
 */
export async function eraseCustomer(
  ctx: Ctx,
  store: FileStore,
  id: string,
  { version, name }: { version: number; name: string },
): Promise<void> {
  await inTransaction(async (tx) => {
    authorize(ctx.ability, 'erase', tag('Customer', { id }));
    const customer = await lockCustomer(tx, id);
    if (customer.version !== version)
      throw conflict('stale', `Somebody changed ${customer.name} meanwhile. Look at what goes again.`);
    if (folded(name).trim() !== folded(customer.name).trim()) {
      const message = `Type the name as it is written here: ${customer.name}.`;
      throw unprocessable('other_name', message, { fields: { name: message } });
    }
    const hindrance = await openWork(tx, id);
    if (hindrance) throw unprocessable('open_work', hindrance);
    const at = ctx.now();
    const nameAfter = erasedName(await todayOf(at, tx));
    const ids = (await Customer.findAll({ where: { [Op.or]: [{ id }, { mergedInto: id }] }, transaction: tx })).map(
      (one) => one.id,
    );
    await dropMails(tx, ids);
    await eraseMessages(tx, ids);
    await eraseFromAnswers(tx, ids);
    await eraseWalkRounds(tx, ids, at);
    await eraseFromBills(tx, ids, { name: nameAfter, at });
    await eraseSaidYes(tx, ids);
    await eraseJobNotes(tx, ids);
    await eraseRecord(tx, ids, { name: nameAfter, at });
    await audit(tx, { userId: ctx.actor.userId, at }, 'customer', id, 'erased');
    hintAfterCommit(tx, ['desk'], 'customer', id);
  });
  await removeErasedFiles(store);
}

async function dropMails(tx: Transaction, ids: string[]): Promise<void> {
  const known = await Customer.findAll({ where: { id: ids, email: { [Op.ne]: '' } }, transaction: tx });
  for (const { email } of known) await dropMailsTo(tx, email);
}

/** The town and the zip stay: the tax on what was paid goes by them. So does what kind of car it was. */
async function eraseRecord(tx: Transaction, ids: string[], { name, at }: { name: string; at: Date }): Promise<void> {
  const [where, own] = [{ id: ids }, { customerId: ids }];
  await CustomerConsent.destroy({ where: own, transaction: tx });
  await CustomerCrew.destroy({ where: own, transaction: tx });
  await CustomerApart.destroy({ where: { [Op.or]: [own, { otherId: ids }] }, transaction: tx });
  await Address.update(
    {
      ...{ label: '', line: 'Erased', area: '', lat: null, lng: null, gateCode: '', accessNotes: '', keyGoesBack: '' },
      ...{
        permitNumber: '',
        permitUntil: null,
        ownerConsentBy: '',
        ownerConsentOn: null,
        mustKnow: '',
        isActive: false,
      },
    },
    { where: own, transaction: tx },
  );
  await Vehicle.update(
    { plate: '', vin: '', paint: '', interior: '', notes: '', mustKnow: '', isActive: false },
    { where: own, transaction: tx },
  );
  await Customer.update(
    {
      name,
      phone: '',
      email: '',
      notes: '',
      mustKnow: '',
      tags: [],
      isScentFree: false,
      ringsFirst: false,
      erasedAt: at,
    },
    { where, transaction: tx },
  );
}

/** What is still to be done for a customer, in a sentence; null: nothing. */
async function openWork(tx: Transaction, id: string): Promise<string | null> {
  const open = await select<{ number: number }>(
    `SELECT DISTINCT j.number FROM jobs j JOIN visits v ON v.job_id = j.id
      WHERE j.customer_id = :id AND v.progress NOT IN ('done', 'part_done', 'called_off') ORDER BY 1`,
    { id },
    tx,
  );
  if (open.length === 0) return null;
  const jobs = `${open.length === 1 ? 'Job' : 'Jobs'} ${open.map(({ number }) => number).join(', ')}`;
  return `${jobs} ${open.length === 1 ? 'is' : 'are'} still to be done. Finish or call off what is open first, then erase.`;
}
