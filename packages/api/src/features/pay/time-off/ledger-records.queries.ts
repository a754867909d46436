import type { Transaction } from 'sequelize';
import type { LedgerInput, LedgerWeek, TimeOffWeek } from '@driprail/shared/domain/pay/time-off/time-off-ledger';
import { timeOffLedger } from '@driprail/shared/domain/pay/time-off/time-off-ledger';
import { timeOffKinds } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import type { DatedTimeOffRule, TimeOffKind } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { addDays } from '@driprail/shared/domain/time/zone';
import { TimeOffRuleRow } from '../../../db/models/index.ts';
import { select } from '../../../db/sequelize.ts';

interface StoredWeek {
  startsOn: string;
  endsOn: string;
  isLocked: boolean;
  /** Exact hours by person; only a locked week has them. */
  hours: Record<string, string>;
}

interface StoredMove {
  id: string;
  personId: string;
  kind: TimeOffKind;
  on: string;
  hours: string;
  reason: string;
}

/** Everything that the ledgers of some people stand on. */
export interface LedgerRecords {
  rules: DatedTimeOffRule[];
  weeks: StoredWeek[];
  taken: StoredMove[];
  adjustments: StoredMove[];
}

/** Locked weeks with people's hours, open ones in which hours were taken, and the ledger's own rows. */
export async function ledgerRecords(personIds: readonly string[], tx?: Transaction): Promise<LedgerRecords> {
  const ids = [...personIds];
  if (ids.length === 0) return { rules: [], weeks: [], taken: [], adjustments: [] };
  const rules = await TimeOffRuleRow.findAll({ order: [['startsOn', 'ASC']], transaction: tx ?? null });
  const weeks = await select<StoredWeek>(
    `SELECT w.starts_on AS "startsOn", w.ends_on AS "endsOn", w.state = 'locked' AS "isLocked",
            coalesce((SELECT json_object_agg(s.person_id, s.summary->>'hoursWorked') FROM pay_statements s
               WHERE s.pay_week_id = w.id AND s.person_id IN (:ids)), '{}'::json) AS hours
       FROM pay_weeks w
      WHERE w.state = 'locked' OR EXISTS (SELECT 1 FROM pay_adjustments x
            WHERE x.pay_week_id = w.id AND x.time_off_kind IS NOT NULL AND x.person_id IN (:ids))
      ORDER BY w.starts_on`,
    { ids },
    tx,
  );
  const taken = await select<StoredMove>(
    `SELECT x.id, x.person_id AS "personId", x.time_off_kind AS kind, x.time_off_on AS on, x.time_off_hours AS hours, x.reason
       FROM pay_adjustments x WHERE x.time_off_kind IS NOT NULL AND x.person_id IN (:ids) ORDER BY x.time_off_on, x.id`,
    { ids },
    tx,
  );
  const adjustments = await select<StoredMove>(
    `SELECT a.id, a.person_id AS "personId", a.kind, a.on_date AS on, a.hours, a.reason
       FROM time_off_adjustments a WHERE a.person_id IN (:ids) ORDER BY a.on_date, a.id`,
    { ids },
    tx,
  );
  const dated = rules.map(({ id, kind, personId, startsOn, rule }) => ({ id, kind, personId, startsOn, rule }));
  return { rules: dated, weeks, taken, adjustments };
}

/** Hours of weeks that are not locked, as the reader wants them to count; weeks that are not listed earn nothing. */
export type OpenHours = readonly LedgerWeek[];

/**
 * A person's ledgers by kind over the weeks up to one.
 * @param open weeks beside the locked ones, such as the one at hand
 * @param through first day of the last week; weeks after it stay out
 */
export function ledgersOf(
  records: LedgerRecords,
  personId: string,
  open: OpenHours,
  through: string,
  more: readonly StoredMove[] = [],
): { kind: TimeOffKind; weeks: TimeOffWeek[] }[] {
  const of = <T extends { personId: string }>(list: readonly T[]): T[] =>
    list.filter((item) => item.personId === personId);
  const [taken, adjustments] = [of([...records.taken, ...more]), of(records.adjustments)];
  const weeks = weeksOf(records, personId, open).filter((week) => week.startsOn <= through);
  const first = weeks.findIndex(
    (week) =>
      records.weeks.some((stored) => stored.startsOn === week.startsOn && stored.hours[personId] !== undefined) ||
      open.some((own) => own.startsOn === week.startsOn) ||
      [...taken, ...adjustments].some((move) => move.on <= week.endsOn),
  );
  return timeOffKinds.map((kind) => {
    const input: LedgerInput = {
      ...{ kind, personId, rules: records.rules, weeks: first < 0 ? [] : weeks.slice(first) },
      taken: taken.filter((move) => move.kind === kind),
      adjustments: adjustments.filter((move) => move.kind === kind),
    };
    return { kind, weeks: timeOffLedger(input) };
  });
}

function weeksOf({ weeks }: LedgerRecords, personId: string, open: OpenHours): LedgerWeek[] {
  const stored = weeks
    .filter((week) => !open.some((own) => own.startsOn === week.startsOn))
    .map(({ startsOn, endsOn, isLocked, hours }) => ({
      ...{ startsOn, endsOn },
      hoursWorked: isLocked ? (hours[personId] ?? '0') : '0',
    }));
  const weeksInOrder = [...stored, ...open].sort((a, b) => (a.startsOn < b.startsOn ? -1 : 1));
  return weeksInOrder.flatMap((week, index) => [...gapBefore(week, weeksInOrder[index - 1]), week]);
}

/** Weeks between that nobody locked stand as one stretch, so that what is dated in them shows there. */
function gapBefore({ startsOn }: LedgerWeek, before: LedgerWeek | undefined): LedgerWeek[] {
  if (!before || addDays(before.endsOn, 1) >= startsOn) return [];
  return [{ startsOn: addDays(before.endsOn, 1), endsOn: addDays(startsOn, -1), hoursWorked: '0' }];
}
