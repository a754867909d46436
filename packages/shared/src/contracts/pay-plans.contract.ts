import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { day, decimal, id, instant, name, shortText } from './fields.ts';
import { ownRules } from '../domain/pay/own-rules.ts';
import type { OvertimeRuleSet } from '../domain/pay/overtime-rule-sets.ts';
import { payPlan } from '../domain/pay/plans/pay-plan.ts';

const owner = ['owner'] as const;

export const payPlanDto = z.object({
  id,
  personId: id,
  personName: z.string(),
  startsOn: day,
  plan: payPlan,
  setBy: z.string(),
  setAt: instant,
});
export type PayPlanDto = z.infer<typeof payPlanDto>;
export const listPayPlans = endpoint({
  method: 'get',
  path: '/api/pay/plans',
  roles: owner,
  summary: 'Every dated pay plan; a person without one is paid by the dated rates.',
  response: z.object({ plans: z.array(payPlanDto) }),
});
export const addPayPlan = endpoint({
  method: 'post',
  path: '/api/pay/plans',
  roles: owner,
  summary: 'A person’s plan from the first day of a workweek on; earlier ones stay.',
  body: z.strictObject({ personId: id, startsOn: day, plan: payPlan }),
  response: z.object({ plan: payPlanDto }),
});

/** Rule sets that are known, each with its source and since when it holds. */
const ruleSetDto = z.custom<OvertimeRuleSet>((value) => typeof value === 'object' && value !== null);
export const listRuleSets = endpoint({
  method: 'get',
  path: '/api/pay/rule-sets',
  roles: owner,
  summary: 'The overtime rule sets that a place may follow, with source, effective date and how surely each was read.',
  response: z.object({ ruleSets: z.array(ruleSetDto) }),
});

const wageDto = z.object({ startsOn: day, amount: z.string(), source: z.string(), setBy: z.string() });
export const payPlaceDto = z.object({
  id,
  name: z.string(),
  ruleSet: ruleSetDto,
  /** Oldest first. */
  minimumWages: z.array(wageDto),
});
export type PayPlaceDto = z.infer<typeof payPlaceDto>;
const personPlaceDto = z.object({
  id,
  personId: id,
  personName: z.string(),
  placeId: id.nullable(),
  placeName: z.string().nullable(),
  startsOn: day,
  setBy: z.string(),
});
export type PersonPlaceDto = z.infer<typeof personPlaceDto>;

export const listPayPlaces = endpoint({
  method: 'get',
  path: '/api/pay/places',
  roles: owner,
  summary: 'The places with their rules and minimum wages, and who works where from when on.',
  response: z.object({ places: z.array(payPlaceDto), people: z.array(personPlaceDto) }),
});

const wage = z.strictObject({
  startsOn: day,
  amount: decimal.refine((value) => Number(value) > 0, 'Give the wage an hour.'),
  source: shortText,
});
export const addPayPlace = endpoint({
  method: 'post',
  path: '/api/pay/places',
  roles: owner,
  summary: 'A place with a known rule set or rules of the owner’s own, and its minimum wages.',
  body: z
    .strictObject({
      name,
      ruleSetKey: z.string().nullable(),
      ownRules: ownRules.nullable(),
      minimumWages: z.array(wage).max(20),
    })
    .refine((place) => (place.ruleSetKey === null) !== (place.ownRules === null), {
      path: ['ruleSetKey'],
      message: 'Choose a rule set, or define rules for the place.',
    }),
  response: z.object({ place: payPlaceDto }),
});
export const addPlaceWage = endpoint({
  method: 'post',
  path: '/api/pay/places/:id/wages',
  roles: owner,
  summary: 'A minimum wage of a place from a date on.',
  params: z.object({ id }),
  body: wage,
  response: z.object({ place: payPlaceDto }),
});
export const setPersonPlace = endpoint({
  method: 'post',
  path: '/api/pay/person-places',
  roles: owner,
  summary: 'Where a person works from the first day of a workweek on; without a place the company’s rules alone.',
  body: z.strictObject({ personId: id, placeId: id.nullable(), startsOn: day }),
  response: z.object({ people: z.array(personPlaceDto) }),
});

export const whatIf = endpoint({
  method: 'post',
  path: '/api/pay/what-if',
  roles: owner,
  summary: 'Past weeks worked out again with other pay, side by side with what they paid; nothing is saved.',
  body: z
    .strictObject({
      personId: id,
      /** Any day of the first and of the last week to try; at most 27 weeks. */
      from: day,
      to: day,
      hourly: decimal.nullable().default(null),
      percent: decimal
        .refine((value) => Number(value) <= 100, 'A percent is at most 100.')
        .nullable()
        .default(null),
      plan: payPlan.nullable().default(null),
      placeId: id.nullable().default(null),
      ruleSetKey: z.string().nullable().default(null),
      minimumWage: decimal.nullable().default(null),
      crewSplit: z.enum(['equal', 'weights', 'minutes']).nullable().default(null),
    })
    .refine((trial) => trial.from <= trial.to, { path: ['to'], message: 'The last week is not before the first.' })
    .refine((trial) => Date.parse(trial.to) - Date.parse(trial.from) <= 27 * 7 * 86_400_000, {
      path: ['to'],
      message: 'Try at most 27 weeks at a time.',
    }),
  response: z.object({
    weeks: z.array(
      z.object({
        startsOn: day,
        number: z.int(),
        isLocked: z.boolean(),
        /** Exact hours, a fraction. */
        hours: z.string(),
        soldCents: z.int(),
        /** Without tips and adjustments. */
        asPaidCents: z.int(),
        whatIfCents: z.int(),
        /** Overtime and make-up, both sides. */
        asPaidPremiumCents: z.int(),
        whatIfPremiumCents: z.int(),
      }),
    ),
  }),
});
export type WhatIfBody = z.infer<(typeof whatIf)['body']>;
export type WhatIfWeek = z.infer<(typeof whatIf)['response']>['weeks'][number];

export const getCommissionTest = endpoint({
  method: 'get',
  path: '/api/pay/commission-test/:personId',
  roles: owner,
  summary: 'What the commission tests of 29 USC 207(i) come to over the last year’s locked weeks. It only informs.',
  params: z.object({ personId: id }),
  response: z.object({
    weeks: z.int(),
    commissionCents: z.int(),
    otherCents: z.int(),
    isMostlyCommission: z.boolean(),
    overtimeWeeks: z.int(),
    overtimeWeeksPassed: z.int(),
  }),
});
