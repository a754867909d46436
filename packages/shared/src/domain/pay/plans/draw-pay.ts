import { exact } from '../../money/exact.ts';
import { centsText, toCents } from '../../money/rounding.ts';
import { aLine, totalCents } from '../pay-line.ts';
import type { PayLine, WorkingStep } from '../pay-week.types.ts';
import { planSource, type PlanWeek } from './plan-week.ts';

export interface DrawPay {
  /** The draw's line, above zero when it adds, below when it is paid back; none when commission meets it evenly. */
  lines: PayLine[];
  /** Draw still to be earned after this week, cents. */
  deficitCents: number;
}

const RULE = 'Draw against commission within one month of workweeks, paid in full each week; 29 CFR 778.121, 531.35';

/**
 * A draw against commission: each week pays at least the draw. What commission lacks is carried as a credit against
 * later weeks of the same month and paid back only out of commission above the draw; at the month's end what is left
 * is forgiven. The make-up to the minimum wage stands outside and is never paid back.
 */
export function drawPay(week: PlanWeek, commission: readonly PayLine[], weekly: string): DrawPay {
  const drawCents = toCents(exact(weekly));
  const earnedCents = totalCents(commission);
  const carried = week.carried?.drawDeficitCents ?? 0;
  const after = (cents: number): number => (week.settles ? 0 : cents);
  if (week.hours.lte(0) && earnedCents === 0) return { lines: [], deficitCents: after(carried) };
  const lack = drawCents - earnedCents;
  if (lack > 0) {
    return {
      lines: [drawLine(week, lack, advanceSteps(week, drawCents, earnedCents))],
      deficitCents: after(carried + lack),
    };
  }
  const back = Math.min(-lack, carried);
  if (back === 0) return { lines: [], deficitCents: after(carried) };
  return {
    lines: [drawLine(week, -back, backSteps(week, earnedCents, drawCents, carried, back))],
    deficitCents: after(carried - back),
  };
}

function drawLine(week: PlanWeek, amountCents: number, working: WorkingStep[]): PayLine {
  return aLine({
    key: 'draw',
    personId: week.person.id,
    kind: 'plan_floor',
    label: amountCents > 0 ? 'Draw against commission' : 'Draw paid back out of commission',
    amountCents,
    inRegularRate: true,
    rule: RULE,
    working,
  });
}

function advanceSteps(week: PlanWeek, drawCents: number, earnedCents: number): WorkingStep[] {
  return [
    {
      label: 'The draw, less the commission earned',
      note: week.settles
        ? 'The last workweek of the month: what is not earned is not carried on'
        : 'Carried as a credit against commission of later weeks of this month',
      arithmetic: `${centsText(drawCents)} less ${centsText(earnedCents)}`,
      result: centsText(drawCents - earnedCents),
      sources: [planSource(week.plan)],
    },
  ];
}

function backSteps(week: PlanWeek, earned: number, draw: number, carried: number, back: number): WorkingStep[] {
  return [
    {
      label: 'Commission above the draw',
      note: 'Only this may pay back what was drawn before',
      arithmetic: `${centsText(earned)} less ${centsText(draw)}`,
      result: centsText(earned - draw),
      sources: [planSource(week.plan)],
    },
    {
      label: 'Paid back',
      note: `${centsText(carried)} was drawn and not earned in earlier weeks of this month`,
      arithmetic: `-${centsText(back)}`,
      result: centsText(-back),
      sources: [],
    },
  ];
}
