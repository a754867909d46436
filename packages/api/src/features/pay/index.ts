export { payRoutes } from './pay.routes.ts';
export { addRate, addRules } from './rates.service.ts';
export { handOverPayday, makePayday } from './handover/paydays.service.ts';
export { noteJobPaid } from './deferred/jobs-paid.service.ts';
export { setWeekState } from './lock.service.ts';
export { rulesOn, workweekRuleOn } from './weeks.service.ts';
export { verifyWeeks } from './verify.ts';
