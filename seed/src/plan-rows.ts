import { NO_EXTRAS } from '@driprail/shared/domain/pay/plans/pay-plan';
import type { PayPlan } from '@driprail/shared/domain/pay/plans/pay-plan';
import { addDays } from '@driprail/shared/domain/time/zone';
import { PAST_WEEKS, instant, minuteOf } from './calendar.ts';
import type { Book } from './job-rows.ts';
import type { DemoPeople } from './people.ts';
import { named } from './people.ts';
import { at } from './random.ts';

const plans: { name: string; weeksAgo: number; plan: PayPlan }[] = [
  {
    name: 'Tomas Reyes',
    weeksAgo: 6,
    plan: {
      base: { kind: 'hourly_plus_percent', hourly: '20', percent: '5' },
      extras: { ...NO_EXTRAS, premiums: [{ label: 'Lead technician', perHour: '1.50', kinds: [], between: null }] },
    },
  },
  {
    name: 'Ede Stroud',
    weeksAgo: 4,
    plan: {
      base: { kind: 'percent_with_floor', percent: '22', floor: '18', other: { hourly: '16', agreement: null } },
      extras: { ...NO_EXTRAS, attendance: { amount: '25', days: 5 } },
    },
  },
];

/** Dollars a mile in one's own car, and a trip to the supplier that was paid back. */
const MILE = '0.70';
const MILES = '18.4';
const MILES_CENTS = 1288;

/** Two of the crew on plans, a dated rate for miles, and what refunds do to commission. */
export function writePlans({ rows, ids, calendar }: Book, { ownerUserId, technicians }: DemoPeople): void {
  const setAt = instant(calendar.rulesFrom, minuteOf('09:45'));
  const signed = { setBy: ownerUserId, setAt };
  for (const { name, weeksAgo, plan } of plans) {
    const startsOn = addDays(calendar.thisWeek, -7 * weeksAgo);
    rows.payPlans.push({ id: ids(), personId: named(technicians, name).id, startsOn, plan, ...signed });
  }
  const rateId = ids();
  const startsOn = calendar.rulesFrom;
  rows.payRates.push({ id: rateId, kind: 'mileage', value: MILE, startsOn, setBy: ownerUserId });
  const driver = named(technicians, 'Petra Hale').id;
  rows.payAdjustments.push({
    ...{ id: ids(), payWeekId: at(rows.payWeeks, PAST_WEEKS - 3).id, personId: driver, kind: 'reimbursement' },
    ...{ amountCents: MILES_CENTS, reason: 'Supplier trip in an own car', correctsLineId: null },
    counted: { unit: 'mile', quantity: MILES, rateId, value: MILE, startsOn },
    ...{ userId: ownerUserId, at: instant(addDays(calendar.thisWeek, 4 - 7 * 3), minuteOf('16:20')) },
  });
  rows.refundReasons.push(
    { id: ids(), name: 'Work not done', lowersCommission: true, startsOn, ...signed },
    { id: ids(), name: 'Damage by the crew', lowersCommission: false, startsOn, ...signed },
    { id: ids(), name: 'Goodwill', lowersCommission: false, startsOn, ...signed },
  );
  rows.payAgreements.push({
    ...{ id: ids(), personId: named(technicians, 'Idris Vale').id, kind: 'refunds', startsOn: calendar.firstWeek },
    ...{ signedOn: addDays(calendar.firstWeek, -3), note: 'Commission plan, signed, in the office folder', ...signed },
  });
}
