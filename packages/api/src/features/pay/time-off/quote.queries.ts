import type { Transaction } from 'sequelize';
import { Op } from 'sequelize';
import type { TimeOffQuote } from '@driprail/shared/contracts/time-off.contract';
import { exact, fractionText, type Exact } from '@driprail/shared/domain/money/exact';
import { decimalText } from '@driprail/shared/domain/money/rounding';
import type { DatedRate } from '@driprail/shared/domain/pay/pay-week.types';
import { hourlyRateInForce } from '@driprail/shared/domain/pay/time-off/hourly-rate-in-force';
import type { HourlyRate } from '@driprail/shared/domain/pay/time-off/hourly-rate-in-force';
import { lowestBalance, timeOffBalance } from '@driprail/shared/domain/pay/time-off/time-off-ledger';
import { timeOffCents } from '@driprail/shared/domain/pay/time-off/time-off-pay';
import { timeOffKindNames, timeOffRuleOn, timeOffRuleWords } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import type { DatedTimeOffRule, TimeOffKind } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { formatDate, formatDay, formatMinutes } from '@driprail/shared/domain/time/format';
import { PayPlanRow, PayRate, Person, TimeOff } from '../../../db/models/index.ts';
import type { PayWeek } from '../../../db/models/index.ts';
import { inTransaction } from '../../../db/sequelize.ts';
import { notFound, unprocessable } from '../../../http/errors.ts';
import { refuseLocked } from '../adjustments.service.ts';
import { weekAt } from '../weeks.service.ts';
import { boundsOf, lastOf } from './balances.queries.ts';
import { ledgerRecords, ledgersOf } from './ledger-records.queries.ts';

export interface TakingFields {
  personId: string;
  kind: TimeOffKind;
  /** Decimal hours. */
  hours: string;
  on: string;
}

export interface Quote extends TimeOffQuote {
  ruleId: string;
}

/** What hours off would pay and leave. @throws as `quoteOf` */
export function quoteTimeOff(day: string, taking: TakingFields): Promise<TimeOffQuote> {
  return inTransaction(async (tx) => {
    const week = await weekAt(day, tx);
    refuseLocked(week);
    return quoteOf(week, taking, tx);
  });
}

/**
 * The rule's rate, the amount, and the balance before and after, with what must be accepted with a reason.
 * @throws 404, 422 at the field `on` outside the week, at `kind` without a rule or an hourly rate
 */
export async function quoteOf(week: PayWeek, taking: TakingFields, tx: Transaction): Promise<Quote> {
  const { personId, kind, on } = taking;
  const person = await Person.findByPk(personId, { transaction: tx });
  if (!person) throw notFound('That person');
  refuseOtherWeek(week, on);
  const hours = fractionText(exact(taking.hours));
  const records = await ledgerRecords([personId], tx);
  const dated = timeOffRuleOn(records.rules, { kind, personId }, on);
  if (dated === null)
    refuseAt('kind', `No rule for ${words(kind)} hours is in force on ${formatDate(on)}. Set one first.`);
  const rate = await rateOf(dated, week, taking, tx);

  const open = week.state === 'locked' ? [] : [{ ...boundsOf(week), hoursWorked: '0' }];
  const through = lastOf(records, week.startsOn);
  const move = { id: 'this one', personId, kind, on, hours, reason: '' };
  const [before, after] = [[], [move]].map(
    (more) => ledgersOf(records, personId, open, through, more).find((own) => own.kind === kind)?.weeks ?? [],
  );
  const left = lowestBalance(after ?? [], on);
  return {
    ...{ hours, rate: rate.value, rateWords: rate.note, ruleWords: timeOffRuleWords(dated.rule), ruleId: dated.id },
    amountCents: timeOffCents({ hours, rate: rate.value }),
    balance: fractionText(timeOffBalance(before ?? [])),
    balanceAfter: fractionText(timeOffBalance(after ?? [])),
    dayAway: await dayAwayNote(personId, on, tx),
    warnings: [
      ...(left.lt(0)
        ? [
            {
              code: 'over_balance' as const,
              message: `${person.name} has ${lengthOf(timeOffBalance(before ?? []))} of ${words(kind)} time; this is ${lengthOf(left.neg())} more.`,
            },
          ]
        : []),
      ...(rate.isPaidWhole
        ? [
            {
              code: 'paid_already' as const,
              message: `${person.name} is paid a salary or a day rate, which may cover this day already.`,
            },
          ]
        : []),
    ],
  };
}

/** "7 h 50", minutes half up. */
function lengthOf(hours: Exact): string {
  return formatMinutes(Number(decimalText(hours.mul(60), 0)));
}

function words(kind: TimeOffKind): string {
  return timeOffKindNames[kind].toLowerCase();
}

function refuseOtherWeek({ startsOn, endsOn }: PayWeek, on: string): void {
  if (on >= startsOn && on <= endsOn) return;
  refuseAt('on', `Choose a day of this pay week, ${formatDay(startsOn)} to ${formatDay(endsOn)}.`);
}

async function rateOf(
  { rule }: DatedTimeOffRule,
  week: PayWeek,
  { personId, on }: TakingFields,
  tx: Transaction,
): Promise<Pick<HourlyRate, 'value' | 'note' | 'isPaidWhole'>> {
  const options = { where: { personId: { [Op.or]: [personId, null] } }, transaction: tx };
  const rates = (await PayRate.findAll(options)).map((row): DatedRate => row.get());
  const plans = (await PayPlanRow.findAll({ where: { personId }, transaction: tx })).map((row) => row.get());
  const hourly = hourlyRateInForce({ personId, weekStartsOn: week.startsOn, on, rates, plans });
  if (rule.pays.by === 'fixed')
    return {
      value: rule.pays.dollars,
      note: 'The fixed amount of the rule',
      isPaidWhole: hourly?.isPaidWhole ?? false,
    };
  if (hourly) return hourly;
  return refuseAt(
    'kind',
    'No hourly rate is in force on this day. Set one under Rates & rules, or give the rule a fixed amount an hour.',
  );
}

async function dayAwayNote(personId: string, on: string, tx: Transaction): Promise<string | null> {
  const away = await TimeOff.findOne({
    where: { personId, startsOn: { [Op.lte]: on }, endsOn: { [Op.gte]: on } },
    transaction: tx,
  });
  return away ? away.note : null;
}

function refuseAt(field: string, message: string): never {
  throw unprocessable('time_off', message, { fields: { [field]: message } });
}
