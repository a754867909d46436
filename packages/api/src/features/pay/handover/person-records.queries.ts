import { select } from '../../../db/sequelize.ts';
import { listPersonPlaces } from '../places.service.ts';
import { listPlans } from '../plans.service.ts';
import { listRates, listRules } from '../rates.service.ts';

/** Who did something, without naming anybody: the person, the owner, the desk, or the program. */
const bySql = (user: string) =>
  `CASE WHEN ${user}.id IS NULL THEN 'Driprail' WHEN ${user}.person_id = :personId THEN 'the person' ELSE ${user}.role END`;

export interface ClockRecord {
  id: string;
  kind: string;
  jobNumber: number | null;
  startedAt: string;
  endedAt: string | null;
  isInterrupted: boolean;
  /** Oldest first; the first one's `before` is what was recorded originally, null when it was written down later. */
  corrections: { at: string; by: string; before: ClockValues | null; after: ClockValues; reason: string }[];
}

interface ClockValues {
  kind?: string;
  startedAt?: string;
  endedAt?: string | null;
}

/** Every clock entry of a person with all its versions, oldest first. */
export function clockRecords(personId: string): Promise<ClockRecord[]> {
  return select<ClockRecord>(
    `SELECT e.id, e.kind, j.number AS "jobNumber", to_json(e.started_at) #>> '{}' AS "startedAt",
            to_json(e.ended_at) #>> '{}' AS "endedAt", e.is_interrupted AS "isInterrupted",
            coalesce((SELECT json_agg(json_build_object('at', c.at, 'by', ${bySql('u')}, 'before', c.before, 'after', c.after,
              'reason', c.reason) ORDER BY c.at, c.id) FROM clock_corrections c LEFT JOIN users u ON u.id = c.user_id
              WHERE c.entry_id = e.id), '[]'::json) AS corrections
       FROM clock_entries e LEFT JOIN visits v ON v.id = e.visit_id LEFT JOIN jobs j ON j.id = v.job_id
      WHERE e.person_id = :personId ORDER BY e.started_at, e.id`,
    { personId },
  );
}

/** The dated terms a person was paid by: own and the company's rates and rules, plans, places, agreements, hours off. */
export async function termsOf(personId: string) {
  const isOwn = (row: { personId: string | null }) => row.personId === personId;
  const timeOff = {
    days: await select(
      'SELECT starts_on AS "startsOn", ends_on AS "endsOn", note FROM time_off WHERE person_id = :personId ORDER BY starts_on',
      { personId },
    ),
    rules: await select(
      `SELECT kind, CASE WHEN person_id IS NULL THEN 'the company' ELSE 'the person' END AS "for", starts_on AS "startsOn", rule
         FROM time_off_rules WHERE person_id IS NULL OR person_id = :personId ORDER BY starts_on, id`,
      { personId },
    ),
    adjustments: await select(
      `SELECT kind, on_date AS "on", hours, reason, at FROM time_off_adjustments WHERE person_id = :personId ORDER BY at, id`,
      { personId },
    ),
  };
  const agreements = await select(
    `SELECT kind, starts_on AS "startsOn", signed_on AS "signedOn", note FROM pay_agreements WHERE person_id = :personId
      ORDER BY starts_on, id`,
    { personId },
  );
  return {
    rates: (await listRates()).filter((rate) => rate.personId === null || isOwn(rate)).map(unsigned),
    plans: (await listPlans()).filter(isOwn).map(unsigned),
    places: (await listPersonPlaces()).filter(isOwn).map(unsigned),
    rules: (await listRules()).map(unsigned),
    agreements,
    timeOff,
  };
}

/** Terms without who set them: that login's name is another person's. */
function unsigned<T extends { setBy?: string }>({ setBy: _login, ...terms }: T): Omit<T, 'setBy'> {
  return terms;
}

/** What a person said of the own hours, and what was asked or proposed to be changed in them. */
export async function wordsOf(personId: string) {
  const hours = await select(
    `SELECT h.week_starts_on AS "weekStartsOn", h.is_right AS "isRight", h.note, h.at, ${bySql('u')} AS by
       FROM hours_words h JOIN users u ON u.id = h.user_id WHERE h.person_id = :personId ORDER BY h.at, h.id`,
    { personId },
  );
  const requests = await select(
    `SELECT r.direction, r.at, ${bySql('u')} AS by, r.before, r.after, r.reason, r.state, r.decided_at AS "decidedAt", r.answer
       FROM clock_requests r JOIN users u ON u.id = r.user_id WHERE r.person_id = :personId ORDER BY r.at, r.id`,
    { personId },
  );
  return { hours, requests };
}

/** Audit entries about a person's pay and hours alone, oldest first; nobody else is named in them. */
export function auditOf(personId: string): Promise<Record<string, unknown>[]> {
  return select(
    `SELECT a.at, ${bySql('u')} AS by, a.entity, a.entity_id AS "entityId", a.action, a.details
       FROM audit_entries a LEFT JOIN users u ON u.id = a.user_id
      WHERE (a.entity IN ('pay_rate', 'pay_plan', 'person_place', 'pay_agreement', 'time_off_rule', 'time_off_adjustment', 'hours')
              AND a.details->>'personId' = :personId::text)
         OR (a.entity = 'pay_adjustment' AND a.entity_id IN (SELECT o.entity_id FROM audit_entries o
               WHERE o.entity = 'pay_adjustment' AND o.details->>'personId' = :personId::text))
         OR (a.entity = 'clock_entry' AND a.entity_id IN (SELECT e.id::text FROM clock_entries e WHERE e.person_id = :personId))
         OR (a.entity = 'clock_request' AND a.entity_id IN (SELECT r.id::text FROM clock_requests r WHERE r.person_id = :personId))
         OR (a.entity = 'pay_week' AND a.entity_id IN (SELECT s.pay_week_id::text FROM pay_statements s WHERE s.person_id = :personId))
      ORDER BY a.id`,
    { personId },
  );
}
