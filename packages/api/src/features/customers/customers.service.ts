import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { audit } from '../../db/audit.ts';
import { Customer } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx, Doer } from '../../http/context.ts';
import { conflict, notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { findCustomer } from './customers.queries.ts';
import { keepAddresses, keepConsents, keepPreferredCrew, keepVehicles } from './keep-parts.ts';

export type CustomerFields = CustomerBody;

export function createCustomer(ctx: Ctx, fields: CustomerFields, id = uuid()): Promise<CustomerDto> {
  return inTransaction((tx) => addCustomer(tx, ctx, fields, id));
}

/** The same inside a caller's transaction. */
export async function addCustomer(
  tx: Transaction,
  ctx: Doer,
  { addresses, vehicles, preferredCrew, consents, ...fields }: CustomerFields,
  id = uuid(),
): Promise<CustomerDto> {
  await Customer.create({ id, ...fields }, { transaction: tx });
  await keepParts(tx, ctx, id, { addresses, vehicles, preferredCrew, consents });
  return saved(tx, ctx, id, 'added');
}

/** @throws 404, 409 when it was changed, merged or erased meanwhile */
export function updateCustomer(
  ctx: Ctx,
  id: string,
  { addresses, vehicles, preferredCrew, consents, version, ...fields }: CustomerFields & { version: number },
): Promise<CustomerDto> {
  return inTransaction(async (tx) => {
    const customer = await lockCustomer(tx, id);
    if (customer.version !== version)
      throw conflict('stale', `Somebody changed ${customer.name} meanwhile. Reload and try again.`);
    await customer.update({ ...fields, version: version + 1 }, { transaction: tx });
    await keepParts(tx, ctx, id, { addresses, vehicles, preferredCrew, consents });
    return saved(tx, ctx, id, 'changed');
  });
}

/** A record that still lives, locked for a change. @throws 404, 409 for one that was merged or erased */
export async function lockCustomer(tx: Transaction, id: string): Promise<Customer> {
  const customer = await Customer.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
  if (!customer) throw notFound('That customer');
  if (customer.mergedInto) throw conflict('merged', `${customer.name} was merged into another record. Open that one.`);
  if (customer.erasedAt) throw conflict('erased', 'That customer was erased. What is left can’t be changed.');
  return customer;
}

type Parts = Pick<CustomerFields, 'addresses' | 'vehicles' | 'preferredCrew' | 'consents'>;

async function keepParts(
  tx: Transaction,
  ctx: Doer,
  id: string,
  { addresses, vehicles, preferredCrew, consents }: Parts,
): Promise<void> {
  await keepAddresses(tx, id, addresses);
  await keepVehicles(tx, id, vehicles);
  if (preferredCrew) await keepPreferredCrew(tx, id, preferredCrew);
  if (consents) await keepConsents(tx, ctx, id, consents);
}

export async function saved(tx: Transaction, { actor, now }: Doer, id: string, action: string): Promise<CustomerDto> {
  await audit(tx, { userId: actor.userId, at: now() }, 'customer', id, action);
  const customer = await findCustomer(id, tx);
  if (!customer) throw notFound('That customer');
  hintAfterCommit(tx, ['desk'], 'customer', id, customer.version);
  return customer;
}
