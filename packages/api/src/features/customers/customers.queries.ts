import type { Transaction } from 'sequelize';
import type { CustomerDto, ListedCustomer } from '@driprail/shared/contracts/customers.contract';
import { folded, phoneDigits, tight } from '@driprail/shared/domain/customer/fold';
import { select } from '../../db/sequelize.ts';
import { addressJson, vehicleJson } from './part-json.sql.ts';

const columns = `c.id, c.name, c.is_company AS "isCompany", c.phone, c.email, c.notes, c.version, c.tags,
  c.is_scent_free AS "isScentFree", c.rings_first AS "ringsFirst", c.must_know AS "mustKnow",
  coalesce((SELECT json_agg(k.person_id ORDER BY k.position) FROM customer_crew k WHERE k.customer_id = c.id), '[]') AS "preferredCrew",
  coalesce((SELECT json_agg(json_build_object('channel', o.channel, 'isGiven', o.is_given, 'on', o.given_on, 'how', o.how) ORDER BY o.channel)
      FROM (SELECT DISTINCT ON (channel) * FROM customer_consents WHERE customer_id = c.id
             ORDER BY channel, recorded_at DESC, id DESC) o), '[]') AS consents,
  coalesce((SELECT json_agg(${addressJson} ORDER BY a.position, a.id) FROM addresses a WHERE a.customer_id = c.id AND a.is_active), '[]') AS addresses,
  coalesce((SELECT json_agg(${vehicleJson} ORDER BY v.position, v.id) FROM vehicles v WHERE v.customer_id = c.id AND v.is_active), '[]') AS vehicles`;

/** What is next, else what waits, else what was last. */
const standing = `(SELECT json_build_object('at', to_json(lower(v.planned)) #>> '{}', 'progress', v.progress)
  FROM visits v JOIN jobs j ON j.id = v.job_id WHERE j.customer_id = c.id AND v.progress <> 'called_off'
 ORDER BY CASE WHEN v.progress IN ('done', 'part_done') THEN 3 WHEN v.planned IS NULL THEN 2 ELSE 1 END,
          CASE WHEN v.progress NOT IN ('done', 'part_done') THEN lower(v.planned) END, lower(v.planned) DESC LIMIT 1)`;
const lastVisit = `(SELECT max(lower(v.planned)) FROM visits v JOIN jobs j ON j.id = v.job_id
  WHERE j.customer_id = c.id AND v.progress IN ('done', 'part_done'))`;
const orders = { name: 'folded(c.name), c.id', visit: `${lastVisit} DESC NULLS LAST, folded(c.name), c.id` };

const MOST_WORDS = 8;
const FEWEST_TIGHT = 3;

/** Each word must be there somewhere; or all of it in one piece, as phones, plates and VINs are written in many ways. */
function matching(find: string): { condition: string; values: Record<string, string> } {
  const words = folded(find).split(/\s+/).filter(Boolean).slice(0, MOST_WORDS);
  if (words.length === 0) return { condition: 'true', values: {} };
  const like = (text: string) => `%${text.replace(/[\\%_]/g, '\\$&')}%`;
  const values = Object.fromEntries(words.map((word, index) => [`word${index}`, like(word)]));
  const every = words.map((_word, index) => `w.words LIKE :word${index}`).join(' AND ');
  // A number is looked for by its digits alone, so that +1 (555) finds 555.
  const whole = /^[\d+().\-\sx]+$/i.test(find) ? phoneDigits(find) : tight(find);
  if (whole.length < FEWEST_TIGHT) return { condition: every, values };
  return { condition: `((${every}) OR w.words LIKE :whole)`, values: { ...values, whole: like(whole) } };
}

/** Those found by any part of what is kept to find them by. Merged and erased records are in no list. */
export async function findCustomers({
  find,
  by,
  limit,
  offset,
}: {
  find: string;
  by: keyof typeof orders;
  limit: number;
  offset: number;
}): Promise<{ customers: ListedCustomer[]; total: number }> {
  const { condition, values } = matching(find);
  const found = `FROM customers c JOIN customer_words w ON w.customer_id = c.id WHERE c.erased_at IS NULL AND ${condition}`;
  const [customers, [count]] = await Promise.all([
    select<ListedCustomer>(
      `SELECT ${columns}, ${standing} AS standing ${found} ORDER BY ${orders[by]} LIMIT :limit OFFSET :offset`,
      { ...values, limit, offset },
    ),
    select<{ total: number }>(`SELECT count(*) AS total ${found}`, values),
  ]);
  return { customers, total: count?.total ?? 0 };
}

export async function findCustomer(id: string, tx?: Transaction): Promise<CustomerDto | null> {
  const [row] = await select<CustomerDto>(`SELECT ${columns} FROM customers c WHERE c.id = :id`, { id }, tx);
  return row ?? null;
}

export interface Led {
  id: string;
  /** The name of the record asked for, when it was merged into this one. */
  mergedName: string | null;
  erasedAt: string | null;
}

/** The record that an id leads to: its own, or the one it was merged into. @returns null for an id nobody has */
export async function leadingTo(id: string): Promise<Led | null> {
  const [row] = await select<Led>(
    `SELECT s.id, CASE WHEN c.merged_into IS NOT NULL THEN c.name END AS "mergedName", to_json(s.erased_at) #>> '{}' AS "erasedAt"
       FROM customers c JOIN customers s ON s.id = coalesce(c.merged_into, c.id) WHERE c.id = :id`,
    { id },
  );
  return row ?? null;
}

/** What this company typed before, the most used first. */
export async function vehicleWords(): Promise<{ makes: string[]; models: string[]; colors: string[] }> {
  const most = async (column: 'make' | 'model' | 'color') => {
    const rows = await select<{ word: string }>(
      `SELECT min(${column}) AS word FROM vehicles WHERE ${column} <> '' GROUP BY lower(${column}) ORDER BY count(*) DESC, 1 LIMIT 200`,
    );
    return rows.map(({ word }) => word);
  };
  const [makes, models, colors] = await Promise.all([most('make'), most('model'), most('color')]);
  return { makes, models, colors };
}
