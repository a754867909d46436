import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import type { consentBody, addressBody, vehicleBody } from '@driprail/shared/contracts/customers-record.contract';
import { nameFromLabel, vehicleLabel } from '@driprail/shared/domain/vehicle/vehicle-name';
import { readVin } from '@driprail/shared/domain/vehicle/vin';
import { todayOf } from '../../db/company.ts';
import { Address, CustomerConsent, CustomerCrew, Vehicle } from '../../db/models/index.ts';
import type { Doer } from '../../http/context.ts';
import { unprocessable } from '../../http/errors.ts';

/** Addresses left out go out of sight, but stay on record: past jobs name them. */
export async function keepAddresses(
  tx: Transaction,
  customerId: string,
  list: z.input<typeof addressBody>[],
): Promise<void> {
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

/** The same for vehicles: one that was sold stays for its photos. */
export async function keepVehicles(
  tx: Transaction,
  customerId: string,
  list: z.input<typeof vehicleBody>[],
): Promise<void> {
  const known = new Map(
    (await Vehicle.findAll({ where: { customerId }, transaction: tx })).map((row) => [row.id, row]),
  );
  for (const [position, { id, ...body }] of list.entries()) {
    const fields = { ...body, ...nameOf(body), ...(body.vin !== undefined && { vin: vinOf(body.vin) }) };
    const row = id ? known.get(id) : undefined;
    if (row) await row.update({ ...fields, position, isActive: true }, { transaction: tx });
    else await Vehicle.create({ id: uuid(), customerId, ...fields, position }, { transaction: tx });
    if (row) known.delete(row.id);
  }
  for (const row of known.values()) await row.update({ isActive: false }, { transaction: tx });
}

/** Year, make and model where they are given, else what was typed in one piece. */
export function nameOf({ label = '', year = null, make = '', model = '' }: z.input<typeof vehicleBody>) {
  const name = make || model ? { year, make, model } : nameFromLabel(label);
  return { ...name, label: vehicleLabel(name) };
}

function vinOf(text: string): string {
  const reading = readVin(text);
  return reading.kind === 'empty' ? '' : reading.normalised;
}

/** @throws 422 at the field when somebody is not of this company */
export async function keepPreferredCrew(tx: Transaction, customerId: string, personIds: string[]): Promise<void> {
  await CustomerCrew.destroy({ where: { customerId }, transaction: tx });
  const rows = [...new Set(personIds)].map((personId, position) => ({ customerId, personId, position }));
  try {
    await CustomerCrew.bulkCreate(rows, { transaction: tx });
  } catch (error) {
    if ((error as { parent?: { code?: string } }).parent?.code !== '23503') throw error;
    const message = 'Choose people of this company.';
    throw unprocessable('no_such_person', message, { fields: { preferredCrew: message } });
  }
}

/** Adds each answer that differs from the latest. @throws 422 at the field for a day to come */
export async function keepConsents(
  tx: Transaction,
  { actor, now }: Doer,
  customerId: string,
  list: z.input<typeof consentBody>[],
): Promise<void> {
  const today = await todayOf(now(), tx);
  for (const [index, { channel, isGiven, on, how }] of list.entries()) {
    if (on > today) {
      const message = 'Give the day of the answer, today at the latest.';
      throw unprocessable('day_to_come', message, { fields: { [`consents.${index}.on`]: message } });
    }
    const latest = await CustomerConsent.findOne({
      where: { customerId, channel },
      order: [
        ['recordedAt', 'DESC'],
        ['id', 'DESC'],
      ],
      transaction: tx,
    });
    if (latest && latest.isGiven === isGiven && latest.givenOn === on && latest.how === how) continue;
    await CustomerConsent.create(
      { id: uuid(), customerId, channel, isGiven, givenOn: on, how, userId: actor.userId, recordedAt: now() },
      { transaction: tx },
    );
  }
}
