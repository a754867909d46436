import { exact, fractionText, greatest, least, ZERO, type Exact } from '../../money/exact.ts';
import { centsText, decimalText, shortText, toCents } from '../../money/rounding.ts';
import { aLine } from '../pay-line.ts';
import { hoursOver } from '../regular-rate.ts';
import type { PayLine } from '../pay-week.types.ts';
import { weeklySalary } from '../salary.ts';
import { rateText } from '../working-words.ts';
import type { PlanOf } from './pay-plan.ts';
import { planSource, type PlanWeek } from './plan-week.ts';

const PERIOD_WORDS: Record<PlanOf<'salary'>['period'], string> = {
  weekly: 'a week',
  biweekly: 'for two weeks',
  semimonthly: 'twice a month',
  monthly: 'a month',
  annual: 'a year',
};

/**
 * A salary for a fixed workweek: the rate is the salary over the hours it covers, hours beyond those are owed in full
 * on top (29 CFR 778.113, 778.322). In a shorter week it is paid whole; the part for hours not worked stays out of
 * the regular rate, which is the salary over the covered hours.
 */
export function salaryPay(week: PlanWeek, terms: PlanOf<'salary'>): { lines: PayLine[]; notWorked: Exact } {
  const weekly = weeklySalary(exact(terms.amount), terms.period);
  const covers = week.salaryHoursAtMost
    ? least(exact(terms.coversHours), week.salaryHoursAtMost)
    : exact(terms.coversHours);
  const rate = weekly.div(covers);
  const salaryCents = toCents(weekly);
  const salary = aLine({
    key: 'salary',
    personId: week.person.id,
    kind: 'salary',
    label: `Salary for ${shortText(covers)} h a week`,
    hours: fractionText(covers),
    rate: fractionText(rate),
    amountCents: salaryCents,
    inRegularRate: true,
    rule: 'Salary for a fixed workweek; 29 CFR 778.113',
    working: [
      {
        label: 'The week’s part of the salary',
        note: `${rateText(terms.amount)} ${PERIOD_WORDS[terms.period]}; a month is times 12 over 52, half a month times 24 over 52`,
        arithmetic: rateText(terms.amount),
        result: centsText(salaryCents),
        sources: [planSource(week.plan)],
      },
      {
        label: 'What an hour of it is worth',
        note: `It covers ${shortText(covers)} h a week; hours beyond are owed on top`,
        arithmetic: `${centsText(salaryCents)} divided by ${shortText(covers)} h`,
        result: decimalText(rate, 4),
        sources: [],
      },
    ],
  });
  const missing = greatest(ZERO, covers.sub(week.hours));
  return { lines: [salary, ...beyondLines(week, covers, rate)], notWorked: rate.mul(missing) };
}

/** Hours beyond the salary up to 40 and those over 40 each have a line; the latter carry the premium as well. */
function beyondLines(week: PlanWeek, covers: Exact, rate: Exact): PayLine[] {
  const beyond = hoursOver(week.hours, covers);
  const over = hoursOver(week.hours, greatest(covers, exact(40)));
  return [
    ...beyondLine(week, rate, { key: 'salary:beyond', label: 'Hours beyond the salary', hours: beyond.sub(over) }),
    ...beyondLine(week, rate, { key: 'salary:over', label: 'Hours beyond the salary, over 40', hours: over }),
  ];
}

function beyondLine(
  week: PlanWeek,
  rate: Exact,
  { key, label, hours }: { key: string; label: string; hours: Exact },
): PayLine[] {
  const amountCents = toCents(rate.mul(hours));
  if (amountCents === 0) return [];
  return [
    aLine({
      ...{ key, label, amountCents, personId: week.person.id, kind: 'hourly' },
      hours: fractionText(hours),
      rate: fractionText(rate),
      inRegularRate: true,
      rule: 'Hours beyond those a salary covers are owed; 29 CFR 778.113, 778.322',
      working: [
        {
          label,
          note: `Of ${shortText(week.hours)} h worked. At the salary’s rate; overtime comes on top`,
          arithmetic: `${shortText(hours)} h times ${decimalText(rate, 4)}`,
          result: centsText(amountCents),
          sources: [planSource(week.plan)],
        },
      ],
    }),
  ];
}
