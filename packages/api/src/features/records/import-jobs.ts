import type { Transaction } from 'sequelize';
import type { SizeClass } from '@driprail/shared/contracts/fields';
import { exact } from '@driprail/shared/domain/money/exact';
import { toCents } from '@driprail/shared/domain/money/rounding';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import { companyOf } from '../../db/company.ts';
import { Address, Customer, Service, Vehicle } from '../../db/models/index.ts';
import type { Ctx } from '../../http/context.ts';
import { AppError } from '../../http/errors.ts';
import { orderJob } from '../booking/index.ts';
import type { JobFields } from '../booking/index.ts';
import type { JobRow } from './columns.ts';
import { grouped } from './csv.ts';
import type { Complaint, ReadRow } from './csv.ts';

interface Shop {
  customers: Customer[];
  addresses: Address[];
  vehicles: Vehicle[];
  services: Service[];
  zone: string;
}

/** Orders the jobs of a list, inside the caller's transaction; they land on Unplaced. */
export async function importJobs(
  tx: Transaction,
  ctx: Ctx,
  rows: ReadRow<JobRow>[],
): Promise<{ made: number; complaints: Complaint[] }> {
  const all = { transaction: tx };
  const active = { ...all, where: { isActive: true } };
  const shop = {
    customers: await Customer.findAll(all),
    addresses: await Address.findAll({ ...active, order: [['position', 'ASC']] }),
    vehicles: await Vehicle.findAll(active),
    services: await Service.findAll(active),
    zone: (await companyOf(tx)).zone,
  };
  const complaints: Complaint[] = [];
  let made = 0;
  for (const group of grouped(rows, ({ row }) => row.ref).values()) {
    const job = jobOf(group, shop, complaints);
    if (!job) continue;
    try {
      await orderJob(tx, ctx, job);
      made += 1;
    } catch (error) {
      if (!(error instanceof AppError)) throw error;
      complaints.push({ line: group[0]?.line ?? 0, reason: Object.values(error.fields ?? {})[0] ?? error.message });
    }
  }
  return { made, complaints };
}

function jobOf(group: ReadRow<JobRow>[], shop: Shop, complaints: Complaint[]): JobFields | null {
  const [head] = group;
  if (!head) return null;
  const before = complaints.length;
  const complain = (line: number, reason: string) => void complaints.push({ line, reason });
  const { row } = head;
  const named = shop.customers.filter((customer) => same(customer.name, row.customer));
  const customer = named.find(
    (one) => row.street === '' || shop.addresses.some((a) => a.customerId === one.id && same(a.line, row.street)),
  );
  if (!customer)
    complain(
      head.line,
      named.length === 0 ? `No customer is called ${row.customer}.` : `${row.customer} has no address ${row.street}.`,
    );
  if (customer && row.street === '' && named.length > 1)
    complain(head.line, `Several customers are called ${row.customer}: give the street.`);
  if (group.some(({ row: other }) => !same(other.customer, row.customer)))
    complain(head.line, `The rows of ${row.ref} name several customers.`);
  if ((row.from === '') !== (row.to === '') || (row.from !== '' && row.date === ''))
    complain(head.line, 'Give date, from and to of the window, or none.');
  if (row.from !== '' && row.to <= row.from) complain(head.line, 'The window must end after it starts.');
  const address = shop.addresses.find(
    (a) => a.customerId === customer?.id && (row.street === '' || same(a.line, row.street)),
  );
  const lines = group.map(({ line, row: each }) => {
    const service = shop.services.find((s) => same(s.name, each.service));
    if (!service) complain(line, `${each.service} is not on the service menu.`);
    const own = shop.vehicles.filter((v) => v.customerId === customer?.id);
    const vehicle =
      each.plate === ''
        ? own[0]
        : own.find((v) => same((v.plate ?? '').replace(/ /g, ''), each.plate.replace(/ /g, '')));
    if (each.plate !== '' && customer && !vehicle)
      complain(line, `${each.customer} has no vehicle with plate ${each.plate}.`);
    const sizeClass: SizeClass | undefined = each.size_class ?? vehicle?.sizeClass;
    if (!sizeClass) complain(line, 'Give a size class: no vehicle says it.');
    return {
      serviceId: service?.id ?? '',
      vehicleId: vehicle?.id ?? null,
      sizeClass: sizeClass ?? ('sedan' as const),
      ...(each.price !== '' && { priceCents: toCents(exact(each.price)) }),
    };
  });
  if (complaints.length > before || !customer || !address) return null;
  const at = (clock: string) => (clock === '' ? null : instantOf(row.date, clock, shop.zone));
  return {
    customerId: customer.id,
    addressId: address.id,
    windowFrom: at(row.from),
    windowTo: at(row.to),
    notes: group
      .map(({ row: each }) => each.notes)
      .filter(Boolean)
      .join('\n'),
    discountCents: 0,
    discountReason: '',
    lines,
  };
}

function same(a: string, b: string): boolean {
  return a.trim().toLowerCase() === b.trim().toLowerCase();
}
