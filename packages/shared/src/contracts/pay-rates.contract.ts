import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { clockKinds } from '../domain/time/clock-kinds.ts';
import { clockTime, day, decimal, id } from './fields.ts';
import { tipsGoTo } from './jobs.contract.ts';

export const rateKinds = [
  'hourly',
  'commission_percent',
  'flat_service',
  'product_cost',
  'mileage',
  'per_review',
] as const;
/** Of the whole company alone. */
const companyRates: readonly string[] = ['product_cost', 'mileage'];
const serviceRates: readonly string[] = ['flat_service', 'product_cost'];
const noServiceRates: readonly string[] = ['mileage', 'per_review'];
export const rateDto = z.object({
  id,
  kind: z.enum(rateKinds),
  personId: id.nullable(),
  personName: z.string().nullable(),
  serviceId: id.nullable(),
  serviceName: z.string().nullable(),
  clockKind: z.enum(clockKinds).nullable(),
  value: z.string(),
  startsOn: day,
  setBy: z.string(),
});
export type RateDto = z.infer<typeof rateDto>;
const owner = ['owner'] as const;

export const listRates = endpoint({
  method: 'get',
  path: '/api/pay/rates',
  roles: owner,
  summary: 'Every dated rate: hourly, flat per service, commission percent, product cost, a mile, a review.',
  response: z.object({ rates: z.array(rateDto) }),
});
export const addRate = endpoint({
  method: 'post',
  path: '/api/pay/rates',
  roles: owner,
  summary: 'A new rate from a date on; earlier ones stay.',
  body: z
    .strictObject({
      kind: z.enum(rateKinds),
      personId: id.nullable(),
      serviceId: id.nullable(),
      clockKind: z.enum(clockKinds).nullable(),
      value: decimal,
      startsOn: day,
    })
    .refine((r) => r.kind !== 'commission_percent' || Number(r.value) <= 100, {
      path: ['value'],
      message: 'A percent is at most 100.',
    })
    .refine((r) => r.kind === 'hourly' || r.clockKind === null, {
      path: ['clockKind'],
      message: 'Only an hourly rate goes by kind of work.',
    })
    .refine((r) => r.serviceId === null || r.clockKind === null, {
      path: ['clockKind'],
      message: 'Choose a kind of work or a service, not both.',
    })
    .refine((r) => !noServiceRates.includes(r.kind) || r.serviceId === null, {
      path: ['serviceId'],
      message: 'This does not go by service.',
    })
    .refine((r) => !serviceRates.includes(r.kind) || r.serviceId !== null, {
      path: ['serviceId'],
      message: 'Choose the service that this is for.',
    })
    .refine((r) => !companyRates.includes(r.kind) || r.personId === null, {
      path: ['personId'],
      message: 'This holds for the whole company.',
    }),
  response: z.object({ rate: rateDto }),
});

const punchRoundingMinutes = z.union([z.literal(5), z.literal(6), z.literal(15)]).nullable();
export const commissionEarned = ['done', 'paid'] as const;
export const premiumRoundings = ['half_up', 'up'] as const;
export const payRulesDto = z.object({
  id,
  startsOn: day,
  overtimeRuleSet: z.enum(['us_federal']),
  minimumWage: z.string(),
  crewSplit: z.enum(['equal', 'weights', 'minutes']),
  mealBreakMinutes: z.int(),
  /** Punches to the nearest so many minutes; null for exact time. */
  punchRoundingMinutes,
  premiumRounding: z.enum(premiumRoundings),
  /** When commission is earned: the work is done, or the customer has paid. */
  commissionEarned: z.enum(commissionEarned),
  /** A tip meant for one of the crew: that person's, or shared like the rest. */
  tipsGoTo: z.enum(tipsGoTo),
  /** The card fee that really comes off a card tip, percent; "0" for none. */
  tipCardFeePercent: z.string(),
  /** ISO weekday, 1 Monday to 7 Sunday, and the clock time at which the workweek starts. */
  workweekStartsOn: z.int(),
  workweekStartsAt: clockTime,
  setBy: z.string(),
});
export type PayRulesDto = z.infer<typeof payRulesDto>;
export const listPayRules = endpoint({
  method: 'get',
  path: '/api/pay/rules',
  roles: owner,
  summary: 'The dated rules of pay: overtime, minimum wage, crew split, workweek.',
  response: z.object({ rules: z.array(payRulesDto) }),
});
export const addPayRules = endpoint({
  method: 'post',
  path: '/api/pay/rules',
  roles: owner,
  summary: 'New rules from a date on; a locked week keeps those it was paid by.',
  body: z.strictObject({
    startsOn: day,
    overtimeRuleSet: z.enum(['us_federal']),
    minimumWage: decimal.refine((v) => Number(v) >= 7.25, 'The federal minimum wage is 7.25 (29 USC 206).'),
    crewSplit: z.enum(['equal', 'weights', 'minutes']),
    mealBreakMinutes: z.int().min(20).max(120),
    punchRoundingMinutes: punchRoundingMinutes.default(null),
    premiumRounding: z.enum(premiumRoundings).default('half_up'),
    commissionEarned: z.enum(commissionEarned).default('done'),
    tipsGoTo: z.enum(tipsGoTo).default('crew'),
    tipCardFeePercent: decimal.refine((v) => Number(v) <= 10, 'At most 10 percent.').default('0'),
    workweekStartsOn: z.int().min(1).max(7),
    workweekStartsAt: clockTime,
  }),
  response: z.object({ rules: payRulesDto }),
});
