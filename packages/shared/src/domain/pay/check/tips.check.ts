import { z } from 'zod';
import { exact, ONE, ZERO, type Exact } from '../../money/exact.ts';
import { splitByLargestRemainder } from '../../money/largest-remainder.ts';
import { toCents } from '../../money/rounding.ts';
import { dollars } from '../../money/exact.ts';
import { hoursOver } from '../regular-rate.ts';
import { largestTipCredit, leastCardTip, mayShareTips, overtimeCashWage } from '../tip-rules.ts';
import { amountField, flagField, percentField, someOf, weekHoursField } from './fields.ts';
import { jurisdictionField } from './jurisdiction.ts';
import { kindRule, money, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const personField = z.object({
  name: z.string().optional(),
  role: z.string().optional(),
  manager: flagField.optional(),
  is_manager: flagField.optional(),
  supervisor: flagField.optional(),
  ownership_percent: percentField.optional(),
  actively_manages: flagField.optional(),
  hours: weekHoursField.optional(),
});

const shape = z.object({
  jurisdiction: jurisdictionField,
  minimum_wage: amountField.optional(),
  cash_wage: amountField.optional(),
  hours_worked: weekHoursField.optional(),
  overtime_hours: weekHoursField.optional(),
  card_tip: amountField.optional(),
  card_fee_percent: percentField.default(() => ZERO),
  tip_pool: amountField.optional(),
  tips: amountField.optional(),
  crew: someOf(personField).optional(),
  people: someOf(personField).optional(),
});

type Inputs = z.output<typeof shape>;

/** Tip credit, card fees and sharing, as far as the inputs reach. */
export const tips = kindRule(shape, (inputs): CheckResult => {
  const result = { ...credit(inputs), ...cardTip(inputs), ...pool(inputs) };
  if (Object.keys(result).length === 0)
    throw new ScenarioError('Neither cash_wage with minimum_wage, card_tip nor tip_pool with its crew are given.');
  return result;
});

function credit(inputs: Inputs): CheckResult {
  const { minimum_wage: wage, cash_wage: cash, jurisdiction, hours_worked: hours } = inputs;
  if (cash === undefined) return {};
  if (wage === undefined) throw new ScenarioError('minimum_wage is missing.');
  const largest = largestTipCredit(wage, cash, jurisdiction);
  const overtimeRate = overtimeCashWage(wage, largest);
  const result = {
    max_tip_credit: money(largest),
    overtime_rate: rate(wage.mul('3/2')),
    overtime_cash_wage: rate(overtimeRate),
  };
  if (hours === undefined) return result;
  const overtime = inputs.overtime_hours ?? hoursOver(hours);
  if (overtime.gt(hours)) throw new ScenarioError('overtime_hours is more than hours_worked.');
  const straightPay = exact(money(wage.sub(largest).mul(hours.sub(overtime))));
  const overtimePay = exact(money(overtimeRate.mul(overtime)));
  return {
    ...result,
    straight_pay: money(straightPay),
    overtime_pay: money(overtimePay),
    gross_total: money(straightPay.add(overtimePay)),
  };
}

function cardTip(inputs: Inputs): CheckResult {
  if (inputs.card_tip === undefined) return {};
  if (inputs.card_fee_percent.gt(100)) throw new ScenarioError('card_fee_percent is more than 100.');
  return { tip_paid_min: money(leastCardTip(inputs.card_tip, inputs.card_fee_percent, inputs.jurisdiction)) };
}

/** Equal shares, or by hours where each has some; managers, supervisors and managing owners get none. */
function pool(inputs: Inputs): CheckResult {
  const people = inputs.crew ?? inputs.people;
  const total = inputs.tip_pool ?? inputs.tips ?? inputs.card_tip;
  if (people === undefined || total === undefined) return {};
  const eligible = people.map(mayShare);
  const byHours = people.every((person) => person.hours !== undefined);
  const weights: Exact[] = people.map((person, index) =>
    eligible[index] ? (byHours ? (person.hours ?? ZERO) : ONE) : ZERO,
  );
  if (weights.every((weight) => weight.equals(ZERO))) throw new ScenarioError('Nobody listed may share the tips.');
  return {
    shares: splitByLargestRemainder(toCents(total), weights).map((cents) => money(dollars(cents))),
    may_share: eligible,
  };
}

function mayShare(person: z.output<typeof personField>): boolean {
  const isManager =
    person.manager ?? person.is_manager ?? person.supervisor ?? /manager|supervisor/.test(person.role ?? '');
  const isOwner = /owner/.test(person.role ?? '');
  return mayShareTips({
    isManagerByDuties: isManager,
    ownership: person.ownership_percent ?? (isOwner ? exact(100) : ZERO),
    activelyManages: person.actively_manages ?? isOwner,
  });
}
