import type { Transaction } from 'sequelize';
import type { ClockEntryDto, ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import { FORGOTTEN_AFTER_HOURS } from '@driprail/shared/domain/time/forgotten';
import { select } from '../../db/sequelize.ts';

const FORGOTTEN_AFTER = `interval '${FORGOTTEN_AFTER_HOURS} hours'`;

const columns = `e.id, e.person_id AS "personId", p.name AS "personName", e.kind, e.visit_id AS "visitId", j.number AS "jobNumber",
  to_json(e.started_at) #>> '{}' AS "startedAt", to_json(e.ended_at) #>> '{}' AS "endedAt", e.is_interrupted AS "isInterrupted",
  (e.ended_at IS NULL AND e.started_at < :now::timestamptz - ${FORGOTTEN_AFTER}) AS "isForgotten", e.note, e.version`;
const tables = `clock_entries e JOIN people p ON p.id = e.person_id
  LEFT JOIN visits v ON v.id = e.visit_id LEFT JOIN jobs j ON j.id = v.job_id CROSS JOIN company_settings s`;

/** Entries that touch the days from `from` to `to`, the last one included. */
export function listEntries(
  from: string,
  to: string,
  now: Date,
  personId: string | null = null,
  tx?: Transaction,
): Promise<ClockEntryDto[]> {
  return select<ClockEntryDto>(
    `SELECT ${columns} FROM ${tables}
      WHERE e.started_at < (:to::date + 1)::timestamp AT TIME ZONE s.zone
        AND coalesce(e.ended_at, :now::timestamptz) >= :from::timestamp AT TIME ZONE s.zone
        AND (:personId::uuid IS NULL OR e.person_id = :personId::uuid) ORDER BY e.started_at, e.id`,
    { from, to, now: now.toISOString(), personId },
    tx,
  );
}

export async function findEntry(id: string, now: Date, tx?: Transaction): Promise<ClockEntryDto | null> {
  const [row] = await select<ClockEntryDto>(
    `SELECT ${columns} FROM ${tables} WHERE e.id = :id`,
    { id, now: now.toISOString() },
    tx,
  );
  return row ?? null;
}

/** One person's clock now. Minutes leave meal breaks out; what the law makes of a short one is the pay week's to say. */
export async function clockOfPerson(personId: string, now: Date, tx?: Transaction): Promise<ClockStateDto> {
  const [frame] = await select<{ today: string; weekStart: string; breaks: ClockStateDto['breaks'] }>(
    `SELECT (:now::timestamptz AT TIME ZONE s.zone)::date::text AS today,
            json_build_object('mealAfterMinutes', s.meal_reminder_minutes, 'restAfterMinutes', s.rest_reminder_minutes) AS breaks,
            ((:now::timestamptz AT TIME ZONE s.zone)::date - ((extract(isodow FROM (:now::timestamptz AT TIME ZONE s.zone))::int
              - coalesce((SELECT workweek_starts_on FROM pay_rules WHERE starts_on <= (:now::timestamptz AT TIME ZONE s.zone)::date
                 ORDER BY starts_on DESC LIMIT 1), 1) + 7) % 7))::text AS "weekStart"
       FROM company_settings s`,
    { now: now.toISOString() },
    tx,
  );
  if (!frame) throw new Error('the company is not set up');
  const week = await listEntries(frame.weekStart, frame.today, now, personId, tx);
  const today = await listEntries(frame.today, frame.today, now, personId, tx);
  const open = week.find((entry) => entry.endedAt === null) ?? (await openEntry(personId, now, tx));
  return {
    personId,
    open,
    today,
    inSince: open ? unbrokenSince(today.length > 0 ? today : [open]) : null,
    todayMinutes: workedMinutes(today, now),
    weekMinutes: workedMinutes(week, now),
    forgotten: open?.isForgotten ? [open] : [],
    crew: await crewOf(personId, now, tx),
    breaks: frame.breaks,
  };
}

/** Who rides in the same van as a person now, with what their clocks show. */
export function crewOf(personId: string, now: Date, tx?: Transaction): Promise<ClockStateDto['crew']> {
  return select(
    `SELECT p.id AS "personId", p.name, e.kind, to_json(e.started_at) #>> '{}' AS since
       FROM van_crew own JOIN van_crew o ON o.van_id = own.van_id AND o.person_id <> own.person_id AND o.span @> :now::timestamptz
       JOIN people p ON p.id = o.person_id LEFT JOIN clock_entries e ON e.person_id = p.id AND e.ended_at IS NULL
      WHERE own.person_id = :personId AND own.span @> :now::timestamptz ORDER BY o.position`,
    { personId, now: now.toISOString() },
    tx,
  );
}

async function openEntry(personId: string, now: Date, tx?: Transaction): Promise<ClockEntryDto | null> {
  const [row] = await select<ClockEntryDto>(
    `SELECT ${columns} FROM ${tables} WHERE e.person_id = :personId AND e.ended_at IS NULL`,
    { personId, now: now.toISOString() },
    tx,
  );
  return row ?? null;
}

/** Entries follow one another to the second while somebody stays on the clock. */
function unbrokenSince(entries: ClockEntryDto[]): string | null {
  let since: string | null = null;
  for (const entry of [...entries].reverse()) {
    if (since !== null && entry.endedAt !== null && Date.parse(entry.endedAt) < Date.parse(since)) break;
    since = entry.startedAt;
  }
  return since;
}

function workedMinutes(entries: ClockEntryDto[], now: Date): number {
  const ms = entries
    .filter((entry) => entry.kind !== 'meal_break')
    .reduce(
      (sum, entry) => sum + Math.max(0, Date.parse(entry.endedAt ?? now.toISOString()) - Date.parse(entry.startedAt)),
      0,
    );
  return Math.floor(ms / 60_000);
}
