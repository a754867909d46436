import type { PairedCustomer } from '@driprail/shared/contracts/customers-merge.contract';
import { likelyDuplicates } from '@driprail/shared/domain/customer/duplicates';
import type { KnownCustomer, Likeness } from '@driprail/shared/domain/customer/duplicates';
import { CustomerApart } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';

type Known = KnownCustomer & { jobs: number };

/** Likely duplicates among all that live, without those that somebody found to be two. */
export async function findDuplicates(): Promise<{ one: PairedCustomer; other: PairedCustomer; why: Likeness[] }[]> {
  const [known, apart] = await Promise.all([
    select<Known>(
      `SELECT c.id, c.name, c.phone, c.email, (SELECT count(*) FROM jobs j WHERE j.customer_id = c.id)::integer AS jobs,
              coalesce((SELECT json_agg(concat_ws(', ', a.line, nullif(a.city, '')) ORDER BY a.position) FROM addresses a WHERE a.customer_id = c.id AND a.is_active), '[]') AS places,
              coalesce((SELECT json_agg(v.plate) FROM vehicles v WHERE v.customer_id = c.id AND v.is_active AND v.plate <> ''), '[]') AS plates,
              coalesce((SELECT json_agg(v.vin) FROM vehicles v WHERE v.customer_id = c.id AND v.is_active AND v.vin <> ''), '[]') AS vins
         FROM customers c WHERE c.merged_into IS NULL AND c.erased_at IS NULL`,
    ),
    CustomerApart.findAll(),
  ]);
  const byId = new Map(known.map((customer) => [customer.id, customer]));
  const two = new Set(apart.map(({ customerId, otherId }) => `${customerId},${otherId}`));
  return likelyDuplicates(known)
    .filter(({ ids }) => !two.has(ids.join()))
    .flatMap(({ ids, why }) => {
      const [one, other] = ids.map((id) => byId.get(id));
      return one && other ? [{ one: shown(one), other: shown(other), why }] : [];
    });
}

function shown({ id, name, phone, email, places, jobs }: Known): PairedCustomer {
  return { id, name, phone, email, place: places[0] ?? '', jobs };
}
