import type { Transaction } from 'sequelize';
import { tag } from '@driprail/shared/authz/ability';
import type { TimeOffBalanceDto } from '@driprail/shared/contracts/time-off.contract';
import { computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import type { LedgerWeek, TimeOffWeek } from '@driprail/shared/domain/pay/time-off/time-off-ledger';
import { timeOffRuleOn, timeOffRuleWords } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { addDays } from '@driprail/shared/domain/time/zone';
import { authorize } from '../../../authz/authorize.ts';
import { todayOf } from '../../../db/company.ts';
import { Person } from '../../../db/models/index.ts';
import type { PayWeek } from '../../../db/models/index.ts';
import { inTransaction } from '../../../db/sequelize.ts';
import type { Ctx } from '../../../http/context.ts';
import { notFound } from '../../../http/errors.ts';
import { payInputOf } from '../pay-input.queries.ts';
import { weekAt } from '../weeks.service.ts';
import { ledgerRecords, ledgersOf } from './ledger-records.queries.ts';
import type { LedgerRecords } from './ledger-records.queries.ts';

/** Weeks since the last locked one that are worked out for what they would earn. */
const OPEN_WEEKS_AT_MOST = 8;

export interface PersonBalances {
  personId: string;
  name: string;
  balances: TimeOffBalanceDto[];
}

/** @throws 403 for another person's balances, except to the owner */
export function readBalances(ctx: Ctx, personId: string): Promise<PersonBalances> {
  authorize(ctx.ability, 'read', tag('TimeOffBalance', { personId }));
  return inTransaction((tx) => balancesOf(personId, ctx.now(), tx));
}

/** A person's balances by kind as the records stand; kinds without a rule and without moves are left out. */
export async function balancesOf(personId: string, now: Date, tx: Transaction): Promise<PersonBalances> {
  const person = await Person.findByPk(personId, { transaction: tx });
  if (!person) throw notFound('That person');
  const today = await todayOf(now, tx);
  const records = await ledgerRecords([personId], tx);
  const current = await weekAt(today, tx);
  const through = lastOf(records, current.startsOn);
  const bare = current.state === 'locked' ? [] : [{ ...boundsOf(current), hoursWorked: '0' }];
  const known = ledgersOf(records, personId, bare, through);
  const hoped = ledgersOf(records, personId, await openWeeks(records, personId, current, now, tx), through);
  const balances = known.flatMap(({ kind, weeks }, index) => {
    const dated = timeOffRuleOn(records.rules, { kind, personId }, current.endsOn);
    if (dated === null && weeks.every(({ moves }) => moves.length === 0)) return [];
    return {
      kind,
      ruleWords: dated === null ? null : timeOffRuleWords(dated.rule),
      balance: balanceText(weeks),
      expected: balanceText(hoped[index]?.weeks ?? []),
      weeks: weeks.filter(({ moves }) => moves.length > 0).map((week) => shownWeek(week, records)),
    };
  });
  return { personId, name: person.name, balances };
}

/** First day of the last week that holds anything, at least the one that holds today. */
export function lastOf({ weeks }: LedgerRecords, current: string): string {
  const last = weeks.at(-1)?.startsOn ?? current;
  return last > current ? last : current;
}

export function boundsOf({ startsOn, endsOn }: PayWeek): Omit<LedgerWeek, 'hoursWorked'> {
  return { startsOn, endsOn };
}

function balanceText(weeks: readonly TimeOffWeek[]): string {
  return weeks.at(-1)?.balance ?? '0';
}

function shownWeek(week: TimeOffWeek, { weeks }: LedgerRecords): TimeOffBalanceDto['weeks'][number] {
  const isLocked = weeks.some((stored) => stored.startsOn === week.startsOn && stored.isLocked);
  const moves = week.moves.map(({ on, kind, hours, balance, note }) => ({ on, kind, hours, balance, note }));
  return { ...week, isLocked, moves };
}

/** The weeks after the last locked one to this one, with the hours that their records come to now. */
async function openWeeks(
  { weeks, rules }: LedgerRecords,
  personId: string,
  current: PayWeek,
  now: Date,
  tx: Transaction,
): Promise<LedgerWeek[]> {
  const earns = rules.some(({ rule }) => rule.earning.by === 'hours_worked');
  const lastLocked = weeks.findLast((week) => week.isLocked)?.startsOn ?? addDays(current.startsOn, -7);
  const open: LedgerWeek[] = [];
  for (let n = 1; n <= OPEN_WEEKS_AT_MOST; n += 1) {
    const day = addDays(lastLocked, 7 * n);
    if (day > current.startsOn) break;
    const week = await weekAt(day, tx);
    const people = earns ? computePayWeek(await payInputOf(week, now, tx)).people : [];
    const hoursWorked = people.find((person) => person.personId === personId)?.hoursWorked ?? '0';
    open.push({ ...boundsOf(week), hoursWorked });
  }
  return open;
}
