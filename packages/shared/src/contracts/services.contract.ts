import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import {
  day,
  done,
  equipment,
  id,
  longText,
  minutes,
  name,
  planVersion,
  positiveCents,
  sizeClass,
  skill,
} from './fields.ts';
import { desk } from '../authz/actor.ts';
import { taxClasses } from '../domain/billing/tax-rates.ts';
import { surchargedConditions } from '../domain/menu/condition-surcharge.ts';
import { photoSets } from '../domain/walk-round/views.ts';

const priceBody = z.strictObject({ sizeClass, priceCents: positiveCents, minutes });
const percent = z.int('Give a whole percent.').min(0, 'At least 0 percent.');
const needs = z.strictObject({
  /** A spigot, or a tank in the van. */
  water: z.boolean(),
  /** An outlet, or a generator in the van. */
  power: z.boolean(),
  dry: z.boolean(),
  daylight: z.boolean(),
  /** Of the air, tenths of a degree Celsius. */
  coldestTenths: z.int().min(-400, 'That is colder than any place we work.').max(600).nullable(),
  hottestTenths: z.int().min(-400).max(600, 'That is hotter than any place we work.').nullable(),
});
/** Left out: as it was, and nothing of it for a new one. */
const facts = {
  needs: needs
    .refine(
      ({ coldestTenths, hottestTenths }) =>
        coldestTenths === null || hottestTenths === null || coldestTenths < hottestTenths,
      { path: ['hottestTenths'], message: 'The hottest must be above the coldest.' },
    )
    .optional(),
  /** Hours in which the car stays dry afterwards. */
  cureHours: z.int('Give whole hours.').min(0).max(720, 'At most 720 hours.').optional(),
  /** When it is due again, days; null for never. */
  intervalDays: z
    .int('Give whole days.')
    .min(1, 'At least a day.')
    .max(1500, 'At most 1,500 days.')
    .nullable()
    .optional(),
  depositPercent: percent.max(100, 'At most 100 percent.').optional(),
  /** What a package holds; its price is its own. */
  includes: z.array(id).max(30).optional(),
};
const surcharge = z.object({ pricePercent: z.int(), minutesPercent: z.int() });
export const surchargesDto = z.object({ dirty: surcharge, very_dirty: surcharge });

export const serviceKinds = ['package', 'single', 'add_on'] as const;
export const serviceDto = z.object({
  id,
  name: z.string(),
  kind: z.enum(serviceKinds),
  description: z.string(),
  skills: z.array(skill),
  equipment: z.array(equipment),
  /** What is photographed before work. */
  photoSet: z.enum(photoSets),
  /** What its price is taxed as. */
  taxClass: z.enum(taxClasses),
  needs: z.object(needs.shape),
  cureHours: z.int(),
  intervalDays: z.int().nullable(),
  depositPercent: z.int(),
  includes: z.array(id),
  isActive: z.boolean(),
  position: z.int(),
  /** The prices in force on the day asked for, one per size class that is sold. */
  prices: z.array(priceBody.extend({ startsOn: day })),
  version: z.int(),
});
export type ServiceDto = z.infer<typeof serviceDto>;

export const serviceBody = z.strictObject({
  name,
  kind: z.enum(serviceKinds),
  description: longText,
  skills: z.array(skill),
  equipment: z.array(equipment),
  /** Left out: quick, for add-ons none. */
  photoSet: z.enum(photoSets, 'Choose what is photographed.').optional(),
  /** Left out: taxed, or as it was. */
  taxClass: z.enum(taxClasses, 'Choose how it is taxed.').optional(),
  ...facts,
  isActive: z.boolean(),
  position: z.int().min(0).max(999),
});
export const listServices = endpoint({
  method: 'get',
  path: '/api/services',
  roles: desk,
  summary: 'The service menu with the prices of a day.',
  query: z.object({ on: day.optional() }),
  response: z.object({ services: z.array(serviceDto), surcharges: surchargesDto }),
});
export const createService = endpoint({
  method: 'post',
  path: '/api/services',
  roles: ['owner'],
  summary: 'Add a service with its first prices.',
  body: serviceBody.extend({
    prices: z.array(priceBody).min(1, 'Give a price for at least one size class.'),
    startsOn: day,
  }),
  response: z.object({ service: serviceDto }),
});
export const updateService = endpoint({
  method: 'put',
  path: '/api/services/:id',
  roles: ['owner'],
  summary: 'Change a service; prices change by new start-dated ones.',
  params: z.object({ id }),
  body: serviceBody.extend({ version: planVersion }),
  response: z.object({ service: serviceDto }),
});
export const setServicePrices = endpoint({
  method: 'post',
  path: '/api/services/:id/prices',
  roles: ['owner'],
  summary: 'New prices and minutes from a date on; what was quoted keeps its price.',
  params: z.object({ id }),
  body: z.strictObject({
    startsOn: day,
    prices: z.array(priceBody).min(1, 'Give a price for at least one size class.'),
  }),
  response: z.object({ service: serviceDto }),
});
export const setSurcharge = endpoint({
  method: 'post',
  path: '/api/condition-surcharges',
  roles: ['owner'],
  summary: 'What a dirtier car costs and takes on top, from a day on; what was quoted keeps its price.',
  body: z.strictObject({
    condition: z.enum(surchargedConditions, 'Choose a condition.'),
    pricePercent: percent.max(300, 'At most 300 percent.'),
    minutesPercent: percent.max(300, 'At most 300 percent.'),
    startsOn: day,
  }),
  response: done,
});
