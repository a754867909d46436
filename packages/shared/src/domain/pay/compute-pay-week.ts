import { dollars, exact, fractionText, greatest, hoursOf, ZERO, type Exact } from '../money/exact.ts';
import { toCentsDown } from '../money/rounding.ts';
import { additionLines, takingLines } from './adjustment-lines.ts';
import { deductionRoom } from './deductions.ts';
import { hourlyPay } from './hourly-pay.ts';
import { jobLinePay } from './job-line-pay.ts';
import { makeUpLine } from './make-up-line.ts';
import { countEntries } from './meal-breaks.ts';
import { totalCents } from './pay-line.ts';
import { clocklessJobWarnings, entryWarnings, minimumWageWarning, unpaidHoursWarning } from './pay-warnings.ts';
import type { PayLine, PayPerson, PayWeekInput, PayWeekResult, PersonWeek } from './pay-week.types.ts';
import { premiumLine } from './premium-line.ts';
import { regularRate } from './regular-rate.ts';
import { tipLines } from './tip-lines.ts';
import { weekGroups, type PersonInput } from './week-groups.ts';
import { weekPremium, type WeekPremium } from './week-premium.ts';
import { weekTotals } from './week-totals.ts';
import { secondsByDay } from './working-words.ts';
import { cutIntoDays, weekGrid, type WeekGrid, type WorkSpan } from './work-spans.ts';

/** Stored with every locked week; changed whenever the same input would give another result. */
export const ENGINE_VERSION = '2';

/**
 * Works out one workweek for everyone. Pure and exact: the same input gives the same result, to the byte.
 * Earning lines are rounded half up first and crew shares add up to the cent; the regular rate is the exact quotient of
 * those cents over all hours worked; the overtime premium is rounded once per person.
 * @throws {RangeError} when a rate is not a number or the overtime rule set is unknown
 */
export function computePayWeek(input: PayWeekInput): PayWeekResult {
  const grid = weekGrid(input);
  const groups = weekGroups(input, grid);
  return {
    engineVersion: ENGINE_VERSION,
    people: input.people.map((person) => personWeek(person, groups(person.id), input, grid)),
  };
}

function personWeek(person: PayPerson, own: PersonInput, input: PayWeekInput, grid: WeekGrid): PersonWeek {
  const { rules, zone } = input;
  const minimumWage = exact(rules.minimumWage);
  const { counted, shortMeals } = countEntries(own.entries, grid, rules.mealBreakMinutes);
  const spans = cutIntoDays(counted, grid);
  const hours = hoursOf(spans.reduce((total, span) => total + span.to - span.from, 0));

  const byClock = hourlyPay(person, spans, own.rates);
  const byLine = own.doneLines.flatMap((line) => jobLinePay(person, line, own.rates, rules.crewSplit, zone));
  const additions = additionLines(own.adjustments);
  const earned = [...byClock.lines, ...byLine, ...additions.filter((line) => line.inRegularRate)];
  const makeUp = makeUpLine(person, earned, hours, minimumWage);
  const included = makeUp === null ? earned : [...earned, makeUp];
  const excluded = [
    ...tipLines(person, own.tips, rules.crewSplit, zone),
    ...additions.filter((line) => !line.inRegularRate),
  ];

  const rate = regularRate(dollars(totalCents(included)), hours, minimumWage);
  const premium =
    rate === null
      ? null
      : weekPremium({
          ruleSetKey: rules.overtimeRuleSet,
          rate,
          hoursByWorkday: byWorkday(spans),
          minimumWage,
          bonusCents: totalCents(included.filter((line) => line.kind === 'bonus')),
        });
  const overtime =
    rate === null || premium === null ? null : premiumLine({ person, spans, hours, rate, premium, included, excluded });
  const takings = takingLines(
    person,
    own.adjustments,
    takingRoom(rate, minimumWage, hours, [...included, ...excluded]),
  );
  const lines = [...included, ...(overtime === null ? [] : [overtime]), ...excluded, ...takings.lines];

  return {
    personId: person.id,
    name: person.name,
    hoursByDay: Object.fromEntries(
      [...secondsByDay(spans)].map(([day, seconds]) => [day, fractionText(hoursOf(seconds))]),
    ),
    hoursWorked: fractionText(hours),
    overtimeHours: fractionText(overtimeHours(premium)),
    regularRate: rate === null ? null : fractionText(rate),
    lines,
    warnings: [
      ...entryWarnings(person, own.entries, shortMeals, grid, input),
      ...clocklessJobWarnings(person, own.doneLines, own.entries),
      ...unpaidHoursWarning(person, byClock.unpaidHours),
      ...minimumWageWarning(person, makeUp),
      ...takings.warnings,
    ],
    totals: weekTotals(lines),
  };
}

function byWorkday(spans: readonly WorkSpan[]): Exact[] {
  const seconds = [0, 0, 0, 0, 0, 0, 0];
  for (const span of spans) seconds[span.workday] = (seconds[span.workday] ?? 0) + span.to - span.from;
  return seconds.map(hoursOf);
}

function overtimeHours(premium: WeekPremium | null): Exact {
  return premium === null ? ZERO : premium.split.overtime.add(premium.split.double);
}

/** Whole cents that may be taken: what is above the minimum wage, and pay that is neither minimum wage nor overtime. */
function takingRoom(rate: Exact | null, minimumWage: Exact, hours: Exact, lines: readonly PayLine[]): number {
  const beside = lines.filter((line) => line.kind === 'discretionary_bonus' || line.kind === 'paid_time_off');
  const straight =
    rate === null
      ? dollars(totalCents(lines.filter((line) => line.inRegularRate)))
      : deductionRoom(rate, minimumWage, hours);
  return toCentsDown(greatest(ZERO, straight).add(dollars(totalCents(beside))));
}
