import type { Migration } from '../migration.ts';
import { company } from './2026-12-01-001-company.ts';
import { work } from './2026-12-01-002-work.ts';
import { pay } from './2026-12-01-003-pay.ts';
import { hours } from './2026-12-01-004-hours.ts';
import { payPlans } from './2026-12-01-005-pay-plans.ts';
import { paydays } from './2026-12-01-006-paydays.ts';
import { paidTimeOff } from './2026-12-01-007-paid-time-off.ts';
import { commissionWhenPaid } from './2026-12-01-008-commission-when-paid.ts';
import { payFacts } from './2026-12-01-009-pay-facts.ts';
import { checkedFigures } from './2026-12-01-010-checked-figures.ts';
import { lockedRecords } from './2026-12-01-011-locked-records.ts';
import { walkRounds } from './2026-12-01-012-walk-rounds.ts';
import { jobWork } from './2026-12-01-013-job-work.ts';
import { payIndexes } from './2026-12-01-014-pay-indexes.ts';
import { phone } from './2026-12-01-015-phone.ts';
import { breakReminders } from './2026-12-01-016-break-reminders.ts';
import { customers } from './2026-12-01-018-customers.ts';
import { erasedBills } from './2026-12-01-018-erased-bills.ts';
import { billing } from './2026-12-01-017-billing.ts';
import { messages } from './2026-12-01-019-messages.ts';
import { onlineBooking } from './2026-12-01-020-online-booking.ts';
import { serviceNeeds } from './2026-12-01-021-service-needs.ts';
import { callBacks } from './2026-12-01-022-call-backs.ts';
import { fees } from './2026-12-01-024-fees.ts';

/** In the order in which they are run. */
export const migrations: Migration[] = [
  company,
  work,
  pay,
  hours,
  payPlans,
  paydays,
  paidTimeOff,
  commissionWhenPaid,
  payFacts,
  checkedFigures,
  lockedRecords,
  walkRounds,
  jobWork,
  payIndexes,
  phone,
  breakReminders,
  customers,
  billing,
  erasedBills,
  serviceNeeds,
  messages,
  callBacks,
  onlineBooking,
  fees,
];
