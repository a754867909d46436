import type { AdjustmentKind } from '@driprail/shared/domain/pay/pay-week.types';
import { workweekOf } from '@driprail/shared/domain/time/workweek';
import { addDays } from '@driprail/shared/domain/time/zone';
import { PAST_WEEKS, ZONE, instant, minuteOf } from './calendar.ts';
import type { Book } from './job-rows.ts';
import type { ServiceName } from './menu.ts';
import { onMenu } from './menu.ts';
import type { DemoPeople } from './people.ts';
import { named } from './people.ts';
import { at } from './random.ts';
import type { Row } from './rows.ts';
import type { PayRate } from '@driprail/api/db/models/index';

const commissioned: ServiceName[] = ['One-step polish', 'Two-step polish', 'Ceramic coating, one layer'];
const COMPANY_PERCENT = '6';
const personalPercents = { 'Idris Vale': '8', 'Mara Quist': '7' };
const HEADLIGHTS_FLAT = '12.00';
const raise = { name: 'Sefa Lund', hourly: '23.75', weeksAgo: 6 };

/** Dated rules and rates, the past weeks as drafts, and what was added to them. */
export function writePay(book: Book, people: DemoPeople): void {
  writeRules(book, people);
  writeRates(book, people);
  writeWeeks(book, people);
}

/** Federal rules with the federal minimum wage (29 USC 206(a)(1)(C)); the week starts Monday at midnight. */
function writeRules({ rows, ids, calendar }: Book, { ownerUserId }: DemoPeople): void {
  rows.payRules.push({
    ...{ id: ids(), startsOn: calendar.rulesFrom, overtimeRuleSet: 'us_federal', minimumWage: '7.25' },
    ...{ crewSplit: 'equal', mealBreakMinutes: 30, workweekStartsOn: 1, workweekStartsAt: '00:00', setBy: ownerUserId },
  });
}

function writeRates({ rows, ids, calendar, menu }: Book, { ownerUserId, technicians, dispatchers }: DemoPeople): void {
  const startsOn = calendar.rulesFrom;
  const rate = (fields: Pick<Row<PayRate>, 'kind' | 'value'> & Partial<Row<PayRate>>) =>
    rows.payRates.push({
      ...{ id: ids(), personId: null, serviceId: null, clockKind: null, startsOn, setBy: ownerUserId },
      ...fields,
    });
  for (const { id: personId, hourly } of [...dispatchers, ...technicians]) {
    rate({ kind: 'hourly', personId, value: hourly });
  }
  rate({
    ...{ kind: 'hourly', personId: named(technicians, raise.name).id, value: raise.hourly },
    startsOn: addDays(calendar.thisWeek, -7 * raise.weeksAgo),
  });
  for (const service of commissioned) {
    const serviceId = onMenu(menu, service).id;
    rate({ kind: 'commission_percent', serviceId, value: COMPANY_PERCENT });
    for (const [name, value] of Object.entries(personalPercents)) {
      rate({ kind: 'commission_percent', personId: named(technicians, name).id, serviceId, value });
    }
  }
  rate({ kind: 'flat_service', serviceId: onMenu(menu, 'Headlight restoration').id, value: HEADLIGHTS_FLAT });
}

interface Added {
  weeksAgo: number;
  name: string;
  kind: AdjustmentKind;
  cents: number;
  reason: string;
}

const added: Added[] = [
  { weeksAgo: 11, name: 'Sefa Lund', kind: 'bonus', cents: 5000, reason: 'Five reviews in a month, as promised' },
  { weeksAgo: 9, name: 'Tomas Reyes', kind: 'reimbursement', cents: 2340, reason: 'Fuel paid at the pump' },
  { weeksAgo: 5, name: 'Idris Vale', kind: 'bonus', cents: 7500, reason: 'Taught Lio Fenn the wheels, as agreed' },
  { weeksAgo: 4, name: 'Cal Webb', kind: 'deduction', cents: -2400, reason: 'Work boots, half of 48.00' },
  {
    weeksAgo: 3,
    name: 'Mara Quist',
    kind: 'discretionary_bonus',
    cents: 4000,
    reason: 'Stayed late in the storm week',
  },
  { weeksAgo: 2, name: 'Beau Okoro', kind: 'reimbursement', cents: 1575, reason: 'Towels bought on the road' },
  { weeksAgo: 1, name: 'Priya Noor', kind: 'bonus', cents: 5000, reason: 'Five reviews in a month, as promised' },
];

function writeWeeks({ rows, ids, calendar }: Book, { ownerUserId, technicians }: DemoPeople): void {
  for (let weeksAgo = PAST_WEEKS; weeksAgo > 0; weeksAgo -= 1) {
    const day = addDays(calendar.thisWeek, -7 * weeksAgo);
    const { startsAt, endsAt, ...days } = workweekOf(day, { startsOn: 1, startsAt: '00:00', zone: ZONE });
    rows.payWeeks.push({ id: ids(), ...days, startsAt: new Date(startsAt), endsAt: new Date(endsAt) });
  }
  for (const { weeksAgo, name, kind, cents, reason } of added) {
    rows.payAdjustments.push({
      ...{ id: ids(), payWeekId: at(rows.payWeeks, PAST_WEEKS - weeksAgo).id, personId: named(technicians, name).id },
      ...{ kind, amountCents: cents, reason, correctsLineId: null, userId: ownerUserId },
      at: instant(addDays(calendar.thisWeek, 4 - 7 * weeksAgo), minuteOf('16:00')),
    });
  }
}
