import type { Transaction } from 'sequelize';
import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { select } from '../../db/sequelize.ts';

const columns = `c.id, c.name, c.is_company AS "isCompany", c.phone, c.email, c.notes, c.version,
  c.is_scent_free AS "isScentFree", c.rings_first AS "ringsFirst", c.must_know AS "mustKnow",
  coalesce((SELECT json_agg(json_build_object('id', a.id, 'line', a.line, 'city', a.city, 'postcode', a.postcode, 'area', a.area,
      'lat', a.lat, 'lng', a.lng, 'gateCode', a.gate_code, 'accessNotes', a.access_notes, 'hasWater', a.has_water, 'hasPower', a.has_power,
      'hasDog', a.has_dog, 'shutsGate', a.shuts_gate, 'drainsToCreek', a.drains_to_creek, 'takesKey', a.takes_key,
      'keyGoesBack', a.key_goes_back, 'mustKnow', a.must_know)
      ORDER BY a.position, a.id) FROM addresses a WHERE a.customer_id = c.id AND a.is_active), '[]') AS addresses,
  coalesce((SELECT json_agg(json_build_object('id', v.id, 'label', v.label, 'color', v.color, 'plate', v.plate,
      'sizeClass', v.size_class, 'notes', v.notes, 'isCoated', v.is_coated, 'mustKnow', v.must_know) ORDER BY v.position, v.id)
      FROM vehicles v WHERE v.customer_id = c.id AND v.is_active), '[]') AS vehicles`;

/** Any part of name, phone, plate or address, case and spaces aside. */
const matches = `(:find = '' OR c.name ILIKE :like OR regexp_replace(c.phone, '[^0-9]', '', 'g') LIKE :digits
  OR EXISTS (SELECT 1 FROM addresses a WHERE a.customer_id = c.id AND concat_ws(' ', a.line, a.city, a.area) ILIKE :like)
  OR EXISTS (SELECT 1 FROM vehicles v WHERE v.customer_id = c.id AND replace(v.plate, ' ', '') ILIKE :tight))`;

export async function findCustomers(find: string, limit: number): Promise<{ customers: CustomerDto[]; total: number }> {
  const digits = find.replace(/\D/g, '');
  const like = `%${find.replace(/[\\%_]/g, '\\$&')}%`;
  const rows = await select<CustomerDto & { total: number }>(
    `SELECT ${columns}, count(*) OVER () AS total FROM customers c WHERE ${matches} ORDER BY c.name, c.id LIMIT :limit`,
    // With fewer than three digits a phone search would find everybody.
    { find, like, tight: like.replace(/ /g, ''), digits: digits.length >= 3 ? `%${digits}%` : 'none', limit },
  );
  return { customers: rows, total: rows[0]?.total ?? 0 };
}

export async function findCustomer(id: string, tx?: Transaction): Promise<CustomerDto | null> {
  const [row] = await select<CustomerDto>(`SELECT ${columns} FROM customers c WHERE c.id = :id`, { id }, tx);
  return row ?? null;
}

export interface PastJob {
  jobId: string;
  jobNumber: number;
  on: string | null;
  progress: string;
  services: string;
  totalCents: number;
}

export function historyOf(customerId: string): Promise<PastJob[]> {
  return select<PastJob>(
    `SELECT j.id AS "jobId", j.number AS "jobNumber", j.discount_cents,
            (SELECT to_json(max(lower(v.planned))) #>> '{}' FROM visits v WHERE v.job_id = j.id) AS "on",
            (SELECT v.progress FROM visits v WHERE v.job_id = j.id ORDER BY v.part DESC LIMIT 1) AS progress,
            coalesce(string_agg(DISTINCT s.name, ', '), '') AS services,
            (coalesce(sum(l.price_cents), 0) - j.discount_cents)::bigint AS "totalCents"
       FROM jobs j LEFT JOIN job_lines l ON l.job_id = j.id LEFT JOIN services s ON s.id = l.service_id
      WHERE j.customer_id = :customerId GROUP BY j.id ORDER BY j.number DESC LIMIT 100`,
    { customerId },
  );
}
