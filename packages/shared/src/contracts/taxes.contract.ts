import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { day, decimal, done, id, instant } from './fields.ts';
import { desk } from '../authz/actor.ts';

export const ratedClasses = ['standard', 'reduced'] as const;
export const taxRateDto = z.object({
  id,
  name: z.string(),
  taxClass: z.enum(ratedClasses),
  place: z.string(),
  percent: z.string(),
  startsOn: day,
  setBy: z.string(),
  setAt: instant,
});
export type TaxRateDto = z.infer<typeof taxRateDto>;

export const listTaxRates = endpoint({
  method: 'get',
  path: '/api/tax-rates',
  roles: desk,
  summary: 'The sales taxes that the owner entered, by place and day.',
  response: z.object({ taxRates: z.array(taxRateDto) }),
});
export const addTaxRate = endpoint({
  method: 'post',
  path: '/api/tax-rates',
  roles: ['owner'],
  summary: 'A tax from a day on, everywhere or in one town; zero percent ends it.',
  body: z.strictObject({
    name: z.string().trim().min(1, 'Name the tax as it should stand on invoices.').max(60, 'At most 60 letters.'),
    taxClass: z.enum(ratedClasses, 'Choose what it is charged on.'),
    place: z.string().trim().max(80, 'At most 80 letters.'),
    percent: decimal.refine((text) => Number(text) <= 100, 'A tax is at most 100 percent.'),
    startsOn: day,
  }),
  response: done,
});
