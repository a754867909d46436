import { dollars, fractionText, hoursOf, type Exact } from '../money/exact.ts';
import { centsText, decimalText, shortText, toCentsUp } from '../money/rounding.ts';
import { aLine, totalCents } from './pay-line.ts';
import type { PayLine, PayLineKind, PayPerson } from './pay-week.types.ts';
import { pieceRestPay } from './piece-rest.ts';
import type { WorkSpan } from './work-spans.ts';

const PIECES: readonly PayLineKind[] = ['flat', 'job_rate', 'commission'];

/**
 * Rest breaks of a week with piece work, paid apart at the week's average hour, less what other lines already pay for
 * them (California Labor Code 226.2). Rounded up: it is a floor.
 * @param restPaid exact dollars that the earned lines hold for rest breaks
 * @returns nothing without piece work, rest breaks or anything owed
 */
export function restPayLine(
  person: PayPerson,
  spans: readonly WorkSpan[],
  earned: readonly PayLine[],
  restPaid: Exact,
  minimumWage: Exact,
): PayLine[] {
  const hoursIn = (some: readonly WorkSpan[]) => hoursOf(some.reduce((total, span) => total + span.to - span.from, 0));
  const rest = spans.filter((span) => span.kind === 'rest_break');
  const [hours, restHours] = [hoursIn(spans), hoursIn(rest)];
  const pieces = earned.filter((line) => PIECES.includes(line.kind));
  if (totalCents(pieces) <= 0 || restHours.lte(0) || hours.lte(restHours)) return [];
  const pay = pieceRestPay({
    piecePay: dollars(totalCents(pieces)),
    otherPay: dollars(totalCents(earned) - totalCents(pieces)),
    hours,
    restHours,
    restHoursPaid: restHours,
    restRatePaid: restPaid.div(restHours),
    minimumWage,
  });
  const amountCents = toCentsUp(pay.restDue);
  if (amountCents === 0) return [];
  return [
    aLine({
      key: 'rest_pay',
      personId: person.id,
      kind: 'rest_pay',
      label: 'Rest breaks, paid apart',
      hours: fractionText(restHours),
      rate: fractionText(pay.restRate),
      amountCents,
      inRegularRate: true,
      rule: 'Rest breaks of piece work at the average hour, not under the minimum wage; California Labor Code 226.2',
      working: [
        {
          label: 'The average hour without rest breaks',
          note: 'Pay of the week without rest pay and overtime, over the hours without rest breaks',
          arithmetic: `${decimalText(pay.compensationLessRest, 2)} divided by ${shortText(pay.divisorHours)} h`,
          result: decimalText(pay.averageRate, 4),
          sources: earned.map((line) => ({ kind: 'pay_line', id: line.key, label: line.label })),
        },
        {
          label: `Rest breaks of ${person.name}`,
          note: pay.restRate.gt(pay.averageRate) ? 'At the minimum wage, which is higher' : 'At the average hour',
          arithmetic: `${shortText(restHours)} h times ${decimalText(pay.restRate, 4)}`,
          result: decimalText(pay.restPay, 2),
          sources: rest.map((span) => ({
            kind: 'clock_entry',
            id: span.entryId,
            label: `Rest break, ${span.date}`,
          })),
        },
        {
          label: 'Less what the hours above pay for them',
          note: 'Up to the next cent',
          arithmetic: `${decimalText(pay.restPay, 2)} less ${decimalText(restPaid, 2)}`,
          result: centsText(amountCents),
          sources: [],
        },
      ],
    }),
  ];
}
