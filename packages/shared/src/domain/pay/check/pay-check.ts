import { z } from 'zod';
import { flatSumBonus, notCreditable, percentageBonus } from './bonus.check.ts';
import { deductionCap, minimumWageTest } from './deductions.check.ts';
import { deferredAllocation } from './deferred.check.ts';
import { exemption7i } from './exemption.check.ts';
import { hoursWorked } from './hours.check.ts';
import { ScenarioError, type CheckResult, type KindRule } from './kind-rule.ts';
import { caPieceRest } from './piece-rest.check.ts';
import { rateInEffect } from './rate-in-effect.check.ts';
import { roundingTime } from './rounding.check.ts';
import { salaryRate } from './salary.check.ts';
import { taskDays } from './task.check.ts';
import { tips } from './tips.check.ts';
import { weekPay } from './week-pay.check.ts';
import { dailyOvertime, dailyOvertimeGate, workweekHours } from './workweek.check.ts';

const KINDS: Record<string, KindRule> = {
  week_pay: weekPay,
  salary_rate: salaryRate,
  salary_short_week: salaryRate,
  deferred_allocation: deferredAllocation,
  percentage_bonus: percentageBonus,
  workweek_hours: workweekHours,
  hours: hoursWorked,
  rounding_time: roundingTime,
  deduction_cap: deductionCap,
  minimum_wage_test: minimumWageTest,
  tips,
  exemption_7i: exemption7i,
  not_creditable: notCreditable,
  daily_overtime: dailyOvertime,
  overlap: dailyOvertime,
  task_pay: taskDays,
  daily_overtime_gate: dailyOvertimeGate,
  ca_piece_rest: caPieceRest,
  ca_flat_bonus: flatSumBonus,
  rate_in_effect: rateInEffect,
};

const scenarioShape = z.object(
  {
    id: z.union([z.string(), z.number()], { error: 'needs an id' }).transform(String),
    kind: z.string({ error: 'needs a kind' }),
    inputs: z.record(z.string(), z.unknown(), { error: 'needs inputs' }),
  },
  { error: 'is no object of id, kind and inputs' },
);

export type CheckAnswer = { id: string; result: CheckResult } | { id: string; error: string };

/**
 * Works out pay scenarios with the engine's own rules, one answer for each in the same order. Money and hours have two
 * places, rates four, rounded half up from exact fractions.
 * @returns an error instead of a result for inputs that make no sense
 */
export function checkPay(scenarios: readonly unknown[]): CheckAnswer[] {
  return scenarios.map((scenario, index) => {
    const read = scenarioShape.safeParse(scenario);
    if (!read.success)
      return { id: idOf(scenario, index), error: `The scenario ${read.error.issues[0]?.message ?? 'makes no sense'}.` };
    const { id, kind, inputs } = read.data;
    const rule = Object.hasOwn(KINDS, kind) ? KINDS[kind] : undefined;
    if (!rule) return { id, error: `The kind "${kind}" is not known; known are ${Object.keys(KINDS).join(', ')}.` };
    return answer(id, rule, inputs);
  });
}

function answer(id: string, rule: KindRule, inputs: unknown): CheckAnswer {
  try {
    return { id, result: rule(inputs) };
  } catch (error) {
    if (error instanceof ScenarioError) return { id, error: error.message };
    // One scenario never stops the others; what was not foreseen is said as it is.
    return {
      id,
      error: `The inputs could not be worked out (${error instanceof Error ? error.message : 'unknown reason'}).`,
    };
  }
}

function idOf(scenario: unknown, index: number): string {
  const id = typeof scenario === 'object' && scenario !== null && 'id' in scenario ? scenario.id : undefined;
  return typeof id === 'string' || typeof id === 'number' ? String(id) : `#${index + 1}`;
}
