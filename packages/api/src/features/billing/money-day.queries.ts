import { dayDifference } from '@driprail/shared/domain/billing/day-difference';
import type { DayFlows } from '@driprail/shared/domain/billing/day-difference';
import type { MoneyDayDto } from '@driprail/shared/contracts/money-day.contract';
import { select } from '../../db/sequelize.ts';
import { cashTaken, countFrom, countJson, holderName, isCash, isUncounted } from './cash.sql.ts';

type Row = Omit<MoneyDayDto, 'netReceivedCents' | 'difference'> & { flows: Omit<DayFlows, 'invoiced'> };

/** One day's flows of money: payments `p` and refunds `r` of `day`, the mistaken left out; jobs billed that day or before. */
const flows = `day AS (
    SELECT :day::timestamp AT TIME ZONE s.zone AS starts_at, (:day::date + 1)::timestamp AT TIME ZONE s.zone AS ends_at
      FROM company_settings s
  ), mistaken AS (
    SELECT payment_id FROM refunds WHERE kind = 'mistake' AND state <> 'failed'
  ), moved AS (
    SELECT p.id, p.job_id, p.method, p.received_at AS at, 'payment' AS kind, 'done' AS state, p.amount_cents AS cents
      FROM payments p WHERE p.id NOT IN (SELECT payment_id FROM mistaken)
    UNION ALL
    SELECT r.id, p.job_id, p.method, r.made_at, r.kind, r.state, -r.amount_cents
      FROM refunds r JOIN payments p ON p.id = r.payment_id WHERE r.kind <> 'mistake' AND r.state <> 'failed'
  ), today AS (
    SELECT m.* FROM moved m, day WHERE m.at >= day.starts_at AND m.at < day.ends_at
  ), billed AS (
    SELECT i.* FROM invoices i, day WHERE i.issued_at >= day.starts_at AND i.issued_at < day.ends_at
  ), earlier AS (
    SELECT DISTINCT i.job_id FROM invoices i, day WHERE i.issued_at < day.starts_at AND i.job_id NOT IN (SELECT job_id FROM billed)
  )`;

const sumOf = (rows: string) =>
  `(SELECT json_build_object('count', count(*), 'cents', coalesce(sum(cents), 0)) FROM (${rows}) x)`;
const centsOf = (rows: string) => `(SELECT coalesce(sum(cents), 0) FROM (${rows}) x)`;
const ofMethod = 'SELECT cents FROM today t WHERE t.method = m.method';

/** The close of one day of the company's zone, in one query. @param day company-zone day */
export async function readMoneyDay(day: string): Promise<MoneyDayDto> {
  const [row] = await select<Row>(
    `WITH ${flows}
     SELECT :day AS day,
       (SELECT json_build_object('count', count(*), 'netCents', coalesce(sum(net_cents), 0), 'taxCents', coalesce(sum(tax_cents), 0),
          'totalCents', coalesce(sum(total_cents), 0)) FROM billed) AS invoiced,
       ${sumOf('SELECT net_cents + tax_cents AS cents FROM credit_notes c WHERE c.issued_at >= day.starts_at AND c.issued_at < day.ends_at')} AS credited,
       (SELECT json_agg(json_build_object('method', m.method, 'received', ${sumOf(`${ofMethod} AND t.kind = 'payment'`)},
          'givenBack', ${sumOf(`SELECT -cents AS cents FROM today t WHERE t.method = m.method AND t.kind <> 'payment'`)},
          'waitingCents', -${centsOf(`${ofMethod} AND t.state = 'asked'`)},
          'disputedCents', -${centsOf(`${ofMethod} AND t.kind = 'dispute'`)}) ORDER BY m.position)
          FROM (VALUES ('cash', 1), ('check', 2), ('transfer', 3), ('card', 4)) m (method, position)) AS methods,
       ${sumOf('SELECT p.amount_cents AS cents FROM payments p WHERE p.id IN (SELECT payment_id FROM mistaken) AND p.received_at >= day.starts_at AND p.received_at < day.ends_at')} AS mistaken,
       ${sumOf(`SELECT t.amount_cents AS cents FROM tips t JOIN payments p ON p.id = t.payment_id
          WHERE p.method = 'card' AND p.received_at >= day.starts_at AND p.received_at < day.ends_at`)} AS "cardTips",
       json_build_object(
         'creditedOnThem', ${centsOf(`SELECT c.net_cents + c.tax_cents AS cents FROM credit_notes c JOIN billed b ON b.id = c.invoice_id WHERE c.issued_at < day.ends_at`)},
         'receivedBeforeOnThem', ${centsOf('SELECT m.cents FROM moved m WHERE m.at < day.starts_at AND m.job_id IN (SELECT job_id FROM billed)')},
         'receivedOnThem', ${centsOf('SELECT t.cents FROM today t WHERE t.job_id IN (SELECT job_id FROM billed)')},
         'receivedForEarlier', ${centsOf('SELECT t.cents FROM today t WHERE t.job_id IN (SELECT job_id FROM earlier)')},
         'receivedForUnbilled', ${centsOf(`SELECT t.cents FROM today t
            WHERE t.job_id NOT IN (SELECT job_id FROM billed UNION ALL SELECT job_id FROM earlier)`)}) AS flows,
       (SELECT json_build_object('takenCents', coalesce(sum(p.amount_cents + tip.cents), 0), 'tipCents', coalesce(sum(tip.cents), 0),
          'countedCents', coalesce(sum(p.amount_cents + tip.cents) FILTER (WHERE NOT (${isUncounted})), 0),
          'counts', coalesce((SELECT json_agg(${countJson} ORDER BY c.counted_at) FROM ${countFrom}
             WHERE c.counted_at >= day.starts_at AND c.counted_at < day.ends_at), '[]'),
          'stillOut', coalesce((SELECT json_agg(json_build_object('name', o.name, 'cents', o.cents) ORDER BY o.cents DESC, o.name) FROM (
             SELECT ${holderName} AS name, sum(p.amount_cents + tip.cents) AS cents FROM ${cashTaken}
              WHERE ${isCash} AND ${isUncounted} AND p.received_at >= day.starts_at AND p.received_at < day.ends_at GROUP BY 1) o), '[]'))
          FROM ${cashTaken} WHERE ${isCash} AND p.received_at >= day.starts_at AND p.received_at < day.ends_at) AS cash,
       coalesce((SELECT json_agg(json_build_object('id', a.id, 'jobId', j.id, 'jobNumber', j.number, 'customerName', c.name,
          'amountCents', a.amount_cents, 'tipCents', a.tip_cents, 'openedAt', to_json(a.created_at) #>> '{}') ORDER BY a.created_at)
          FROM card_attempts a JOIN jobs j ON j.id = a.job_id JOIN customers c ON c.id = j.customer_id
         WHERE a.state = 'open' AND a.created_at < day.ends_at), '[]') AS "openPages"
     FROM day`,
    { day },
  );
  if (!row) throw new Error('the company is not set up');
  const { flows: moved, ...shown } = row;
  const received = shown.methods.reduce((total, one) => total + one.received.cents - one.givenBack.cents, 0);
  return {
    ...shown,
    netReceivedCents: received,
    difference: dayDifference({ ...moved, invoiced: shown.invoiced.totalCents }),
  };
}
