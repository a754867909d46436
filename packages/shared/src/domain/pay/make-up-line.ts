import { dollars, fractionText, type Exact } from '../money/exact.ts';
import { centsText, decimalText, shortText, toCentsUp } from '../money/rounding.ts';
import { aLine, totalCents } from './pay-line.ts';
import type { PayLine, PayPerson } from './pay-week.types.ts';
import { minimumWageShortfall } from './regular-rate.ts';
import { hoursAndMinutes } from './working-words.ts';

/**
 * What the week's countable pay lacks to the minimum wage. Rounded up: a floor set by law is never rounded down
 * (DOL Fact Sheet #65).
 * @param included lines inside the regular rate; nothing else counts toward the minimum wage
 * @returns null when the minimum wage is met
 */
export function makeUpLine(
  person: PayPerson,
  included: readonly PayLine[],
  hours: Exact,
  minimumWage: Exact,
): PayLine | null {
  const paidCents = totalCents(included);
  const amountCents = toCentsUp(minimumWageShortfall(dollars(paidCents), hours, minimumWage));
  if (amountCents === 0) return null;
  const wage = decimalText(minimumWage, 2);
  const floorCents = paidCents + amountCents;
  return aLine({
    key: 'minimum_wage_make_up',
    personId: person.id,
    kind: 'minimum_wage_make_up',
    label: 'Make-up to the minimum wage',
    hours: fractionText(hours),
    rate: fractionText(minimumWage),
    amountCents,
    inRegularRate: true,
    rule: 'Minimum wage for every hour of the week; 29 USC 206(a)',
    working: [
      {
        label: `What ${person.name} worked`,
        note: 'All hours of the week',
        arithmetic: hoursAndMinutes(hours),
        result: `${shortText(hours)} h`,
        sources: [],
      },
      {
        label: 'The minimum wage for these hours',
        note: 'Each week meets it alone; up to the next cent',
        arithmetic: `${shortText(hours)} h times ${wage}`,
        result: centsText(floorCents),
        sources: [{ kind: 'rule', id: 'minimum_wage', label: `Minimum wage ${wage}` }],
      },
      {
        label: 'Less the pay that counts',
        note: 'Tips, reimbursements and corrections do not count',
        arithmetic: `${centsText(floorCents)} less ${centsText(paidCents)}`,
        result: centsText(amountCents),
        sources: included.map((line) => ({ kind: 'pay_line', id: line.key, label: line.label })),
      },
    ],
  });
}
