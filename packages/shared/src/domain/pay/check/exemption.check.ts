import { z } from 'zod';
import { sum, ZERO, type Exact } from '../../money/exact.ts';
import { exemptionThreshold, passesRateTest, passesShareTest } from '../commission-exemption.ts';
import { amountField, flagField, positiveField, someOf, weekHoursField } from './fields.ts';
import { kindRule, rate, ScenarioError, type CheckResult } from './kind-rule.ts';

const periodField = z
  .object({
    commissions: amountField,
    other_pay: amountField.optional(),
    total_pay: amountField.optional(),
    hourly_pay: amountField.optional(),
    salary: amountField.optional(),
  })
  .transform(({ commissions, other_pay, total_pay, hourly_pay, salary }, ctx) => {
    const other = other_pay ?? total_pay?.sub(commissions) ?? sum([hourly_pay ?? ZERO, salary ?? ZERO]);
    if (other.lt(0)) ctx.addIssue({ code: 'custom', message: 'has more commissions than pay in all' });
    return { commissions, other };
  });

const shape = z.object({
  minimum_wage: positiveField.optional(),
  regular_rates: someOf(amountField).optional(),
  regular_rate: amountField.optional(),
  weekly_pay: amountField.optional(),
  hours_worked: weekHoursField.optional(),
  periods: someOf(periodField).optional(),
  commissions: amountField.optional(),
  other_pay: amountField.optional(),
  retail_or_service_establishment: flagField.optional(),
});

type Inputs = z.output<typeof shape>;

/** The three tests of the commission exemption, as far as the inputs reach. It informs; it never applies itself. */
export const exemption7i = kindRule(shape, (inputs): CheckResult => {
  const rateTest = rates(inputs);
  const shareTest = shares(inputs);
  if (rateTest === undefined && shareTest === undefined)
    throw new ScenarioError('Neither regular_rates with minimum_wage nor periods are given.');
  const retail = inputs.retail_or_service_establishment;
  const isExempt =
    retail === undefined || rateTest === undefined || shareTest === undefined
      ? undefined
      : retail && all(rateTest) && all(shareTest);
  return {
    ...(inputs.minimum_wage === undefined ? {} : { threshold: rate(exemptionThreshold(inputs.minimum_wage)) }),
    ...(rateTest === undefined ? {} : { rate_test_met: rateTest }),
    ...(shareTest === undefined ? {} : { share_test_met: shareTest }),
    ...(isExempt === undefined ? {} : { exempt: isExempt }),
  };
});

function rates(inputs: Inputs): boolean[] | boolean | undefined {
  const { minimum_wage: wage, regular_rates, regular_rate, weekly_pay, hours_worked } = inputs;
  const derived = weekly_pay !== undefined && hours_worked?.gt(0) ? weekly_pay.div(hours_worked) : undefined;
  const one: Exact | undefined = regular_rate ?? derived;
  if (regular_rates === undefined && one === undefined) return undefined;
  if (wage === undefined) throw new ScenarioError('minimum_wage is missing.');
  return regular_rates?.map((value) => passesRateTest(value, wage)) ?? (one !== undefined && passesRateTest(one, wage));
}

function shares(inputs: Inputs): boolean[] | boolean | undefined {
  if (inputs.periods) return inputs.periods.map((period) => passesShareTest(period.commissions, period.other));
  if (inputs.commissions === undefined) return undefined;
  return passesShareTest(inputs.commissions, inputs.other_pay ?? ZERO);
}

function all(test: boolean[] | boolean): boolean {
  return Array.isArray(test) ? test.every(Boolean) : test;
}
