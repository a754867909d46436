import { addDays, dayOf } from '@driprail/shared/domain/time/zone';
import { ZONE, instant, minuteOf } from './calendar.ts';
import type { Book } from './job-rows.ts';
import type { DemoPeople } from './people.ts';
import { randomFor } from './random.ts';

/** Cash of a day is handed in and counted the next morning; now and then a little is over or short. */
export function writeCashCounts({ rows, ids, calendar }: Book, people: DemoPeople): void {
  const random = randomFor('cash');
  const byPersonAndDay = new Map<string, Book['rows']['payments']>();
  for (const payment of rows.payments) {
    if (payment.method !== 'cash' || !payment.personId) continue;
    const day = dayOf(payment.receivedAt.toISOString(), ZONE);
    if (day >= calendar.today) continue;
    const key = `${day} ${payment.personId}`;
    byPersonAndDay.set(key, [...(byPersonAndDay.get(key) ?? []), payment]);
  }
  const countedBy = people.dispatchers[0]?.userId ?? people.ownerUserId;
  for (const [key, payments] of [...byPersonAndDay].sort(([a], [b]) => a.localeCompare(b))) {
    const [day = '', personId = ''] = key.split(' ');
    const expectedCents = payments.reduce((sum, payment) => sum + payment.amountCents, 0);
    const off = random.chance(0.06) ? random.pick([-500, -100, 100, 200]) : 0;
    const id = ids();
    rows.cashCounts.push({
      ...{ id, personId, expectedCents, countedCents: Math.max(0, expectedCents + off), countedBy },
      note: off === 0 ? '' : 'Change was given out of the pocket',
      countedAt: instant(addDays(day, 1), minuteOf('07:50')),
    });
    rows.cashCountPayments.push(...payments.map((payment) => ({ paymentId: payment.id, cashCountId: id })));
  }
}
