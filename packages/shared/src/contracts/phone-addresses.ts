import { addressOf } from './address.ts';
import type * as billing from './billing.contract.ts';
import type * as clock from './clock.contract.ts';
import type * as hours from './hours.contract.ts';
import type * as jobWork from './job-work.contract.ts';
import type * as jobs from './jobs.contract.ts';
import type * as push from './push.contract.ts';
import type * as runSheet from './run-sheet.contract.ts';
import type * as session from './session.contract.ts';

/** What the phone asks for on its first screens; a test holds each to its contract. */
export const getSessionAt = addressOf<typeof session.getSession>('get', '/api/session');
export const createSessionAt = addressOf<typeof session.createSession>('post', '/api/session');
export const endSessionAt = addressOf<typeof session.endSession>('delete', '/api/session');
export const getRunSheetAt = addressOf<typeof runSheet.getRunSheet>('get', '/api/run-sheet/:day');
export const postVisitActionAt = addressOf<typeof runSheet.postVisitAction>('post', '/api/visits/:id/actions');
export const getDayWorkAt = addressOf<typeof jobWork.getDayWork>('get', '/api/run-sheet/:day/work');
export const postWorkActionAt = addressOf<typeof jobWork.postWorkAction>('post', '/api/visits/:id/work');
export const postJobChangeAt = addressOf<typeof jobWork.postJobChange>('post', '/api/visits/:id/changes');
export const getClockAt = addressOf<typeof clock.getClock>('get', '/api/clock');
export const postClockActionAt = addressOf<typeof clock.postClockAction>('post', '/api/clock/actions');
export const recordTipAt = addressOf<typeof jobs.recordTip>('post', '/api/jobs/:id/tips');
export const getDayBillsAt = addressOf<typeof billing.getDayBills>('get', '/api/run-sheet/:day/bills');
export const recordPaymentAt = addressOf<typeof billing.recordPayment>('post', '/api/jobs/:id/payments');
export const openPayLinkAt = addressOf<typeof billing.openPayLink>('post', '/api/jobs/:id/pay-link');
export const listClockRequestsAt = addressOf<typeof hours.listClockRequests>('get', '/api/clock/requests');
export const listHoursWordsAt = addressOf<typeof hours.listHoursWords>('get', '/api/clock/weeks/:startsOn');
export const askClockChangeAt = addressOf<typeof hours.askClockChange>('post', '/api/clock/requests');
export const decideClockChangeAt = addressOf<typeof hours.decideClockChange>(
  'post',
  '/api/clock/requests/:id/decision',
);
export const sayHoursAt = addressOf<typeof hours.sayHours>('post', '/api/clock/weeks/:startsOn');
export const getPushKeyAt = addressOf<typeof push.getPushKey>('get', '/api/push/key');
export const addPushSubscriptionAt = addressOf<typeof push.addPushSubscription>('post', '/api/push/subscriptions');
export const removePushSubscriptionAt = addressOf<typeof push.removePushSubscription>(
  'delete',
  '/api/push/subscriptions',
);
