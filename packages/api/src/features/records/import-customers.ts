import type { Transaction } from 'sequelize';
import { Customer } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { addCustomer } from '../customers/index.ts';
import type { CustomerFields } from '../customers/index.ts';
import type { CustomerRow } from './columns.ts';
import { grouped } from './csv.ts';
import type { Complaint, ReadRow } from './csv.ts';

/** Writes the customers of a list, inside the caller's transaction. @returns how many, and what stands against it */
export async function importCustomers(
  tx: Transaction,
  ctx: Ctx,
  rows: ReadRow<CustomerRow>[],
): Promise<{ made: number; complaints: Complaint[] }> {
  const known = new Set(
    (await Customer.findAll({ transaction: tx })).map((customer) => keyOf(customer.name, customer.phone ?? '')),
  );
  const complaints = rows.flatMap(({ line, row }): Complaint[] => [
    ...(known.has(keyOf(row.name, row.phone))
      ? [{ line, reason: `${row.name} with this phone is on record already.` }]
      : []),
    ...(row.vehicle !== '' && row.size_class === null
      ? [{ line, reason: 'size_class: a vehicle needs a size class.' }]
      : []),
  ]);
  if (complaints.length > 0) return { made: 0, complaints };
  const groups = grouped(rows, ({ row }) => keyOf(row.name, row.phone));
  for (const group of groups.values()) await addCustomer(tx, ctx, customerOf(group.map(({ row }) => row)));
  return { made: groups.size, complaints: [] };
}

function keyOf(name: string, phone: string): string {
  return `${name.trim().toLowerCase()}|${phone.replace(/\D/g, '')}`;
}

function customerOf(rows: CustomerRow[]): CustomerFields {
  const [head] = rows;
  if (!head) throw new Error('a customer has a row');
  const addresses = new Map(rows.map((row) => [row.street.toLowerCase(), row]));
  return {
    name: head.name,
    isCompany: rows.some((row) => row.company),
    phone: head.phone,
    email: rows.find((row) => row.email !== '')?.email ?? '',
    notes: [...new Set(rows.map((row) => row.notes).filter(Boolean))].join('\n'),
    addresses: [...addresses.values()].map((row) => ({
      line: row.street,
      city: row.city,
      postcode: row.zip,
      area: row.area,
      lat: row.lat,
      lng: row.lng,
      gateCode: row.gate_code,
      accessNotes: row.access_notes,
      hasWater: row.spigot,
      hasPower: row.outlet,
    })),
    vehicles: rows.flatMap((row) =>
      row.vehicle === '' || row.size_class === null
        ? []
        : [{ label: row.vehicle, color: row.color, plate: row.plate, sizeClass: row.size_class, notes: '' }],
    ),
  };
}
