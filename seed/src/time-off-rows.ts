import type { TimeOffRule } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { timeOffRuleWords } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { timeOffCents } from '@driprail/shared/domain/pay/time-off/time-off-pay';
import { addDays } from '@driprail/shared/domain/time/zone';
import { RESTED } from './away.ts';
import { PAST_WEEKS, instant, minuteOf } from './calendar.ts';
import type { Book } from './job-rows.ts';
import type { DemoPeople } from './people.ts';
import { named } from './people.ts';
import { at } from './random.ts';

const RESTED_WEEKS_AGO = 7;
const RESTED_RATE = '19.20';

/** Example figures of a made-up company; what the law asks for differs by state and town. */
const sick: TimeOffRule = {
  earning: { by: 'hours_worked', perHours: '30' },
  ...{ capHours: '40', yearStartsOn: '01-01', carryHours: null, pays: { by: 'hourly' } },
};
const vacation: TimeOffRule = { ...sick, earning: { by: 'hours_worked', perHours: '40' }, capHours: '80' };

/** Sick time and vacation from the first past week on, and the week of vacation that one of the crew had. */
export function writeTimeOffPay({ rows, ids, calendar }: Book, { ownerUserId, technicians }: DemoPeople): void {
  const startsOn = calendar.firstWeek;
  const setAt = instant(calendar.rulesFrom, minuteOf('09:30'));
  const [sickId, vacationId] = [ids(), ids()];
  rows.timeOffRules.push(
    { id: sickId, kind: 'sick', personId: null, startsOn, rule: sick, setBy: ownerUserId, setAt },
    { id: vacationId, kind: 'vacation', personId: null, startsOn, rule: vacation, setBy: ownerUserId, setAt },
  );
  const personId = named(technicians, RESTED).id;
  rows.timeOffAdjustments.push({
    ...{ id: ids(), personId, kind: 'vacation', onDate: startsOn, hours: '40', reason: 'Opening balance' },
    ...{ userId: ownerUserId, at: setAt },
  });
  const monday = addDays(calendar.thisWeek, -7 * RESTED_WEEKS_AGO);
  const hours = '8';
  for (let day = 0; day < 5; day += 1) {
    rows.payAdjustments.push({
      ...{ id: ids(), payWeekId: at(rows.payWeeks, PAST_WEEKS - RESTED_WEEKS_AGO).id, personId, kind: 'paid_time_off' },
      ...{ amountCents: timeOffCents({ hours, rate: RESTED_RATE }), reason: 'Vacation', correctsLineId: null },
      ...{ userId: ownerUserId, at: instant(addDays(monday, 4), minuteOf('16:00')) },
      ...{ timeOffKind: 'vacation', timeOffHours: hours, timeOffOn: addDays(monday, day), timeOffRate: RESTED_RATE },
      timeOffBasis: {
        ...{ ruleId: vacationId, ruleWords: timeOffRuleWords(vacation), rateWords: 'The hourly rate', accepted: [] },
      },
    });
  }
}
