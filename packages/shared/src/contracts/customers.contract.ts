import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { email, id, instant, longText, name, phone, planVersion, shortText, sizeClass } from './fields.ts';
import { desk } from '../authz/actor.ts';

export const addressDto = z.object({
  id,
  line: z.string(),
  city: z.string(),
  postcode: z.string(),
  area: z.string(),
  lat: z.number().nullable(),
  lng: z.number().nullable(),
  gateCode: z.string(),
  accessNotes: z.string(),
  hasWater: z.boolean(),
  hasPower: z.boolean(),
  hasDog: z.boolean(),
  shutsGate: z.boolean(),
  drainsToCreek: z.boolean(),
  takesKey: z.boolean(),
  /** Where the key goes back; for the crew in its hours. */
  keyGoesBack: z.string(),
  mustKnow: z.string(),
});
export const vehicleDto = z.object({
  id,
  label: z.string(),
  color: z.string(),
  plate: z.string(),
  sizeClass,
  notes: z.string(),
  isCoated: z.boolean(),
  mustKnow: z.string(),
});
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
  addresses: z.array(addressDto),
  vehicles: z.array(vehicleDto),
  version: z.int(),
});
export type AddressDto = z.infer<typeof addressDto>;
export type VehicleDto = z.infer<typeof vehicleDto>;
export type CustomerDto = z.infer<typeof customerDto>;

const addressBody = z.strictObject({
  id: id.optional(),
  line: z.string().trim().min(1, 'Give the street and number.').max(160),
  city: z.string().trim().max(80),
  postcode: z.string().trim().max(16),
  area: z.string().trim().max(60),
  lat: z.number().min(-90).max(90).nullable(),
  lng: z.number().min(-180).max(180).nullable(),
  gateCode: z.string().trim().max(40),
  accessNotes: shortText,
  hasWater: z.boolean(),
  hasPower: z.boolean(),
  hasDog: z.boolean().optional(),
  shutsGate: z.boolean().optional(),
  drainsToCreek: z.boolean().optional(),
  takesKey: z.boolean().optional(),
  keyGoesBack: shortText.optional(),
  mustKnow: shortText.optional(),
});
const vehicleBody = z.strictObject({
  id: id.optional(),
  label: z.string().trim().min(1, 'Say which vehicle, like 2019 hatchback.').max(80),
  color: z.string().trim().max(40),
  plate: z.string().trim().max(16),
  sizeClass,
  notes: shortText,
  isCoated: z.boolean().optional(),
  mustKnow: shortText.optional(),
});
export const customerBody = z.strictObject({
  name,
  isCompany: z.boolean(),
  phone,
  email: email.or(z.literal('')),
  notes: longText,
  isScentFree: z.boolean().optional(),
  ringsFirst: z.boolean().optional(),
  mustKnow: shortText.optional(),
  addresses: z.array(addressBody).min(1, 'Give at least one address.').max(50),
  vehicles: z.array(vehicleBody).max(200),
});
export type CustomerBody = z.input<typeof customerBody>;

export const listCustomers = endpoint({
  method: 'get',
  path: '/api/customers',
  roles: desk,
  summary: 'Customers found by any part of name, phone, plate or address.',
  query: z.object({
    find: z.string().trim().max(80).default(''),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  response: z.object({ customers: z.array(customerDto), total: z.int() }),
});
export const getCustomer = endpoint({
  method: 'get',
  path: '/api/customers/:id',
  roles: desk,
  summary: 'One customer with addresses, vehicles and past visits.',
  params: z.object({ id }),
  response: z.object({
    customer: customerDto,
    history: z.array(
      z.object({
        jobId: id,
        jobNumber: z.int(),
        on: instant.nullable(),
        progress: z.string(),
        services: z.string(),
        totalCents: z.int(),
      }),
    ),
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
