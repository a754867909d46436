import { z } from 'zod';
import { exact, sum, ZERO, type Exact } from '../../money/exact.ts';
import { pieceRestPay } from '../piece-rest.ts';
import { amountField, minutesField, weekHoursField } from './fields.ts';
import { hoursText, kindRule, money, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const shape = z.object({
  piece_pay: amountField,
  hourly_pay: amountField.default(() => ZERO),
  hourly_rate: amountField.optional(),
  other_pay: amountField.default(() => ZERO),
  overtime_premium: amountField.default(() => ZERO),
  hours_worked: weekHoursField,
  rest_minutes: minutesField,
  nonproductive_minutes: minutesField.default(() => ZERO),
  rest_minutes_on_hourly_days: minutesField.optional(),
  minimum_wage: amountField.default(() => ZERO),
});

type Inputs = z.output<typeof shape>;

/**
 * California's rest pay for piece workers. Amounts come from the exact minutes; `compensation_less_rest` alone is
 * shown as the state's own examples print it, with rest time to the hundredth of an hour, and exactly under `exact`.
 */
export const caPieceRest = kindRule(shape, (inputs): CheckResult => {
  const restHours = inputs.rest_minutes.div(60);
  if (restHours.gte(inputs.hours_worked)) throw new ScenarioError('rest_minutes is as long as the hours worked.');
  if (inputs.nonproductive_minutes.gt(0) && inputs.minimum_wage.lte(0)) {
    throw new ScenarioError('minimum_wage is missing: other nonproductive time is paid at least that.');
  }
  const restHoursPaid = paidRestMinutes(inputs).div(60);
  const restRatePaid = inputs.hourly_rate ?? ZERO;
  const nonproductivePay = exact(money(inputs.minimum_wage.mul(inputs.nonproductive_minutes).div(60)));
  const pay = sum([inputs.hourly_pay, inputs.other_pay, nonproductivePay]);
  const week = pieceRestPay({
    piecePay: inputs.piece_pay,
    otherPay: pay,
    hours: inputs.hours_worked,
    restHours,
    restHoursPaid,
    restRatePaid,
    minimumWage: inputs.minimum_wage,
  });
  const due = exact(money(week.restDue));
  const printedRest = restRatePaid.mul(exact(hoursText(restHoursPaid)));
  return {
    rest_hours: hoursText(restHours),
    divisor_hours: hoursText(week.divisorHours),
    compensation_less_rest: money(inputs.piece_pay.add(pay).sub(printedRest)),
    average_rate: rate(week.averageRate),
    rest_rate: rate(week.restRate),
    rest_rate_top_up: rate(week.restRate.sub(restHoursPaid.gt(0) ? restRatePaid : ZERO)),
    rest_pay: money(week.restPay),
    rest_pay_due: money(due),
    nonproductive_pay: money(nonproductivePay),
    gross_total: money(sum([inputs.piece_pay, pay, inputs.overtime_premium, due])),
    exact: { compensation_less_rest: money(week.compensationLessRest), average_rate: rate(week.averageRate) },
  };
});

/** Rest minutes that hourly pay already covers: those stated, or all when the hourly pay covers every hour. */
function paidRestMinutes(inputs: Inputs): Exact {
  const {
    rest_minutes_on_hourly_days: stated,
    hourly_rate: hourly,
    hourly_pay: pay,
    rest_minutes: rest,
    hours_worked: hours,
  } = inputs;
  if (stated?.gt(rest)) throw new ScenarioError('rest_minutes_on_hourly_days is more than rest_minutes.');
  if (stated !== undefined) {
    if (stated.gt(0) && hourly === undefined)
      throw new ScenarioError('hourly_rate is missing: rest_minutes_on_hourly_days were paid at some rate.');
    return stated;
  }
  return hourly !== undefined && hourly.gt(0) && hourly.mul(hours).equals(pay) ? rest : ZERO;
}
