import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { folded } from '@driprail/shared/domain/customer/fold';
import { Address, Customer, Vehicle } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import type { Doer } from '../../http/context.ts';
import { addCustomer, saved } from './customers.service.ts';
import { nameOf } from './keep-parts.ts';

export interface Stranger {
  name: string;
  phone: string;
  /** Proved to be theirs. */
  email: string;
  address: CustomerBody['addresses'][number];
  vehicle: CustomerBody['vehicles'][number];
}

interface Found {
  customerId: string;
  addressId: string;
  vehicleId: string;
}

/**
 * The record of somebody who gave an e-mail address and a phone number: the one that has both, else a new one. What that
 * record knows already stays as it is; an address or a car that it does not know is added.
 */
export async function customerFor(tx: Transaction, doer: Doer, { address, vehicle, ...who }: Stranger): Promise<Found> {
  const known = await findByBoth(tx, who.email, who.phone);
  if (known) return addParts(tx, doer, known, { address, vehicle });
  const fields = { ...who, isCompany: false, notes: '', addresses: [address], vehicles: [vehicle] };
  const made = await addCustomer(tx, doer, fields);
  const [place, car] = [made.addresses[0], made.vehicles[0]];
  if (!place || !car) throw new Error('a new customer has the address and the car it was made with');
  return { customerId: made.id, addressId: place.id, vehicleId: car.id };
}

/** The last ten digits tell: with and without the country's code it is one phone. */
async function findByBoth(tx: Transaction, email: string, phone: string): Promise<string | null> {
  const digits = phone.replace(/\D/g, '').slice(-10);
  if (digits === '') return null;
  const [found] = await select<{ id: string }>(
    `SELECT id FROM customers WHERE lower(email) = :email AND right(regexp_replace(phone, '[^0-9]', '', 'g'), 10) = :digits
        AND merged_into IS NULL AND erased_at IS NULL ORDER BY created_at LIMIT 1`,
    { email: email.toLowerCase(), digits },
    tx,
  );
  return found?.id ?? null;
}

async function addParts(
  tx: Transaction,
  doer: Doer,
  customerId: string,
  { address, vehicle }: Pick<Stranger, 'address' | 'vehicle'>,
): Promise<Found> {
  const own = { where: { customerId, isActive: true }, transaction: tx };
  const places = await Address.findAll(own);
  const cars = await Vehicle.findAll(own);
  const isSame = (one: string, other: string) => folded(one).trim() === folded(other).trim();
  const place = places.find((one) => isSame(one.line, address.line) && isSame(one.city, address.city));
  const named = { ...vehicle, ...nameOf(vehicle) };
  const car = cars.find((one) => isSame(one.label, named.label) && one.sizeClass === vehicle.sizeClass);
  const [addressId, vehicleId] = [place?.id ?? uuid(), car?.id ?? uuid()];
  if (!place)
    await Address.create({ ...address, id: addressId, customerId, position: places.length }, { transaction: tx });
  if (!car) await Vehicle.create({ ...named, id: vehicleId, customerId, position: cars.length }, { transaction: tx });
  if (!place || !car) {
    await Customer.increment('version', { where: { id: customerId }, transaction: tx });
    await saved(tx, doer, customerId, 'changed');
  }
  return { customerId, addressId, vehicleId };
}
