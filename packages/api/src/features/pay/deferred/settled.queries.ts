import type { Transaction } from 'sequelize';
import { paidFor } from '@driprail/shared/domain/pay/deferred/waiting-commission';
import type { PayWeekInput, SettledCommission } from '@driprail/shared/domain/pay/pay-week.types';
import { dayOf, weekNumberOf } from '@driprail/shared/domain/time/zone';
import type { PayWeek } from '../../../db/models/index.ts';
import { select } from '../../../db/sequelize.ts';
import { frozenInput } from '../frozen.queries.ts';
import { weekAt } from '../weeks.service.ts';

interface PaidLine {
  lineId: string;
  finishedAt: Date;
}

/**
 * Commission of past weeks for which customers paid in this one, by person and week. Locked weeks count as they were
 * locked, open ones as their records stand; what earlier payments settled counts as paid.
 */
export async function settledCommissionsIn(
  week: PayWeek,
  zone: string,
  inputOf: (past: PayWeek) => Promise<PayWeekInput>,
  tx?: Transaction,
): Promise<SettledCommission[]> {
  const lines = await select<PaidLine>(
    `SELECT l.id AS "lineId", l.finished_at AS "finishedAt" FROM jobs_paid jp JOIN job_lines l ON l.job_id = jp.job_id
      WHERE jp.paid_at >= :startsAt AND jp.paid_at < :endsAt AND l.finished_at < :startsAt ORDER BY l.finished_at, l.id`,
    { startsAt: week.startsAt.toISOString(), endsAt: week.endsAt.toISOString() },
    tx,
  );
  const byWeek = new Map<string, { past: PayWeek; paid: Set<string> }>();
  for (const { lineId, finishedAt } of lines) {
    const past = await weekAt(dayOf(finishedAt.toISOString(), zone), tx);
    const known = byWeek.get(past.startsOn) ?? { past, paid: new Set() };
    known.paid.add(lineId);
    byWeek.set(past.startsOn, known);
  }
  const settled = await Promise.all(
    [...byWeek.values()].map(async ({ past, paid }) =>
      settlementsOf(past, frozenInput(past) ?? (await inputOf(past)), paid, await paidBefore(past, week, tx)),
    ),
  );
  return settled.flat();
}

/** Lines of a past week whose customers paid after it and before this one: settled by then. */
async function paidBefore(past: PayWeek, week: PayWeek, tx?: Transaction): Promise<Set<string>> {
  const rows = await select<{ id: string }>(
    `SELECT l.id FROM jobs_paid jp JOIN job_lines l ON l.job_id = jp.job_id
      WHERE l.finished_at >= :startsAt AND l.finished_at < :endsAt AND jp.paid_at >= :endsAt AND jp.paid_at < :before`,
    {
      startsAt: past.startsAt.toISOString(),
      endsAt: past.endsAt.toISOString(),
      before: week.startsAt.toISOString(),
    },
    tx,
  );
  return new Set(rows.map((row) => row.id));
}

function settlementsOf(
  past: PayWeek,
  input: PayWeekInput,
  paid: ReadonlySet<string>,
  before: ReadonlySet<string>,
): SettledCommission[] {
  const lines = input.doneLines.filter((line) => line.commissionWaits && paid.has(line.lineId));
  const doneLines = input.doneLines.map((line) => (before.has(line.lineId) ? paidFor(line) : line));
  return input.people.flatMap(({ id }) => {
    const own = lines.filter((line) => line.crew.some((member) => member.personId === id));
    if (own.length === 0) return [];
    return [
      {
        personId: id,
        startsOn: past.startsOn,
        number: weekNumberOf(past.startsOn),
        input: onlyOf({ ...input, doneLines }, id),
        lineIds: own.map((line) => line.lineId),
      },
    ];
  });
}

/** What one person's week is worked out from; nobody else's hours, rates or plans go along. */
function onlyOf({ settledCommissions: _, ...input }: PayWeekInput, id: string): PayWeekInput {
  const own = <T extends { personId: string | null }>(list: readonly T[]) =>
    list.filter((item) => item.personId === id || item.personId === null);
  return {
    ...input,
    people: input.people.filter((person) => person.id === id),
    entries: own(input.entries),
    rates: own(input.rates),
    doneLines: input.doneLines.filter((line) => line.crew.some((member) => member.personId === id)),
    tips: [],
    adjustments: own(input.adjustments),
    plans: own(input.plans),
    places: own(input.places),
    carried: own(input.carried),
  };
}
