import type { Transaction } from 'sequelize';
import { splitByLargestRemainder } from '@driprail/shared/domain/money/largest-remainder';
import { exact } from '@driprail/shared/domain/money/exact';
import type {
  CrewShare,
  DoneLine,
  PayPerson,
  PayWeekInput,
  PersonPlace,
  SettledCommission,
} from '@driprail/shared/domain/pay/pay-week.types';
import { ruleSetOf } from '@driprail/shared/domain/pay/own-rules';
import type { OwnRules } from '@driprail/shared/domain/pay/own-rules';
import { companyOf } from '../../db/company.ts';
import type { PayWeek } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { carriedInto } from './carried.queries.ts';
import { settledCommissionsIn } from './deferred/settled.queries.ts';
import {
  daysAwayJson,
  noShowTripsJson,
  noShowTripSql,
  showUpRulesJson,
  timeOffTakenJson,
} from './time-off/pay-input.sql.ts';
import { rulesOn } from './weeks.service.ts';

interface GatheredLine extends Omit<DoneLine, 'commissionableCents' | 'crew'> {
  priceCents: number;
  jobPrices: { lineId: string; priceCents: number }[];
  discountCents: number;
  crew: CrewShare[];
  jobPaidAt: string | null;
}

interface GatheredPlace extends Omit<PersonPlace, 'ruleSet'> {
  ruleSetKey: string | null;
  ownRules: OwnRules | null;
}

type Gathered = Pick<
  PayWeekInput,
  | 'people'
  | 'entries'
  | 'rates'
  | 'tips'
  | 'adjustments'
  | 'plans'
  | 'ratesInEffect'
  | 'showUpRules'
  | 'noShowTrips'
  | 'daysAway'
> & {
  lines: GatheredLine[];
  places: GatheredPlace[];
};

const crewJson = `json_build_object('personId', vc.person_id, 'position', vc.position, 'weight', vc.weight, 'isTrainee', vc.is_trainee,
  'minutes', coalesce((SELECT floor(sum(extract(epoch FROM e.ended_at - e.started_at)) / 60)::int FROM clock_entries e
     WHERE e.visit_id = vc.visit_id AND e.person_id = vc.person_id AND e.kind = 'job'), 0))`;

/** Everything that a week is paid from, in one statement; shares rest on who worked the visit. */
const gatherSql = `
WITH entry AS (
  SELECT e.* FROM clock_entries e WHERE tstzrange(e.started_at, e.ended_at) && tstzrange(:startsAt, :endsAt)
     AND (e.ended_at IS NOT NULL OR :asOf::timestamptz > :startsAt)
), line AS (
  SELECT l.* FROM job_lines l WHERE l.finished_at >= :startsAt AND l.finished_at < :endsAt
), tip AS (
  SELECT t.* FROM tips t WHERE t.received_at >= :startsAt AND t.received_at < :endsAt
), trip AS (
  ${noShowTripSql}
), paid AS (
  SELECT person_id FROM entry UNION SELECT vc.person_id FROM visit_crew vc JOIN line l ON l.finished_visit_id = vc.visit_id
  UNION SELECT vc.person_id FROM visit_crew vc JOIN visits v ON v.id = vc.visit_id JOIN tip t ON t.job_id = v.job_id
  UNION SELECT vc.person_id FROM visit_crew vc JOIN trip t ON t.id = vc.visit_id
  UNION SELECT person_id FROM pay_adjustments WHERE pay_week_id = :weekId
)
SELECT json_build_object(
  'people', coalesce((SELECT json_agg(json_build_object('id', p.id, 'name', p.name) ORDER BY p.name, p.id)
     FROM people p WHERE p.id IN (SELECT person_id FROM paid)
      -- An owner's minutes count for the job, not for wages.
      AND NOT EXISTS (SELECT 1 FROM users u WHERE u.person_id = p.id AND u.role = 'owner')), '[]'::json),
  'entries', coalesce((SELECT json_agg(json_build_object('id', e.id, 'personId', e.person_id, 'kind', e.kind, 'visitId', e.visit_id,
      'startedAt', to_json(e.started_at) #>> '{}', 'endedAt', to_json(e.ended_at) #>> '{}', 'interrupted', e.is_interrupted)
      ORDER BY e.started_at, e.id) FROM entry e), '[]'::json),
  'rates', coalesce((SELECT json_agg(json_build_object('id', r.id, 'kind', r.kind, 'personId', r.person_id, 'serviceId', r.service_id,
      'clockKind', r.clock_kind, 'value', r.value::text, 'startsOn', r.starts_on) ORDER BY r.starts_on, r.id) FROM pay_rates r), '[]'::json),
  'lines', coalesce((SELECT json_agg(json_build_object('lineId', l.id, 'jobId', j.id, 'jobNumber', j.number, 'visitId', l.finished_visit_id,
      'serviceId', s.id, 'serviceName', s.name, 'sizeClass', l.size_class, 'isAddOn', s.kind = 'add_on', 'priceCents', l.price_cents, 'discountCents', j.discount_cents,
      'jobPrices', (SELECT json_agg(json_build_object('lineId', o.id, 'priceCents', o.price_cents) ORDER BY o.position, o.id)
         FROM job_lines o WHERE o.job_id = j.id),
      'doneAt', to_json(l.finished_at) #>> '{}', 'jobPaidAt', (SELECT to_json(jp.paid_at) #>> '{}' FROM jobs_paid jp WHERE jp.job_id = j.id),
      'crew', coalesce((SELECT json_agg(${crewJson} ORDER BY vc.position) FROM visit_crew vc WHERE vc.visit_id = l.finished_visit_id), '[]'::json))
      ORDER BY l.finished_at, j.number, l.position)
     FROM line l JOIN jobs j ON j.id = l.job_id JOIN services s ON s.id = l.service_id), '[]'::json),
  'tips', coalesce((SELECT json_agg(json_build_object('id', t.id, 'jobId', j.id, 'jobNumber', j.number, 'amountCents', t.amount_cents,
      'method', t.method, 'receivedAt', to_json(t.received_at) #>> '{}', 'alreadyReceived', t.already_received, 'forPersonId', t.for_person_id,
      'crew', coalesce((SELECT json_agg(${crewJson} ORDER BY vc.position)
         FROM (SELECT DISTINCT ON (vc.person_id) vc.* FROM visit_crew vc JOIN visits v ON v.id = vc.visit_id WHERE v.job_id = t.job_id
                ORDER BY vc.person_id, v.part) vc
        WHERE coalesce((SELECT st.shares_tips FROM tip_standings st WHERE st.person_id = vc.person_id
                AND st.starts_on <= (t.received_at AT TIME ZONE :zone)::date ORDER BY st.starts_on DESC LIMIT 1), true)), '[]'::json))
      ORDER BY t.received_at, t.id) FROM tip t JOIN jobs j ON j.id = t.job_id), '[]'::json),
  'adjustments', coalesce((SELECT json_agg(json_build_object('id', x.id, 'personId', x.person_id, 'kind', x.kind,
      'amountCents', x.amount_cents, 'reason', x.reason, 'correctsLineId', x.corrects_line_id, 'counted', x.counted, 'timeOff', ${timeOffTakenJson}) ORDER BY x.at, x.id)
     FROM pay_adjustments x WHERE x.pay_week_id = :weekId), '[]'::json),
  'ratesInEffect', coalesce((SELECT json_agg(json_build_object('personId', a.person_id, 'signedOn', a.signed_on) ORDER BY a.person_id)
     FROM (SELECT DISTINCT ON (person_id) * FROM pay_agreements WHERE kind = 'rate_in_effect' AND starts_on <= :startsOn
      ORDER BY person_id, starts_on DESC) a WHERE a.signed_on IS NOT NULL), '[]'::json),
  'plans', coalesce((SELECT json_agg(json_build_object('id', p.id, 'personId', p.person_id, 'startsOn', p.starts_on, 'plan', p.plan)
      ORDER BY p.person_id) FROM (SELECT DISTINCT ON (person_id) * FROM pay_plans WHERE starts_on <= :startsOn
      ORDER BY person_id, starts_on DESC) p), '[]'::json),
  'places', coalesce((SELECT json_agg(json_build_object('personId', p.person_id, 'placeId', pl.id, 'name', pl.name,
      'ruleSetKey', pl.rule_set_key, 'ownRules', pl.own_rules,
      'minimumWages', coalesce((SELECT json_agg(json_build_object('startsOn', w.starts_on, 'amount', w.amount::text) ORDER BY w.starts_on)
         FROM pay_place_wages w WHERE w.place_id = pl.id), '[]'::json)) ORDER BY p.person_id)
      FROM (SELECT DISTINCT ON (person_id) * FROM person_places WHERE starts_on <= :startsOn ORDER BY person_id, starts_on DESC) p
      JOIN pay_places pl ON pl.id = p.place_id), '[]'::json),
  'showUpRules', ${showUpRulesJson},
  'daysAway', ${daysAwayJson},
  'noShowTrips', ${noShowTripsJson(crewJson)}
) AS gathered`;

/** The engine's input for a week as the records stand at `asOf`. */
export async function payInputOf(week: PayWeek, asOf: Date, tx?: Transaction): Promise<PayWeekInput> {
  const { zone } = await companyOf(tx);
  const input = await recordsOf(week, asOf, tx);
  const settledCommissions = await settledCommissionsIn(week, zone, (past) => recordsOf(past, asOf, tx), tx);
  if (settledCommissions.length === 0) return input;
  return { ...input, people: withSettled(input.people, settledCommissions), settledCommissions };
}

/** Somebody whose commission is settled may have done nothing else in the week. */
function withSettled(people: PayPerson[], settled: readonly SettledCommission[]): PayPerson[] {
  const everyone = [...people, ...settled.flatMap((one) => one.input.people)];
  const byId = new Map(everyone.map((person) => [person.id, person]));
  return [...byId.values()].sort((a, b) => a.name.localeCompare(b.name) || a.id.localeCompare(b.id));
}

/** A week's own records, without what customers' payments settle from weeks before. */
async function recordsOf(week: PayWeek, asOf: Date, tx?: Transaction): Promise<PayWeekInput> {
  const { zone, clock } = await companyOf(tx);
  const rules = await rulesOn(week.startsOn, tx);
  const startsAt = week.startsAt.toISOString();
  const endsAt = week.endsAt.toISOString();
  const [row] = await select<{ gathered: Gathered }>(
    gatherSql,
    { weekId: week.id, startsOn: week.startsOn, startsAt, endsAt, asOf: asOf.toISOString(), zone },
    tx,
  );
  if (!row) throw new Error('a pay week gathers one row');
  const { lines, places, ...gathered } = row.gathered;
  const carried = await carriedInto(week, gathered.plans, (prior) => recordsOf(prior, asOf, tx), tx);
  return {
    startsAt,
    endsAt,
    zone,
    clock,
    rules: {
      overtimeRuleSet: rules.overtimeRuleSet,
      minimumWage: rules.minimumWage,
      crewSplit: rules.crewSplit,
      mealBreakMinutes: rules.mealBreakMinutes ?? 30,
      punchRoundingMinutes: rules.punchRoundingMinutes ?? null,
      premiumRounding: rules.premiumRounding ?? 'half_up',
      tips: { goTo: rules.tipsGoTo ?? 'crew', cardFeePercent: rules.tipCardFeePercent ?? '0' },
    },
    ...gathered,
    doneLines: lines.map((line) => toDoneLine(line, rules.commissionEarned === 'paid' ? endsAt : null)),
    places: places.map(toPlace),
    carried,
    asOf: asOf.toISOString(),
  };
}

function toPlace({ ruleSetKey, ownRules, ...place }: GatheredPlace): PersonPlace {
  return { ...place, ruleSet: ruleSetOf(place.placeId, place.name, ruleSetKey, ownRules) };
}

/**
 * A discount lowers each line of the job by its share of the price, to the cent.
 * @param paidBefore where commission is earned on payment: the instant by which the customer must have paid
 */
function toDoneLine(
  { priceCents, jobPrices, discountCents, jobPaidAt, ...line }: GatheredLine,
  paidBefore: string | null,
): DoneLine {
  const shares = splitByLargestRemainder(
    discountCents,
    jobPrices.map((other) => exact(other.priceCents)),
  );
  const own = shares[jobPrices.findIndex((other) => other.lineId === line.lineId)] ?? 0;
  const waits = paidBefore !== null && (jobPaidAt === null || Date.parse(jobPaidAt) >= Date.parse(paidBefore));
  return { ...line, commissionableCents: priceCents - own, ...(waits && { commissionWaits: true }) };
}
