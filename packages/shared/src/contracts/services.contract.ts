import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { day, equipment, id, longText, minutes, name, planVersion, positiveCents, sizeClass, skill } from './fields.ts';
import { desk } from '../authz/actor.ts';
import { taxClasses } from '../domain/billing/tax-rates.ts';
import { photoSets } from '../domain/walk-round/views.ts';

const priceBody = z.strictObject({ sizeClass, priceCents: positiveCents, minutes });
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
  isActive: z.boolean(),
  position: z.int().min(0).max(999),
});
export const listServices = endpoint({
  method: 'get',
  path: '/api/services',
  roles: desk,
  summary: 'The service menu with the prices of a day.',
  query: z.object({ on: day.optional() }),
  response: z.object({ services: z.array(serviceDto) }),
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
