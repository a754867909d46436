import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { day, decimal, id, instant, shortText } from './fields.ts';
import { payWeekDto } from './pay.contract.ts';
import { everyone } from '../authz/actor.ts';
import { statementTimeOff } from '../domain/pay/time-off/statement-time-off.ts';
import { showUpRule } from '../domain/pay/time-off/show-up-rule.ts';
import { timeOffKinds, timeOffRule } from '../domain/pay/time-off/time-off-rule.ts';

const owner = ['owner'] as const;
const kind = z.enum(timeOffKinds, 'Choose sick, vacation or holiday.');

export const timeOffRuleDto = z.object({
  id,
  kind,
  personId: id.nullable(),
  personName: z.string().nullable(),
  startsOn: day,
  rule: timeOffRule,
  setBy: z.string(),
  setAt: instant,
});
export type TimeOffRuleDto = z.infer<typeof timeOffRuleDto>;
export const showUpRuleDto = z.object({
  id,
  placeId: id.nullable(),
  placeName: z.string().nullable(),
  startsOn: day,
  rule: showUpRule,
  source: z.string(),
  setBy: z.string(),
  setAt: instant,
});
export type ShowUpRuleDto = z.infer<typeof showUpRuleDto>;

export const listTimeOffRules = endpoint({
  method: 'get',
  path: '/api/pay/time-off/rules',
  roles: owner,
  summary: 'Every dated rule of paid time off, show-up pay and no-show trips, the newest first.',
  response: z.object({ timeOff: z.array(timeOffRuleDto), showUp: z.array(showUpRuleDto) }),
});
export const addTimeOffRule = endpoint({
  method: 'post',
  path: '/api/pay/time-off/rules',
  roles: owner,
  summary: 'How a kind of paid time off is earned and paid from the first day of a workweek on; earlier rules stay.',
  body: z.strictObject({ kind, personId: id.nullable(), startsOn: day, rule: timeOffRule }),
  response: z.object({ rule: timeOffRuleDto }),
});
export const addShowUpRule = endpoint({
  method: 'post',
  path: '/api/pay/show-up/rules',
  roles: owner,
  summary: 'Show-up pay or pay for a no-show trip from the first day of a workweek on, of the company or a place.',
  body: z.strictObject({
    placeId: id.nullable(),
    startsOn: day,
    rule: showUpRule,
    /** The law or the agreement that it follows. */
    source: shortText,
  }),
  response: z.object({ rule: showUpRuleDto }),
});

const move = z.object({
  on: day,
  kind: z.enum(['carry_lost', 'given', 'adjusted', 'taken', 'earned', 'cap_lost']),
  /** Signed exact hours, "n/d" or "n", like every hour here. */
  hours: z.string(),
  /** After this move. */
  balance: z.string(),
  note: z.string(),
});
export const timeOffBalanceDto = z.object({
  kind,
  /** Today's rule in words; null where none is in force. */
  ruleWords: z.string().nullable(),
  /** What is there: earned in locked weeks, less what was taken in open ones too. */
  balance: z.string(),
  /** With what the open weeks would earn as their records stand. */
  expected: z.string(),
  /** Oldest first; weeks in which nothing moved are left out. */
  weeks: z.array(
    z.object({
      startsOn: day,
      endsOn: day,
      isLocked: z.boolean(),
      earned: z.string(),
      taken: z.string(),
      adjusted: z.string(),
      lost: z.string(),
      balance: z.string(),
      moves: z.array(move),
    }),
  ),
});
export type TimeOffBalanceDto = z.infer<typeof timeOffBalanceDto>;
export const getTimeOffBalances = endpoint({
  method: 'get',
  path: '/api/pay/time-off/balances/:personId',
  roles: everyone,
  summary: 'One person’s balances of paid time off with their ledger: one’s own, anybody’s for the owner.',
  params: z.object({ personId: id }),
  response: z.object({ personId: id, name: z.string(), balances: z.array(timeOffBalanceDto) }),
});

const signedHours = z
  .string()
  .regex(/^-?\d{1,4}(\.\d{1,4})?$/, 'Give hours like 12 or -4.5.')
  .refine((value) => Number(value) !== 0, 'Give hours other than 0.');
export const adjustTimeOff = endpoint({
  method: 'post',
  path: '/api/pay/time-off/adjustments',
  roles: owner,
  summary: 'An opening balance or a correction of a balance, with its reason; it stays in the ledger.',
  body: z.strictObject({
    personId: id,
    kind,
    on: day,
    hours: signedHours,
    reason: shortText.min(1, 'Say what it is for.'),
  }),
  response: z.object({ personId: id, name: z.string(), balances: z.array(timeOffBalanceDto) }),
});

export const timeOffWarningCodes = ['over_balance', 'paid_already'] as const;
const warning = z.object({ code: z.enum(timeOffWarningCodes), message: z.string() });
export type TimeOffWarning = z.infer<typeof warning>;
const takenHours = decimal
  .refine((value) => Number(value) > 0, 'Give hours above zero.')
  .refine((value) => Number(value) <= 24, 'At most 24 hours for one day.');
const taking = z.strictObject({ personId: id, kind, hours: takenHours, on: day });

export const quoteTimeOff = endpoint({
  method: 'get',
  path: '/api/pay/weeks/:startsOn/time-off',
  roles: owner,
  summary: 'What hours off would pay and leave, before they are taken; nothing is saved.',
  params: z.object({ startsOn: day }),
  query: taking,
  response: z.object({
    /** Exact. */
    hours: z.string(),
    /** Exact dollars an hour. */
    rate: z.string(),
    rateWords: z.string(),
    ruleWords: z.string(),
    amountCents: z.int(),
    /** Exact hours that may be taken now, and what is left after. */
    balance: z.string(),
    balanceAfter: z.string(),
    /** The note of a day away that holds this day; null where none is written down. */
    dayAway: z.string().nullable(),
    warnings: z.array(warning),
  }),
});
export type TimeOffQuote = z.infer<(typeof quoteTimeOff)['response']>;
export const takeTimeOff = endpoint({
  method: 'post',
  path: '/api/pay/weeks/:startsOn/time-off',
  roles: owner,
  summary: 'Pays hours off in an open week at the rule’s rate; more than the balance only with a reason.',
  params: z.object({ startsOn: day }),
  body: taking.extend({
    reason: shortText.default(''),
    accept: z
      .array(z.strictObject({ code: z.enum(timeOffWarningCodes), reason: shortText.min(1, 'Give a reason.') }))
      .max(2)
      .default([]),
  }),
  response: payWeekDto,
});

export const getWeekTimeOff = endpoint({
  method: 'get',
  path: '/api/pay/weeks/:startsOn/time-off/:personId',
  roles: owner,
  summary: 'One person’s balances as the statement of a week shows them.',
  params: z.object({ startsOn: day, personId: id }),
  response: z.object({ timeOff: z.array(statementTimeOff) }),
});
