import { NEAR_DAYS } from '@driprail/shared/authz/ability';
import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { addDays, dayOf } from '@driprail/shared/domain/time/zone';
import { companyOf } from '../../db/company.ts';
import { select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { forbidden, unprocessable } from '../../http/errors.ts';
import { clockOfPerson } from '../clock/index.ts';
import { rulesOn } from '../pay/index.ts';
import { readRunRows, toRunVisit } from './run-visits.queries.ts';

/** One's own crew's day. @throws 403 for a technician's days that are not near, 422 without a person behind the login */
export async function readRunSheet({ actor, now }: Ctx, day: string): Promise<RunSheetDto> {
  const personId = actor.personId;
  if (!personId) throw unprocessable('no_person', 'This login belongs to nobody on the crew, so it has no run sheet.');
  const { zone, undoSeconds } = await companyOf();
  const today = dayOf(now().toISOString(), zone);
  const isNear = day >= addDays(today, -NEAR_DAYS.back) && day <= addDays(today, NEAR_DAYS.ahead);
  if (actor.role === 'technician' && !isNear) throw forbidden('The run sheet shows yesterday to two days ahead.');
  const rows = await readRunRows({ personId, day });
  const riding = await crewOf(personId, day);
  return {
    day,
    now: now().toISOString(),
    zone,
    vanName: riding?.vanName ?? null,
    crewNames: riding?.names ?? [],
    visits: rows.map((row) => toRunVisit(row, { now: now(), zone, undoSeconds })),
    clock: await clockOfPerson(personId, now()),
    tipsGoTo: (await rulesOn(day)).tipsGoTo,
  };
}

async function crewOf(personId: string, day: string): Promise<{ vanName: string; names: string[] } | null> {
  const [row] = await select<{ vanName: string; names: string[] }>(
    `SELECT n.name AS "vanName", (SELECT json_agg(p.name ORDER BY o.position) FROM van_crew o JOIN people p ON p.id = o.person_id
              WHERE o.van_id = r.van_id AND o.span && r.span) AS names
       FROM van_crew r JOIN vans n ON n.id = r.van_id CROSS JOIN company_settings s
      WHERE r.person_id = :personId
        AND r.span && tstzrange(:day::timestamp AT TIME ZONE s.zone, (:day::date + 1)::timestamp AT TIME ZONE s.zone)
      ORDER BY lower(r.span) DESC LIMIT 1`,
    { personId, day },
  );
  return row ?? null;
}
