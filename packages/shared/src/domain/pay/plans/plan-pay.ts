import { exact, fractionText, ZERO } from '../../money/exact.ts';
import { centsText, decimalText, toCents } from '../../money/rounding.ts';
import type { HourlyPay } from '../hourly-pay.ts';
import { aLine, totalCents } from '../pay-line.ts';
import type { PayLine } from '../pay-week.types.ts';
import { rateText } from '../working-words.ts';
import { drawPay } from './draw-pay.ts';
import type { PlanOf } from './pay-plan.ts';
import { extraLines } from './plan-extras.ts';
import { flatLines, jobRates, percentOfLines } from './plan-jobs.ts';
import { allTime, jobHours, timeBesideJobs } from './plan-time.ts';
import { floorLine, guaranteeLine } from './plan-top-up.ts';
import { planSource, type BasePay, type PlanWeek } from './plan-week.ts';
import { salaryPay } from './salary-pay.ts';
import { tierBase, tieredLine } from './tiered-commission.ts';

type Pay = Partial<BasePay> & Pick<BasePay, 'lines'>;

/** What a plan pays one person for one workweek, before minimum wage and overtime. Amounts round once a line, half up. */
export function planPay(week: PlanWeek): BasePay {
  const base = basePay(week);
  const flats = week.plan.plan.base.kind === 'flat_with_floor' ? [] : flatLines(week);
  return {
    unpaidHours: ZERO,
    restPaid: ZERO,
    notWorked: ZERO,
    carries: null,
    ...base,
    lines: [...base.lines, ...flats, ...extraLines(week)],
  };
}

function basePay(week: PlanWeek): Pay {
  const { base } = week.plan.plan;
  switch (base.kind) {
    case 'hourly':
      return allTime(week, base.hourly);
    case 'hourly_plus_percent':
      return withTime(percentOfLines(week, base.percent), allTime(week, base.hourly));
    case 'flat_with_floor': {
      const earned = flatLines(week);
      const floor = floorLine(week, earned, base.floor, jobHours(week, base.other));
      return withTime([...earned, ...floor], timeBesideJobs(week, base.other));
    }
    case 'percent_with_floor': {
      const earned = percentOfLines(week, base.percent);
      const floor = floorLine(week, earned, base.floor, jobHours(week, base.other));
      return withTime([...earned, ...floor], timeBesideJobs(week, base.other));
    }
    case 'salary':
      return salaryPay(week, base);
    case 'weekly_guarantee': {
      const earned = withTime(percentOfLines(week, base.percent), allTime(week, base.hourly));
      return { ...earned, lines: [...earned.lines, ...guaranteeLine(week, earned.lines, base.weekly)] };
    }
    case 'better_of':
      return betterOf(week, base);
    case 'draw': {
      const commission = percentOfLines(week, base.percent);
      const { lines, deficitCents } = drawPay(week, commission, base.weekly);
      return {
        ...withTime([...commission, ...lines], timeBesideJobs(week, base.other)),
        carries: { drawDeficitCents: deficitCents, tierBaseCents: 0, tierPaidCents: 0 },
      };
    }
    case 'tiered_percent': {
      const baseCents = tierBase(week);
      const commission = tieredLine(week, base, baseCents);
      const carries = { drawDeficitCents: 0, tierBaseCents: baseCents, tierPaidCents: totalCents(commission) };
      return {
        ...withTime(commission, timeBesideJobs(week, base.other)),
        carries: base.period === 'month' ? carries : null,
      };
    }
    case 'day_rate':
      return { lines: dayRate(week, base) };
    case 'job_rate':
      return withTime(jobRates(week, base.perJob), timeBesideJobs(week, base.other));
    case 'rates':
      throw new RangeError('A person who went back to the dated rates has no plan in force.');
  }
}

function withTime(lines: PayLine[], time: HourlyPay): Pay {
  return { lines: [...time.lines, ...lines], restPaid: time.restPaid };
}

/** The hourly pay of all hours, or commission with the time beside the jobs: whichever is more, said on its lines. */
function betterOf(week: PlanWeek, base: PlanOf<'better_of'>): Pay {
  const hourly = allTime(week, base.hourly);
  const commission = withTime(percentOfLines(week, base.percent), timeBesideJobs(week, base.other));
  const [byHour, byJob] = [totalCents(hourly.lines), totalCents(commission.lines)];
  const chosen = byJob > byHour ? commission : hourly;
  const why = `the better of both is paid: ${centsText(byHour)} by the hour, ${centsText(byJob)} by commission`;
  return { ...chosen, lines: chosen.lines.map((line) => ({ ...line, rule: `${line.rule}; ${why}` })) };
}

function dayRate(week: PlanWeek, { daily }: PlanOf<'day_rate'>): PayLine[] {
  const days = new Set(week.spans.map((span) => span.date)).size;
  const amountCents = toCents(exact(daily).mul(days));
  if (amountCents === 0) return [];
  return [
    aLine({
      key: 'day_rate',
      personId: week.person.id,
      kind: 'day_rate',
      label: 'Day rate',
      hours: fractionText(week.hours),
      rate: null,
      amountCents,
      inRegularRate: true,
      rule: 'Fixed amount per day whatever the hours; 29 CFR 778.112',
      working: [
        {
          label: `Days ${week.person.name} worked`,
          note: 'Whatever the hours of the day',
          arithmetic: `${days} days times ${rateText(daily)}`,
          result: decimalText(exact(amountCents).div(100), 2),
          sources: [planSource(week.plan)],
        },
      ],
    }),
  ];
}
