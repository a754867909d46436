import { z } from 'zod';
import { customerDto } from './customers.contract.ts';
import { addressDto, consentDto, vehicleDto } from './customers-record.contract.ts';
import { endpoint } from './endpoint.ts';
import { day, done, id, instant, planVersion } from './fields.ts';
import { desk } from '../authz/actor.ts';

/** All that is kept about one customer, for the customer. What belongs to others, like who works here, is left out. */
export const customerData = z.object({
  madeAt: instant,
  company: z.string(),
  customer: customerDto.omit({ preferredCrew: true, consents: true, addresses: true, vehicles: true, version: true }),
  since: instant,
  /** Names of records that were merged into this one. */
  otherNames: z.array(z.string()),
  addresses: z.array(addressDto.extend({ isKept: z.boolean() })),
  vehicles: z.array(vehicleDto.extend({ isKept: z.boolean() })),
  /** Every answer that was given, the latest first. */
  consents: z.array(consentDto.extend({ recordedAt: instant })),
  jobs: z.array(
    z.object({
      number: z.int(),
      bookedAt: instant,
      notes: z.string(),
      place: z.string(),
      lines: z.array(z.object({ service: z.string(), vehicle: z.string(), priceCents: z.int() })),
      discountCents: z.int(),
      visits: z.array(z.object({ from: instant.nullable(), to: instant.nullable(), progress: z.string() })),
      invoices: z.array(z.object({ number: z.int(), issuedAt: instant, totalCents: z.int() })),
      payments: z.array(z.object({ at: instant, method: z.string(), amountCents: z.int() })),
      tips: z.array(z.object({ at: instant, amountCents: z.int() })),
      photos: z.array(z.object({ id, takenAt: instant, view: z.string(), moment: z.string() })),
    }),
  ),
});
export type CustomerData = z.infer<typeof customerData>;

export const getCustomerData = endpoint({
  method: 'get',
  path: '/api/customers/:id/data',
  roles: desk,
  summary: 'A copy of all that is kept about one customer, on request.',
  params: z.object({ id }),
  response: customerData,
});

export const erasurePreview = z.object({
  name: z.string(),
  version: z.int(),
  /** What the record will be called. */
  nameAfter: z.string(),
  goes: z.object({ addresses: z.int(), vehicles: z.int(), photos: z.int() }),
  stays: z.object({ jobs: z.int(), invoices: z.int() }),
  /** What must end first; null: nothing stands against it. */
  hindrance: z.string().nullable(),
  on: day,
});
export type ErasurePreview = z.infer<typeof erasurePreview>;

export const previewErasure = endpoint({
  method: 'get',
  path: '/api/customers/:id/erasure',
  roles: ['owner'],
  summary: 'What an erasure takes away and what stays.',
  params: z.object({ id }),
  response: erasurePreview,
});

export const eraseCustomer = endpoint({
  method: 'post',
  path: '/api/customers/:id/erasure',
  roles: ['owner'],
  summary: 'Erase a customer on request: jobs and money stay without the name. Not undone.',
  params: z.object({ id }),
  body: z.strictObject({
    version: planVersion,
    /** The customer's name, typed once more. */
    name: z.string(),
  }),
  response: done,
});
