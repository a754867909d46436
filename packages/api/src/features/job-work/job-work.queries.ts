import type { Transaction } from 'sequelize';
import { NEAR_DAYS } from '@driprail/shared/authz/ability';
import type { DayWorkDto, OpenWorkDto, VisitWorkDto } from '@driprail/shared/contracts/job-work.contract';
import type { Offer } from '@driprail/shared/domain/job-work/judge-change';
import { weatherWords } from '@driprail/shared/domain/menu/service-needs';
import { addDays, dayOf } from '@driprail/shared/domain/time/zone';
import { companyOf } from '../../db/company.ts';
import { select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { forbidden, notFound, unprocessable } from '../../http/errors.ts';
import { listServices, surchargesOfDay } from '../service-menu/index.ts';
import { changeJson } from './change.sql.ts';
import { toVisitWork } from './visit-work.presenter.ts';
import { readWorkRows } from './work-rows.queries.ts';

/** One's own crew's work of a day. @throws 403 for a technician's days that are not near, 422 without a person behind the login */
export async function readDayWork({ actor, now }: Ctx, day: string): Promise<DayWorkDto> {
  const { personId } = actor;
  if (!personId) throw unprocessable('no_person', 'This login belongs to nobody on the crew, so it has no run sheet.');
  const { zone } = await companyOf();
  const today = dayOf(now().toISOString(), zone);
  const isNear = day >= addDays(today, -NEAR_DAYS.back) && day <= addDays(today, NEAR_DAYS.ahead);
  if (actor.role === 'technician' && !isNear) throw forbidden('The run sheet shows yesterday to two days ahead.');
  const rows = await readWorkRows({ personId, day });
  const works = rows.map((row) => toVisitWork(row, { now: now(), zone, isDesk: false }));
  return { day, works, offers: await offersOn(today), surcharges: await surchargesOfDay(today) };
}

/** @throws 404 */
export async function readVisitWork(ctx: Ctx, visitId: string, tx?: Transaction): Promise<VisitWorkDto> {
  const { zone } = await companyOf(tx);
  const [row] = await readWorkRows({ visitId }, tx);
  if (!row) throw notFound('That visit');
  return toVisitWork(row, { now: ctx.now(), zone, isDesk: ctx.actor.role !== 'technician' });
}

/** What can be sold at the car on a day, at that day's prices. */
export async function offersOn(day: string, tx?: Transaction): Promise<Offer[]> {
  const [services, { units }] = [await listServices(day, null, tx), await companyOf(tx)];
  return services
    .filter((service) => service.isActive)
    .map(({ id, name, kind, skills, needs, prices }) => ({
      ...{ serviceId: id, name, kind, skills, weather: weatherWords(needs, units) },
      prices: prices.map(({ sizeClass, priceCents, minutes }) => ({ sizeClass, priceCents, minutes })),
    }));
}

/** Keys that are out, whatever their day, and changes that crews ask for. */
export async function readOpenWork(): Promise<OpenWorkDto> {
  const keys = await select<OpenWorkDto['keys'][number]>(
    `SELECT v.id AS "visitId", j.number AS "jobNumber", c.name AS "customerName", coalesce(n.name, '') AS "vanName",
            coalesce(p.name, u.name) AS "takenBy", to_json(e.occurred_at) #>> '{}' AS "takenAt", e.words,
            (lower(v.planned) AT TIME ZONE s.zone)::date::text AS day
       FROM (SELECT DISTINCT ON (visit_id) * FROM work_events WHERE kind IN ('key_taken', 'key_back')
              ORDER BY visit_id, occurred_at DESC, received_at DESC, id DESC) e
       JOIN visits v ON v.id = e.visit_id JOIN jobs j ON j.id = v.job_id JOIN customers c ON c.id = j.customer_id
       JOIN users u ON u.id = e.user_id LEFT JOIN people p ON p.id = e.person_id LEFT JOIN vans n ON n.id = v.van_id
       CROSS JOIN company_settings s
      WHERE e.kind = 'key_taken' ORDER BY e.occurred_at`,
  );
  const rows = await select<{ change: OpenWorkDto['changes'][number] }>(
    `SELECT ${changeJson} AS change
       FROM job_changes h JOIN jobs j ON j.id = h.job_id JOIN customers c ON c.id = j.customer_id
       JOIN users u ON u.id = h.user_id LEFT JOIN people p ON p.id = h.person_id LEFT JOIN users w ON w.id = h.answered_by
      WHERE h.state = 'asked' ORDER BY h.occurred_at`,
  );
  return { keys, changes: rows.map((row) => row.change) };
}
