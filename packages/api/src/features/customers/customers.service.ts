import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import type { CustomerDto, customerBody } from '@driprail/shared/contracts/customers.contract';
import { audit } from '../../db/audit.ts';
import { Address, Customer, Vehicle } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { findCustomer } from './customers.queries.ts';

export type CustomerFields = z.input<typeof customerBody>;

export function createCustomer(ctx: Ctx, fields: CustomerFields, id = uuid()): Promise<CustomerDto> {
  return inTransaction((tx) => addCustomer(tx, ctx, fields, id));
}

/** The same inside a caller's transaction. */
export async function addCustomer(
  tx: Transaction,
  ctx: Ctx,
  { addresses, vehicles, ...fields }: CustomerFields,
  id = uuid(),
): Promise<CustomerDto> {
  await Customer.create({ id, ...fields }, { transaction: tx });
  await keepAddresses(tx, id, addresses);
  await keepVehicles(tx, id, vehicles);
  return saved(tx, ctx, id, 'added');
}

export function updateCustomer(
  ctx: Ctx,
  id: string,
  { addresses, vehicles, version, ...fields }: CustomerFields & { version: number },
): Promise<CustomerDto> {
  return inTransaction(async (tx) => {
    const customer = await Customer.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!customer) throw notFound('That customer');
    if (customer.version !== version)
      throw conflict('stale', `Somebody changed ${customer.name} meanwhile. Reload and try again.`);
    await customer.update({ ...fields, version: version + 1 }, { transaction: tx });
    await keepAddresses(tx, id, addresses);
    await keepVehicles(tx, id, vehicles);
    return saved(tx, ctx, id, 'changed');
  });
}

/** Those left out go out of sight, but stay on record: past jobs name them. */
async function keepAddresses(tx: Transaction, customerId: string, list: CustomerFields['addresses']): Promise<void> {
  const known = new Map(
    (await Address.findAll({ where: { customerId }, transaction: tx })).map((row) => [row.id, row]),
  );
  for (const [position, { id, ...fields }] of list.entries()) {
    const row = id ? known.get(id) : undefined;
    if (row) await row.update({ ...fields, position, isActive: true }, { transaction: tx });
    else await Address.create({ id: uuid(), customerId, ...fields, position }, { transaction: tx });
    if (row) known.delete(row.id);
  }
  for (const row of known.values()) await row.update({ isActive: false }, { transaction: tx });
}

async function keepVehicles(tx: Transaction, customerId: string, list: CustomerFields['vehicles']): Promise<void> {
  const known = new Map(
    (await Vehicle.findAll({ where: { customerId }, transaction: tx })).map((row) => [row.id, row]),
  );
  for (const [position, { id, ...fields }] of list.entries()) {
    const row = id ? known.get(id) : undefined;
    if (row) await row.update({ ...fields, position, isActive: true }, { transaction: tx });
    else await Vehicle.create({ id: uuid(), customerId, ...fields, position }, { transaction: tx });
    if (row) known.delete(row.id);
  }
  for (const row of known.values()) await row.update({ isActive: false }, { transaction: tx });
}

async function saved(tx: Transaction, { actor, now }: Ctx, id: string, action: string): Promise<CustomerDto> {
  await audit(tx, { userId: actor.userId, at: now() }, 'customer', id, action);
  const customer = await findCustomer(id, tx);
  if (!customer) throw notFound('That customer');
  hintAfterCommit(tx, ['desk'], 'customer', id, customer.version);
  return customer;
}
