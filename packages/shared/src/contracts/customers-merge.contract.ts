import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { done, id, planVersion } from './fields.ts';
import { desk } from '../authz/actor.ts';
import { likenesses } from '../domain/customer/duplicates.ts';

const pairedCustomer = z.object({
  id,
  name: z.string(),
  phone: z.string(),
  email: z.string(),
  place: z.string(),
  jobs: z.int(),
});
export type PairedCustomer = z.infer<typeof pairedCustomer>;

export const listDuplicates = endpoint({
  method: 'get',
  path: '/api/customer-duplicates',
  roles: desk,
  summary:
    'Pairs of customers that are likely one: same phone, e-mail, plate or VIN, or an alike name at the same address.',
  response: z.object({
    pairs: z.array(z.object({ one: pairedCustomer, other: pairedCustomer, why: z.array(z.enum(likenesses)) })),
  }),
});

export const keepApart = endpoint({
  method: 'post',
  path: '/api/customer-duplicates/apart',
  roles: desk,
  summary: 'Two customers that look alike are two: the pair is not listed again.',
  body: z.strictObject({ ids: z.tuple([id, id]) }).refine(({ ids }) => ids[0] !== ids[1], 'Name two customers.'),
  response: done,
});

export const mergePreview = z.object({
  stays: z.object({ id, name: z.string(), version: z.int() }),
  goes: z.object({ id, name: z.string(), version: z.int() }),
  moves: z.object({ addresses: z.int(), vehicles: z.int(), jobs: z.int(), photos: z.int() }),
  /** What happens to the words of the record that goes. */
  words: z.array(z.string()),
  /** What must be put right first. */
  problems: z.array(z.string()),
});
export type MergePreview = z.infer<typeof mergePreview>;

export const previewMerge = endpoint({
  method: 'get',
  path: '/api/customers/:id/merge/:goesId',
  roles: desk,
  summary: 'What would move if one record went into another.',
  params: z.object({ id, goesId: id }),
  response: mergePreview,
});

export const mergeCustomers = endpoint({
  method: 'post',
  path: '/api/customers/:id/merge',
  roles: desk,
  summary:
    'One record goes into another: addresses, vehicles, jobs and history move, and its address leads to the other. Not undone.',
  params: z.object({ id }),
  body: z.strictObject({ goesId: id, version: planVersion, goesVersion: planVersion }),
  response: z.object({ id }),
});
