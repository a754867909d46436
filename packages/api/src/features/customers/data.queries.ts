import { customerData } from '@driprail/shared/contracts/customers-data.contract';
import type { CustomerData } from '@driprail/shared/contracts/customers-data.contract';
import { companyOf } from '../../db/company.ts';
import { select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound } from '../../http/errors.ts';
import { findCustomer, leadingTo } from './customers.queries.ts';
import { customerSince } from './history.queries.ts';
import { addressJson, vehicleJson } from './part-json.sql.ts';

const iso = (expression: string) => `to_json(${expression}) #>> '{}'`;

const list = (select: string) => `coalesce((SELECT json_agg(x) FROM (${select}) x), '[]')`;

const sql = `SELECT
  ${list('SELECT name FROM customers WHERE merged_into = :id ORDER BY merged_at')} AS "otherNames",
  coalesce((SELECT json_agg((${addressJson})::jsonb || jsonb_build_object('isKept', a.is_active) ORDER BY a.position, a.id)
    FROM addresses a WHERE a.customer_id = :id), '[]') AS addresses,
  coalesce((SELECT json_agg((${vehicleJson})::jsonb || jsonb_build_object('isKept', v.is_active) ORDER BY v.position, v.id)
    FROM vehicles v WHERE v.customer_id = :id), '[]') AS vehicles,
  ${list(`SELECT channel, is_given AS "isGiven", given_on AS "on", how, ${iso('recorded_at')} AS "recordedAt"
    FROM customer_consents WHERE customer_id = :id ORDER BY recorded_at DESC, id DESC`)} AS consents,
  ${list(`SELECT j.number, ${iso('j.created_at')} AS "bookedAt", j.notes, concat_ws(', ', a.line, nullif(a.city, '')) AS place,
      j.discount_cents AS "discountCents",
      ${list(`SELECT s.name AS service, coalesce(concat_ws(' ', nullif(w.color, ''), w.label), '') AS vehicle, l.price_cents AS "priceCents"
        FROM job_lines l JOIN services s ON s.id = l.service_id LEFT JOIN vehicles w ON w.id = l.vehicle_id
       WHERE l.job_id = j.id ORDER BY l.position`)} AS lines,
      ${list(`SELECT ${iso('lower(v.planned)')} AS "from", ${iso('upper(v.planned)')} AS "to", v.progress
        FROM visits v WHERE v.job_id = j.id ORDER BY v.part`)} AS visits,
      ${list(`SELECT i.number, ${iso('i.issued_at')} AS "issuedAt", i.total_cents AS "totalCents"
        FROM invoices i WHERE i.job_id = j.id ORDER BY i.number`)} AS invoices,
      ${list(`SELECT ${iso('p.received_at')} AS at, p.method, p.amount_cents AS "amountCents"
        FROM payments p WHERE p.job_id = j.id ORDER BY p.received_at`)} AS payments,
      ${list(`SELECT ${iso('t.received_at')} AS at, t.amount_cents AS "amountCents"
        FROM tips t WHERE t.job_id = j.id ORDER BY t.received_at`)} AS tips,
      ${list(`SELECT f.id, ${iso('f.occurred_at')} AS "takenAt", f.view, f.moment
        FROM photos f JOIN visits v ON v.id = f.visit_id WHERE v.job_id = j.id AND f.stored_at IS NOT NULL ORDER BY f.occurred_at`)} AS photos
    FROM jobs j JOIN addresses a ON a.id = j.address_id WHERE j.customer_id = :id ORDER BY j.number`)} AS jobs`;

/** All that is kept about one customer. @throws 404 */
export async function readCustomerData({ now }: Ctx, asked: string): Promise<CustomerData> {
  const found = await leadingTo(asked);
  const customer = found && (await findCustomer(found.id));
  if (!customer) throw notFound('That customer');
  const [[row], since, { name }] = await Promise.all([
    select<Omit<CustomerData, 'otherNames'> & { otherNames: { name: string }[] }>(sql, { id: found.id }),
    customerSince(found.id),
    companyOf(),
  ]);
  if (!row) throw notFound('That customer');
  const otherNames = row.otherNames.map((other) => other.name);
  return customerData.parse({ ...row, otherNames, customer, since, company: name, madeAt: now().toISOString() });
}
