import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { computePayWeek } from '@driprail/shared/domain/pay/compute-pay-week';
import type { PayWeekInput } from '@driprail/shared/domain/pay/pay-week.types';
import { audit } from '../../db/audit.ts';
import { PayLineRow, PayStatement, PayWeek } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { payInputOf } from './pay-input.queries.ts';
import { readPayWeek } from './pay-week.queries.ts';
import { statementTimeOffOf } from './time-off/statement-time-off.queries.ts';
import { mailStatements } from './statement-mails.ts';
import { weekOf } from './weeks.service.ts';

type State = 'draft' | 'checked' | 'locked';

/**
 * Moves a week along: draft, checked, locked; and from checked back to draft. Two owners locking at once lock once.
 * @param baseUrl where the web app answers, for the mails that go out at the lock; without it none does
 * @throws 409 when the week changed meanwhile, 422 when it is not over or something must be settled first
 */
export function setWeekState(ctx: Ctx, day: string, to: State, version: number, baseUrl?: string): Promise<PayWeekDto> {
  return inTransaction(async (tx) => {
    const found = await weekOf(day, tx);
    const week = await PayWeek.findByPk(found.id, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true });
    if (week.state === to)
      throw conflict('stale', `This week is ${to} already.`, await readPayWeek(week, ctx.now(), tx));
    if (week.state === 'locked')
      throw unprocessable('locked_week', 'A locked week never changes. Add a correction to an open week.');
    if (week.version !== version)
      throw conflict(
        'stale',
        'Somebody changed this week meanwhile. Look at it again.',
        await readPayWeek(week, ctx.now(), tx),
      );
    if (to === 'checked') await check(tx, ctx, week);
    else if (to === 'locked') {
      const paid = await lock(tx, ctx, week);
      if (baseUrl) await mailStatements(tx, ctx.now(), week, paid, baseUrl);
    } else
      await week.update(
        { state: 'draft', checkedAt: null, checkedBy: null, version: week.version + 1 },
        { transaction: tx },
      );
    await audit(tx, { userId: ctx.actor.userId, at: ctx.now() }, 'pay_week', week.id, to, { startsOn: week.startsOn });
    return readPayWeek(week, ctx.now(), tx);
  });
}

async function check(tx: Transaction, { actor, now }: Ctx, week: PayWeek): Promise<void> {
  refuseRunning(week, now(), 'checked');
  const result = await compute(tx, week, now());
  refuseUnsettled(result);
  const people = result.people.map(({ personId, name, hoursWorked, totals }) => ({
    ...{ personId, name, hoursWorked, totals },
  }));
  await week.update(
    {
      ...{ state: 'checked', checkedAt: now(), checkedBy: actor.userId, version: week.version + 1 },
      lastChecked: { at: now().toISOString(), people },
    },
    { transaction: tx },
  );
  hintAfterCommit(tx, ['owners'], 'pay', week.id, week.version);
}

/** Freezes lines, summaries and the input they were computed from, and gives who is paid. The triggers refuse every later change. */
async function lock(tx: Transaction, { actor, now }: Ctx, week: PayWeek): Promise<string[]> {
  if (week.state !== 'checked') throw unprocessable('not_checked', 'Mark the week as checked first.');
  refuseRunning(week, now(), 'locked');
  const input = await payInputOf(week, now(), tx);
  await refuseBeforeSettled(input, tx);
  const result = computePayWeek(input);
  refuseUnsettled(result);
  const timeOff = await statementTimeOffOf(week, result.people, tx);
  for (const { lines, ...summary } of result.people) {
    await PayStatement.create(
      {
        payWeekId: week.id,
        personId: summary.personId,
        grossCents: summary.totals.gross,
        summary,
        timeOff: timeOff[summary.personId] ?? [],
      },
      { transaction: tx },
    );
    await PayLineRow.bulkCreate(
      lines.map((line, position) => ({
        id: uuid(),
        payWeekId: week.id,
        personId: line.personId,
        position,
        key: line.key,
        amountCents: line.amountCents,
        isPayable: line.isPayable,
        line,
      })),
      { transaction: tx },
    );
  }
  await week.update(
    {
      state: 'locked',
      lockedAt: now(),
      lockedBy: actor.userId,
      engineVersion: result.engineVersion,
      snapshot: input,
      version: week.version + 1,
    },
    { transaction: tx },
  );
  const personIds = result.people.map((person) => person.personId);
  hintAfterCommit(tx, ['owners', { personIds }], 'pay', week.id, week.version);
  return personIds;
}

async function compute(tx: Transaction, week: PayWeek, now: Date) {
  return computePayWeek(await payInputOf(week, now, tx));
}

/** What customers paid for belongs to weeks whose pay must stand first. */
async function refuseBeforeSettled({ settledCommissions = [] }: PayWeekInput, tx: Transaction): Promise<void> {
  for (const { startsOn, number } of settledCommissions) {
    const past = await PayWeek.findOne({ where: { startsOn, state: 'locked' }, transaction: tx });
    if (past) continue;
    throw unprocessable('earlier_open', `Lock week ${number} first: customers paid for its work in this week.`);
  }
}

function refuseRunning(week: PayWeek, now: Date, what: string): void {
  if (now < week.endsAt) throw unprocessable('running', `This week still runs. It can be ${what} once it is over.`);
}

function refuseUnsettled({ people }: ReturnType<typeof computePayWeek>): void {
  const open = people.flatMap((person) => person.warnings.filter((warning) => warning.isBlocking));
  if (open[0]) {
    const more = open.length > 1 ? ` And ${open.length - 1} more.` : '';
    throw unprocessable('unsettled', `Settle this first: ${open[0].message}${more}`);
  }
}
