import { z } from 'zod';
import { addressDto, consentDto, customerBody, vehicleDto } from './customers-record.contract.ts';
import { endpoint } from './endpoint.ts';
import { id, instant, planVersion } from './fields.ts';
import { desk } from '../authz/actor.ts';

export const customerDto = z.object({
  id,
  name: z.string(),
  isCompany: z.boolean(),
  phone: z.string(),
  email: z.string(),
  notes: z.string(),
  isScentFree: z.boolean(),
  ringsFirst: z.boolean(),
  /** What every crew has to confirm before it starts. */
  mustKnow: z.string(),
  tags: z.array(z.string()),
  /** People, the most wanted first. */
  preferredCrew: z.array(id),
  /** The latest answer of each channel; none: never asked. */
  consents: z.array(consentDto),
  addresses: z.array(addressDto),
  vehicles: z.array(vehicleDto),
  version: z.int(),
});
export type CustomerDto = z.infer<typeof customerDto>;

/** What a list says of a customer's work: what is next, else what waits, else what was last. */
const standing = z.object({ at: instant.nullable(), progress: z.string() });
const listedCustomer = customerDto.extend({ standing: standing.nullable() });
export type ListedCustomer = z.infer<typeof listedCustomer>;
export const customerOrders = ['name', 'visit'] as const;

export const listCustomers = endpoint({
  method: 'get',
  path: '/api/customers',
  roles: desk,
  summary: 'Customers found by any part of name, phone, e-mail, address, plate, VIN or tag.',
  query: z.object({
    find: z.string().trim().max(80).default(''),
    by: z.enum(customerOrders).default('name'),
    limit: z.coerce.number().int().min(1).max(200).default(50),
    offset: z.coerce.number().int().min(0).default(0),
  }),
  response: z.object({ customers: z.array(listedCustomer), total: z.int() }),
});

const pastPhoto = z.object({ id, moment: z.string() });
export const pastJobDto = z.object({
  jobId: id,
  jobNumber: z.int(),
  on: instant.nullable(),
  progress: z.string(),
  services: z.string(),
  vehicles: z.string(),
  vanName: z.string(),
  crew: z.string(),
  /** Minutes from Start work to the end, over all visits; null while nothing was finished. */
  workedMinutes: z.int().nullable(),
  plannedMinutes: z.int(),
  totalCents: z.int(),
  /** The visit whose walk-round has the photos; its first before and after. */
  photoVisitId: id.nullable(),
  photoCount: z.int(),
  photos: z.array(pastPhoto),
});
export type PastJobDto = z.infer<typeof pastJobDto>;

export const getCustomer = endpoint({
  method: 'get',
  path: '/api/customers/:id',
  roles: desk,
  summary:
    'One customer with addresses, vehicles and past jobs. A record that was merged answers with the one it became.',
  params: z.object({ id }),
  response: z.object({
    customer: customerDto,
    /** The name of the record asked for, when it was merged into this one. */
    mergedName: z.string().nullable(),
    /** Since when nothing is left here that names anybody. */
    erasedAt: instant.nullable(),
    /** The first job or the record itself, whichever is earlier. */
    since: instant,
    history: z.array(pastJobDto),
  }),
});
export const createCustomer = endpoint({
  method: 'post',
  path: '/api/customers',
  roles: desk,
  summary: 'Add a customer.',
  body: customerBody,
  response: z.object({ customer: customerDto }),
});
export const updateCustomer = endpoint({
  method: 'put',
  path: '/api/customers/:id',
  roles: desk,
  summary: 'Change a customer. Addresses and vehicles in use stay on record when left out.',
  params: z.object({ id }),
  body: customerBody.extend({ version: planVersion }),
  response: z.object({ customer: customerDto }),
});

export const getVehicleWords = endpoint({
  method: 'get',
  path: '/api/customer-words/vehicles',
  roles: desk,
  summary: 'Makes, models and colors that this company typed before, the most used first.',
  response: z.object({ makes: z.array(z.string()), models: z.array(z.string()), colors: z.array(z.string()) }),
});

export const findPlace = endpoint({
  method: 'post',
  path: '/api/customer-places',
  roles: desk,
  summary: 'Where an address is on the map.',
  body: z.strictObject({
    line: z.string().trim().min(1, 'Give the street and number first.').max(160),
    city: z.string().trim().max(80),
    postcode: z.string().trim().max(16),
  }),
  response: z.object({ lat: z.number(), lng: z.number() }),
});
