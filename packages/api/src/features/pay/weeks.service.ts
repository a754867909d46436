import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { PayWeekHead } from '@driprail/shared/contracts/pay.contract';
import { workweekOf } from '@driprail/shared/domain/time/workweek';
import type { Workweek, WorkweekRule } from '@driprail/shared/domain/time/workweek';
import { weekNumberOf } from '@driprail/shared/domain/time/zone';
import { companyOf } from '../../db/company.ts';
import { PayRuleSet, PayWeek } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { unprocessable } from '../../http/errors.ts';

/** The rules in force on a day; before the first ones, the first ones. */
export async function rulesOn(day: string, tx?: Transaction): Promise<PayRuleSet> {
  const all = await PayRuleSet.findAll({ order: [['startsOn', 'DESC']], transaction: tx ?? null });
  const rules = all.find((r) => r.startsOn <= day) ?? all.at(-1);
  if (!rules) throw unprocessable('no_rules', 'Set the pay rules first, under Settings.');
  return rules;
}

export async function workweekRuleOn(day: string, tx?: Transaction): Promise<WorkweekRule> {
  const { zone } = await companyOf(tx);
  const rules = await rulesOn(day, tx);
  return { startsOn: rules.workweekStartsOn, startsAt: rules.workweekStartsAt, zone };
}

/** The week that holds a day, to be looked at: one that nobody touched yet is worked out and not stored. */
export async function weekAt(day: string, tx?: Transaction): Promise<PayWeek> {
  const week = workweekOf(day, await workweekRuleOn(day, tx));
  const known = await PayWeek.findOne({ where: { startsOn: week.startsOn }, transaction: tx ?? null });
  return known ?? untouched(week);
}

/** The stored week that holds a day, to be written to; made when it is first touched, its bounds kept as instants. */
export async function weekOf(day: string, tx: Transaction): Promise<PayWeek> {
  const week = await weekAt(day, tx);
  if (!week.isNewRecord) return week;
  await insertWeek(week, tx);
  return PayWeek.findOne({ where: { startsOn: week.startsOn }, transaction: tx, rejectOnEmpty: true });
}

function untouched({ startsOn, endsOn, startsAt, endsAt }: Workweek): PayWeek {
  const bounds = { startsAt: new Date(startsAt), endsAt: new Date(endsAt) };
  return PayWeek.build({
    ...{ id: uuid(), startsOn, endsOn, ...bounds, state: 'draft', version: 0 },
    ...{
      checkedAt: null,
      checkedBy: null,
      lockedAt: null,
      lockedBy: null,
      engineVersion: null,
      snapshot: null,
      lastChecked: null,
    },
  });
}

/** Two who open a new week at once make it once. */
async function insertWeek({ id, startsOn, endsOn, startsAt, endsAt }: PayWeek, tx: Transaction): Promise<void> {
  await select(
    `INSERT INTO pay_weeks (id, starts_on, ends_on, starts_at, ends_at) VALUES (:id, :startsOn, :endsOn, :startsAt, :endsAt)
     ON CONFLICT (starts_on) DO NOTHING`,
    { id, startsOn, endsOn, startsAt, endsAt },
    tx,
  );
}

export async function headOf(week: PayWeek, tx?: Transaction): Promise<PayWeekHead> {
  const names = await select<{ id: string; name: string }>('SELECT id, name FROM users', {}, tx);
  const name = (id: string | null) => names.find((user) => user.id === id)?.name ?? null;
  return {
    id: week.isNewRecord ? null : week.id,
    startsOn: week.startsOn,
    endsOn: week.endsOn,
    startsAt: week.startsAt.toISOString(),
    endsAt: week.endsAt.toISOString(),
    number: weekNumberOf(week.startsOn),
    state: week.state,
    checkedAt: week.checkedAt?.toISOString() ?? null,
    checkedBy: name(week.checkedBy),
    lockedAt: week.lockedAt?.toISOString() ?? null,
    lockedBy: name(week.lockedBy),
    version: week.version,
  };
}
