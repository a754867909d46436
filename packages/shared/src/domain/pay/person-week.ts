import { dollars, exact, fractionText, greatest, hoursOf, ZERO, type Exact } from '../money/exact.ts';
import { toCentsDown } from '../money/rounding.ts';
import { additionLines, refundLines, takingLines, type Takings } from './adjustment-lines.ts';
import { deductionRoom } from './deductions.ts';
import { settledCommissionLines } from './deferred/settled-commission.ts';
import { waitingCommission } from './deferred/waiting-commission.ts';
import { datedPrice, hourlyPay } from './hourly-pay.ts';
import { jobLinePay } from './job-line-pay.ts';
import { makeUpLine } from './make-up-line.ts';
import { countEntries } from './meal-breaks.ts';
import type { OvertimeRuleSet } from './overtime-rule-sets.ts';
import { totalCents } from './pay-line.ts';
import { clocklessJobWarnings, entryWarnings, minimumWageWarning, unpaidHoursWarning } from './pay-warnings.ts';
import type { DoneLine, PayLine, PayPerson, PayWeekInput, PersonWeek } from './pay-week.types.ts';
import { placeRules, type PlaceRules } from './place-rules.ts';
import { planInForce } from './plans/pay-plan.ts';
import { percentageOfTotal } from './plans/plan-extras.ts';
import { planPay } from './plans/plan-pay.ts';
import type { BasePay, PlanWeek } from './plans/plan-week.ts';
import { monthSettlement } from './plans/tiered-commission.ts';
import { premiumLine } from './premium-line.ts';
import { roundPunches } from './punch-rounding.ts';
import { regularRate } from './regular-rate.ts';
import { restPayLine } from './rest-pay-line.ts';
import { shortDayLines, tripLines } from './time-off/week-lines.ts';
import { rateInEffectPremium } from './rate-in-effect-premium.ts';
import { tipLines, type TipTerms } from './tip-lines.ts';
import type { PersonInput } from './week-groups.ts';
import { weekPremium, type WeekPremium } from './week-premium.ts';
import { weekTotals } from './week-totals.ts';
import { secondsByDay } from './working-words.ts';
import { cutIntoDays, type WeekGrid, type WorkSpan } from './work-spans.ts';

/** What is the same for everybody in a week. */
export interface SharedWeek {
  input: PayWeekInput;
  grid: WeekGrid;
  /** Company-zone date of the first day. */
  startsOn: string;
  /** Whether the next workweek ends in another month. */
  settles: boolean;
  /** Works out another week for one person, as this one is. */
  weekOf: (input: PayWeekInput, personId: string) => PersonWeek | undefined;
}

/** One person's week in the order a person would work it by hand: hours, earnings, minimum wage, rate, overtime. */
export function personWeek(person: PayPerson, own: PersonInput, shared: SharedWeek): PersonWeek {
  const { input, grid } = shared;
  const { rules, zone } = input;
  const { punchRoundingMinutes } = rules;
  const punches = punchRoundingMinutes === null ? own.entries : roundPunches(own.entries, punchRoundingMinutes, zone);
  const { counted, shortMeals } = countEntries(punches, grid, rules.mealBreakMinutes);
  const spans = cutIntoDays(counted, grid);
  const hours = hoursOf(spans.reduce((total, span) => total + span.to - span.from, 0));
  const place = placeRules(rules, own.place, spans);
  const { ruleSet, minimumWage } = place;

  const plan = planWeek(person, own, spans, hours, place, shared);
  const base = plan === null ? ratePay(person, own, spans, input) : planPay(plan);
  const payOf = (doneLines: DoneLine[]) =>
    plan === null ? ratePay(person, { ...own, doneLines }, spans, input).lines : planPay({ ...plan, doneLines }).lines;
  const waiting = waitingCommission(own.doneLines, base.lines, payOf);
  const refunds = refundsOf(person, own, base.lines, payOf);
  const additions = additionLines(own.adjustments);
  const rest = ruleSet.paysPieceRest ? restPayLine(person, spans, base.lines, base.restPaid, minimumWage) : [];
  const trips = tripLines(person, own, input);
  const earned = [
    ...base.lines,
    ...refunds.lines,
    ...trips,
    ...rest,
    ...additions.filter((line) => line.inRegularRate),
  ];
  const makeUp = makeUpLine(person, earned, hours, minimumWage);
  const included = makeUp === null ? earned : [...earned, makeUp];

  const rate = regularRate(dollars(totalCents(included)).sub(base.notWorked), hours, minimumWage);
  const average =
    rate === null
      ? null
      : weekPremium({
          place: ruleSet,
          rate,
          hoursByWorkday: byWorkday(spans),
          minimumWage,
          bonusCents: totalCents(included.filter((line) => line.kind === 'bonus')),
        });
  const isAgreed = own.hasRateInEffect && plan === null && ruleSet.key === 'us_federal';
  const premium =
    average !== null && isAgreed
      ? rateInEffectPremium({
          ...{ average, spans, included, hours, minimumWage },
          priceOf: datedPrice(person, own.rates, own.doneLines),
        })
      : average;
  const carries = carriesOf(base, premium);
  const settled = plan === null || carries === null ? [] : settlementOf(plan, carries, shared.startsOn);
  const excluded = [
    ...settled,
    ...own.settledCommissions.flatMap((one) => settledCommissionLines(person, one, shared.weekOf)),
    ...tipLines(person, own.tips, tipTerms(input, ruleSet)),
    ...additions.filter((line) => !line.inRegularRate),
    ...shortDayLines(person, own, { ...shared, spans, minimumWage }),
  ];
  const overtime =
    rate === null || premium === null
      ? []
      : premiumLine({
          ...{ person, spans, hours, rate, premium, included, excluded },
          rounding: rules.premiumRounding,
          notWorked: base.notWorked,
        });
  const beside = plan === null ? [] : percentageOfTotal(plan, [...included, ...overtime]);
  const room = takingRoom(rate, minimumWage, hours, [...included, ...excluded]);
  const takings = takingLines(person, own.adjustments, room);
  const lines = [...included, ...overtime, ...beside, ...excluded, ...takings.lines];

  return {
    personId: person.id,
    name: person.name,
    hoursByDay: Object.fromEntries(
      [...secondsByDay(spans)].map(([day, seconds]) => [day, fractionText(hoursOf(seconds))]),
    ),
    hoursWorked: fractionText(hours),
    overtimeHours: fractionText(premium === null ? ZERO : premium.split.overtime.add(premium.split.double)),
    regularRate: rate === null ? null : fractionText(rate),
    lines,
    warnings: [
      ...entryWarnings(person, own.entries, shortMeals, grid, input),
      ...clocklessJobWarnings(person, own.doneLines, own.entries),
      ...unpaidHoursWarning(person, base.unpaidHours),
      ...minimumWageWarning(person, makeUp),
      ...refunds.warnings,
      ...takings.warnings,
    ],
    ...(waiting === null ? {} : { waiting }),
    ...(carries === null ? {} : { carries }),
    totals: weekTotals(lines),
  };
}

/** Refunds take no more than what commission adds to the week: floors and guarantees stay whole. */
function refundsOf(
  person: PayPerson,
  own: PersonInput,
  lines: readonly PayLine[],
  payOf: (doneLines: DoneLine[]) => PayLine[],
): Takings {
  if (!own.adjustments.some((item) => item.kind === 'refund')) return { lines: [], warnings: [] };
  const without = payOf(own.doneLines.map((line) => ({ ...line, commissionableCents: 0 })));
  return refundLines(person, own.adjustments, Math.max(0, totalCents(lines) - totalCents(without)));
}

function tipTerms({ rules, zone }: PayWeekInput, place: OvertimeRuleSet): TipTerms {
  const { goTo, cardFeePercent } = rules.tips ?? { goTo: 'crew', cardFeePercent: '0' };
  return { split: rules.crewSplit, zone, goTo, cardFeePercent: exact(cardFeePercent), place };
}

/** Pay by the dated rates of the person and the company. */
function ratePay(person: PayPerson, own: PersonInput, spans: readonly WorkSpan[], input: PayWeekInput): BasePay {
  const { rules, zone } = input;
  const byClock = hourlyPay(person, spans, datedPrice(person, own.rates, own.doneLines));
  const byLine = own.doneLines.flatMap((line) => jobLinePay({ person, line, split: rules.crewSplit, zone }, own.rates));
  return { ...byClock, lines: [...byClock.lines, ...byLine], notWorked: ZERO, carries: null };
}

function planWeek(
  person: PayPerson,
  own: PersonInput,
  spans: readonly WorkSpan[],
  hours: Exact,
  { ruleSet }: PlaceRules,
  { input, settles, startsOn }: SharedWeek,
): PlanWeek | null {
  const plan = planInForce(own.plans, startsOn);
  if (plan === null) return null;
  return {
    ...{ person, plan, spans, hours, settles },
    doneLines: own.doneLines,
    split: input.rules.crewSplit,
    zone: input.zone,
    clock: input.clock,
    carried: own.carried,
    mayCoverOtherTime: ruleSet.mayCoverOtherTime,
    salaryHoursAtMost: ruleSet.salaryHoursAtMost === null ? null : exact(ruleSet.salaryHoursAtMost),
  };
}

type Carries = NonNullable<PersonWeek['carries']>;

function carriesOf(base: BasePay, premium: WeekPremium | null): Carries | null {
  if (base.carries === null) return null;
  const premiumHours = premium === null ? ZERO : premium.split.overtime.div(2).add(premium.split.double);
  return { ...base.carries, premiumHours: fractionText(premiumHours) };
}

function settlementOf(plan: PlanWeek, carries: Carries, startsOn: string): PayLine[] {
  const { base } = plan.plan.plan;
  if (base.kind !== 'tiered_percent' || base.period !== 'month' || !plan.settles) return [];
  const thisWeek = { startsOn, hours: fractionText(plan.hours), ...carries };
  return monthSettlement(plan, base, [...(plan.carried?.weeks ?? []), thisWeek]);
}

function byWorkday(spans: readonly WorkSpan[]): Exact[] {
  const seconds = [0, 0, 0, 0, 0, 0, 0];
  for (const span of spans) seconds[span.workday] = (seconds[span.workday] ?? 0) + span.to - span.from;
  return seconds.map(hoursOf);
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
