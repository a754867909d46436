import { z } from 'zod';
import { day, email, id, name, phone, shortText, sizeClass } from './fields.ts';
import { channels } from '../domain/customer/consent.ts';
import { drains, washWaters } from '../domain/customer/place-facts.ts';
import { wheelFinishes } from '../domain/vehicle/wheel-finish.ts';

/** The parts of a customer's record as they are sent, each with the sentence its field shows. */
const drain = z.enum(drains, 'Choose where the drain leads.');
const washWater = z.enum(washWaters, 'Choose what becomes of the wash water.');
const wheelFinish = z.enum(wheelFinishes, 'Choose a finish, or unsure.');
export const channel = z.enum(channels);

export const addressDto = z.object({
  id,
  /** Home, work: what the customer calls it. */
  label: z.string(),
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
  takesKey: z.boolean(),
  /** Where the key goes back; for the crew in its hours. */
  keyGoesBack: z.string(),
  drain,
  washWater: washWater.nullable(),
  permitNumber: z.string(),
  permitUntil: day.nullable(),
  /** Who of the place's owners said yes to work there, and when. */
  ownerConsentBy: z.string(),
  ownerConsentOn: day.nullable(),
  mustKnow: z.string(),
});
export const vehicleDto = z.object({
  id,
  /** Year, make and model in one piece. */
  label: z.string(),
  year: z.int().nullable(),
  make: z.string(),
  model: z.string(),
  color: z.string(),
  plate: z.string(),
  vin: z.string(),
  sizeClass,
  wheelFinish,
  paint: z.string(),
  interior: z.string(),
  notes: z.string(),
  isCoated: z.boolean(),
  mustKnow: z.string(),
});
export const consentDto = z.object({ channel, isGiven: z.boolean(), on: day, how: z.string() });
export type AddressDto = z.infer<typeof addressDto>;
export type VehicleDto = z.infer<typeof vehicleDto>;

/** Letters in quotation marks before the @, as RFC 5322 section 3.4.1 allows: "a b"@company.example. */
const quoted = /^"(?:[\x20\x21\x23-\x5b\x5d-\x7e]|\\[\x20-\x7e]){1,60}"@/;
/** A customer's e-mail address, or none: the usual shapes, and one with a quoted part. */
export const customerEmail = z
  .string()
  .trim()
  .max(254, 'At most 254 letters.')
  .toLowerCase()
  .refine(
    (text) => text === '' || email.safeParse(text.replace(quoted, 'a@')).success,
    'Give an e-mail address like name@company.example, or leave it empty.',
  );

const latitude = 'Give a latitude from -90 to 90, like 40.6213, or leave it empty.';
const longitude = 'Give a longitude from -180 to 180, like -70.3541, or leave it empty.';
export const addressBody = z
  .strictObject({
    id: id.optional(),
    label: z.string().trim().max(40, 'At most 40 letters.').optional(),
    line: z.string().trim().min(1, 'Give the street and number.').max(160, 'At most 160 letters.'),
    city: z.string().trim().max(80, 'At most 80 letters.'),
    postcode: z.string().trim().max(16, 'At most 16 letters.'),
    area: z.string().trim().max(60, 'At most 60 letters.'),
    lat: z.number(latitude).min(-90, latitude).max(90, latitude).nullable(),
    lng: z.number(longitude).min(-180, longitude).max(180, longitude).nullable(),
    gateCode: z.string().trim().max(40, 'At most 40 letters.'),
    accessNotes: shortText,
    hasWater: z.boolean(),
    hasPower: z.boolean(),
    hasDog: z.boolean().optional(),
    shutsGate: z.boolean().optional(),
    takesKey: z.boolean().optional(),
    keyGoesBack: shortText.optional(),
    drain: drain.optional(),
    washWater: washWater.nullish(),
    permitNumber: z.string().trim().max(60, 'At most 60 letters.').optional(),
    permitUntil: day.nullish(),
    ownerConsentBy: z.string().trim().max(120, 'At most 120 letters.').optional(),
    ownerConsentOn: day.nullish(),
    mustKnow: shortText.optional(),
  })
  .refine(({ lat, lng }) => (lat === null) === (lng === null), {
    path: ['lng'],
    message: 'Give both latitude and longitude, or neither.',
  })
  .refine(({ ownerConsentBy, ownerConsentOn }) => !ownerConsentBy || ownerConsentOn, {
    path: ['ownerConsentOn'],
    message: 'Say on which day the owner agreed.',
  })
  .refine(({ ownerConsentBy, ownerConsentOn }) => !ownerConsentOn || ownerConsentBy, {
    path: ['ownerConsentBy'],
    message: 'Say who agreed to work there.',
  });

const year = 'Give a year from 1900 to 2100, like 2019, or leave it empty.';
export const vehicleBody = z
  .strictObject({
    id: id.optional(),
    /** Instead of year, make and model: all of it in one piece, like 2019 hatchback. */
    label: z.string().trim().max(120, 'At most 120 letters.').optional(),
    year: z.int(year).min(1900, year).max(2100, year).nullish(),
    make: z.string().trim().max(40, 'At most 40 letters.').optional(),
    model: z.string().trim().max(60, 'At most 60 letters.').optional(),
    color: z.string().trim().max(40, 'At most 40 letters.'),
    plate: z.string().trim().max(16, 'At most 16 letters.'),
    /** Checked beside the field, never refused for its check digit: old and imported vehicles have other numbers. */
    vin: z.string().trim().max(30, 'At most 30 letters.').optional(),
    sizeClass,
    wheelFinish: wheelFinish.optional(),
    paint: shortText.optional(),
    interior: shortText.optional(),
    notes: shortText,
    isCoated: z.boolean().optional(),
    mustKnow: shortText.optional(),
  })
  .refine(({ label, make, model }) => label || make || model, {
    path: ['model'],
    message: 'Say which vehicle, like hatchback.',
  });

export const consentBody = z.strictObject({
  channel,
  isGiven: z.boolean(),
  on: day,
  how: z.string().trim().min(1, 'Say how it was given, like by phone.').max(120, 'At most 120 letters.'),
});

/** At most this much, and how much there is: a long note is cut by who wrote it, not here. */
const notes = z
  .string()
  .trim()
  .max(10_000, {
    error: ({ input }) =>
      `At most 10,000 letters; this has ${typeof input === 'string' ? input.trim().length.toLocaleString('en-US') : 'more'}. Shorten it, it is still here.`,
  });

export const customerBody = z.strictObject({
  name,
  isCompany: z.boolean(),
  phone,
  email: customerEmail,
  notes,
  isScentFree: z.boolean().optional(),
  ringsFirst: z.boolean().optional(),
  mustKnow: shortText.optional(),
  tags: z
    .array(z.string().trim().min(1).max(40, 'At most 40 letters in a tag.'))
    .max(20, 'At most 20 tags.')
    .optional(),
  /** People, the most wanted first. */
  preferredCrew: z.array(id).max(20, 'At most 20 people.').optional(),
  /** An answer that differs from the last one is added; the earlier ones stay on record. */
  consents: z.array(consentBody).max(channels.length).optional(),
  addresses: z.array(addressBody).min(1, 'Give at least one address.').max(50, 'At most 50 addresses.'),
  vehicles: z.array(vehicleBody).max(200, 'At most 200 vehicles.'),
});
export type CustomerBody = z.input<typeof customerBody>;
