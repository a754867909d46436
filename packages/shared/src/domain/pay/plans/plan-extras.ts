import { dollars, exact, fractionText, hoursOf } from '../../money/exact.ts';
import { centsText, shortText, toCents } from '../../money/rounding.ts';
import { formatClock } from '../../time/format.ts';
import { instantOf } from '../../time/zone-instants.ts';
import { aLine, totalCents } from '../pay-line.ts';
import type { PayLine } from '../pay-week.types.ts';
import { hoursAndMinutes, rateText } from '../working-words.ts';
import { secondsOf, type WorkSpan } from '../work-spans.ts';
import type { PlanExtras } from './pay-plan.ts';
import { addOnBonuses } from './plan-jobs.ts';
import { planSource, type PlanWeek } from './plan-week.ts';

/** What the plan adds inside the regular rate: premiums by the hour and promised bonuses. */
export function extraLines(week: PlanWeek): PayLine[] {
  const { premiums, perAddOn } = week.plan.plan.extras;
  return [
    ...premiums.flatMap((premium, index) => premiumPay(week, premium, index)),
    ...(perAddOn === null ? [] : addOnBonuses(week, perAddOn)),
    ...attendanceBonus(week),
  ];
}

type Premium = PlanExtras['premiums'][number];

/** Dollars an hour on top, for some kinds of work or some hours of the day (29 CFR 778.207(b)). */
function premiumPay(week: PlanWeek, premium: Premium, index: number): PayLine[] {
  const spans = week.spans.filter((span) => premium.kinds.length === 0 || premium.kinds.includes(span.kind));
  const seconds = spans.reduce((total, span) => total + secondsWithin(span, premium, week.zone), 0);
  const hours = hoursOf(seconds);
  const amountCents = toCents(hours.mul(exact(premium.perHour)));
  if (amountCents === 0) return [];
  const { between } = premium;
  const at = (time: string): string => formatClock(`2026-01-01T${time}:00Z`, 'utc', week.clock);
  return [
    aLine({
      key: `premium_pay:${index}`,
      personId: week.person.id,
      kind: 'premium_pay',
      label: premium.label,
      hours: fractionText(hours),
      rate: premium.perHour,
      amountCents,
      inRegularRate: true,
      rule: 'Role or shift premium, inside the regular rate; 29 CFR 778.207(b)',
      working: [
        {
          label: `Hours of ${week.person.name} with the premium`,
          note: between ? `Worked between ${at(between.from)} and ${at(between.to)}` : 'By the clock',
          arithmetic: hoursAndMinutes(hours),
          result: `${shortText(hours)} h`,
          sources: [...new Set(spans.map((span) => span.entryId))].map((id) => ({
            kind: 'clock_entry',
            id,
            label: `Clock entry, ${spans.find((span) => span.entryId === id)?.date ?? ''}`,
          })),
        },
        {
          label: premium.label,
          note: 'On top of the pay for these hours',
          arithmetic: `${shortText(hours)} h times ${rateText(premium.perHour)}`,
          result: centsText(amountCents),
          sources: [planSource(week.plan)],
        },
      ],
    }),
  ];
}

function secondsWithin(span: WorkSpan, { between }: Premium, zone: string): number {
  if (between === null) return span.to - span.from;
  const from = Math.max(span.from, secondsOf(instantOf(span.date, between.from, zone)));
  const to = Math.min(span.to, secondsOf(instantOf(span.date, between.to, zone)));
  return Math.max(0, to - from);
}

function attendanceBonus(week: PlanWeek): PayLine[] {
  const { attendance } = week.plan.plan.extras;
  const days = new Set(week.spans.map((span) => span.date)).size;
  if (attendance === null || days < attendance.days) return [];
  const amountCents = toCents(exact(attendance.amount));
  return [
    aLine({
      key: 'bonus:attendance',
      personId: week.person.id,
      kind: 'bonus',
      label: 'Attendance bonus',
      amountCents,
      inRegularRate: true,
      rule: 'Promised bonus for attendance, inside the regular rate; 29 CFR 778.211(c)',
      working: [
        {
          label: 'Attendance bonus',
          note: `Promised for ${attendance.days} days worked in the week; ${days} were`,
          arithmetic: rateText(attendance.amount),
          result: centsText(amountCents),
          sources: [planSource(week.plan)],
        },
      ],
    }),
  ];
}

/**
 * The same percentage of straight and overtime pay alike: it carries its own overtime, so it stays out of the regular
 * rate and nothing is worked out again (29 CFR 778.210).
 * @param earnings the lines inside the regular rate and the overtime premium
 */
export function percentageOfTotal(week: PlanWeek, earnings: readonly PayLine[]): PayLine[] {
  const { percentOfTotal } = week.plan.plan.extras;
  if (percentOfTotal === null) return [];
  const wholeCents = totalCents(earnings);
  const amountCents = toCents(dollars(wholeCents).mul(exact(percentOfTotal)).div(100));
  if (amountCents === 0) return [];
  const percent = `${shortText(exact(percentOfTotal))} %`;
  return [
    aLine({
      key: 'percentage_bonus',
      personId: week.person.id,
      kind: 'percentage_bonus',
      label: `Bonus, ${percent} of all earnings`,
      rate: percentOfTotal,
      amountCents,
      rule: 'Percentage of straight and overtime pay alike needs no recomputation; 29 CFR 778.210',
      working: [
        {
          label: 'All earnings of the week',
          note: 'Straight pay and overtime; tips, reimbursements and corrections are left out',
          arithmetic: earnings.map((line) => centsText(line.amountCents)).join(' + '),
          result: centsText(wholeCents),
          sources: earnings.map((line) => ({ kind: 'pay_line', id: line.key, label: line.label })),
        },
        {
          label: 'The bonus',
          note: `${percent} of it`,
          arithmetic: `${percent} of ${centsText(wholeCents)}`,
          result: centsText(amountCents),
          sources: [planSource(week.plan)],
        },
      ],
    }),
  ];
}
