import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import {
  clockTime,
  day,
  email,
  id,
  instant,
  name,
  phone,
  planVersion,
  positiveCents,
  shortText,
  sizeClass,
} from './fields.ts';
import { serviceKinds } from './services.contract.ts';

const span = z.object({ from: instant, to: instant });
const policyDto = z.object({
  version: z.int(),
  words: z.string(),
  /** Before the window: until then changing and calling off is free. */
  freeUntilHours: z.int(),
  lateFeeCents: z.int(),
});
export type PolicyDto = z.infer<typeof policyDto>;

export const onlineMenuDto = z.object({
  isOn: z.boolean(),
  companyName: z.string(),
  companyPhone: z.string(),
  zone: z.string(),
  clock: z.enum(['12', '24']),
  services: z.array(
    z.object({
      id,
      name: z.string(),
      kind: z.enum(serviceKinds),
      description: z.string(),
      /** For one person; a larger crew is quicker. */
      prices: z.array(z.object({ sizeClass, priceCents: z.int(), minutes: z.int() })),
      needsWater: z.boolean(),
      needsPower: z.boolean(),
    }),
  ),
  policy: policyDto,
});
export type OnlineMenuDto = z.infer<typeof onlineMenuDto>;

/** The work and the place. */
const askBody = z.strictObject({
  sizeClass,
  serviceIds: z.array(id).min(1, 'Choose at least one service.').max(10, 'At most ten services at once.'),
  line: z.string().trim().min(1, 'Give the street and number.').max(160, 'At most 160 letters.'),
  city: z.string().trim().min(1, 'Give the town.').max(80, 'At most 80 letters.'),
  postcode: z.string().trim().max(16, 'At most 16 letters.'),
  hasWater: z.boolean(),
  hasPower: z.boolean(),
});
export type OnlineAsk = z.infer<typeof askBody>;

const offeredDays = z.array(
  z.object({ day, windows: z.array(span.extend({ isFree: z.boolean(), minutes: z.int().nullable() })) }),
);
export type OfferedDays = z.infer<typeof offeredDays>;

export const getOnlineMenu = endpoint({
  method: 'get',
  path: '/api/online-booking',
  roles: 'public',
  summary: 'What can be booked online, with today’s prices and the terms; nothing of it while online booking is off.',
  response: z.object({ menu: onlineMenuDto }),
});
export const findWindows = endpoint({
  method: 'post',
  path: '/api/online-booking/windows',
  roles: 'public',
  summary:
    'The arrival windows that are truly free for this work at this address. Nothing is kept; a post, so that no address stands in a log.',
  body: askBody,
  response: z.object({ days: offeredDays }),
});
export const holdWindow = endpoint({
  method: 'post',
  path: '/api/online-booking/holds',
  roles: 'public',
  summary: 'Keep a window for ten minutes. Of two who want the last place one gets it.',
  body: askBody.extend({
    from: instant,
    /** Let go of first: another time was chosen. */ insteadOf: id.nullable().default(null),
  }),
  response: z.object({ hold: span.extend({ id, expiresAt: instant }) }),
});
export const proveEmail = endpoint({
  method: 'post',
  path: '/api/online-booking/holds/:id/code',
  roles: 'public',
  summary: 'Who books, and the terms accepted; a code goes to the e-mail address.',
  params: z.object({ id }),
  body: z.strictObject({
    name,
    phone: phone.min(7, 'Give a phone number with digits, like 555-0142.'),
    email,
    vehicle: z.string().trim().min(1, 'Say which car, like 2019 hatchback, gray.').max(120, 'At most 120 letters.'),
    notes: shortText,
    policyVersion: z.int('Read and accept the terms.').min(1, 'Read and accept the terms.'),
    /** Nobody sees this field: who fills it in is no person. */
    website: z.string().max(300).default(''),
  }),
  response: z.object({ expiresAt: instant }),
});
export const bookHeld = endpoint({
  method: 'post',
  path: '/api/online-booking/holds/:id/booking',
  roles: 'public',
  summary: 'Book what is held, with the code from the mail.',
  params: z.object({ id }),
  body: z.strictObject({
    code: z
      .string()
      .trim()
      .regex(/^\d{6}$/, 'Type the six digits from the mail.'),
  }),
  response: z.object({ booked: span.extend({ jobNumber: z.int(), path: z.string() }) }),
});

const settingsFields = {
  isOn: z.boolean(),
  serviceIds: z.array(id).max(200),
  places: z.array(z.string().trim().min(1).max(80, 'At most 80 letters.')).max(200, 'At most 200 towns and postcodes.'),
  noticeHours: z.int('Give whole hours.').min(0, 'At least 0 hours.').max(336, 'At most 336 hours.'),
  farthestDays: z.int('Give whole days.').min(1, 'At least a day.').max(90, 'At most 90 days.'),
  starts: z.array(clockTime).min(1, 'Give at least one time, like 08:00.').max(12, 'At most twelve windows a day.'),
  windowMinutes: z.int('Give whole minutes.').min(15, 'At least 15 minutes.').max(480, 'At most 480 minutes.'),
  policyWords: z.string().trim().min(1, 'Write the terms that customers accept.').max(5000, 'At most 5,000 letters.'),
  freeUntilHours: z.int('Give whole hours.').min(0, 'At least 0 hours.').max(336, 'At most 336 hours.'),
  lateFeeCents: positiveCents.max(1_000_000, 'At most 10,000.'),
  version: planVersion,
};
export const onlineSettingsDto = z.object({ ...settingsFields, policyVersion: z.int() });
export type OnlineSettingsDto = z.infer<typeof onlineSettingsDto>;
const settingsBody = z.strictObject(settingsFields).refine(({ isOn, serviceIds }) => !isOn || serviceIds.length > 0, {
  path: ['serviceIds'],
  message: 'Choose at least one service before it goes on.',
});
export type OnlineSettingsBody = z.infer<typeof settingsBody>;
export const getOnlineSettings = endpoint({
  method: 'get',
  path: '/api/online-booking/settings',
  roles: ['owner'],
  summary: 'What strangers may book online, where and when, and the terms.',
  response: z.object({ settings: onlineSettingsDto }),
});
export const updateOnlineSettings = endpoint({
  method: 'put',
  path: '/api/online-booking/settings',
  roles: ['owner'],
  summary: 'Change online booking. Other terms become a new version; what was accepted stays as it was.',
  body: settingsBody,
  response: z.object({ settings: onlineSettingsDto }),
});

const token = z.object({ token: z.string().min(20).max(80) });
export const ownBookingDto = z.object({
  /** Booked online and nobody has set off yet. */
  mayChange: z.boolean(),
  freeUntil: instant.nullable(),
  /** What changing or calling off costs now. */
  feeCents: z.int(),
  policy: policyDto.nullable(),
});
export type OwnBookingDto = z.infer<typeof ownBookingDto>;
export const getOwnBooking = endpoint({
  method: 'get',
  path: '/api/customer-pages/:token/booking',
  roles: 'public',
  summary: 'Whether a customer may change or call off by the link, until when it is free, and the fee after that.',
  params: token,
  response: z.object({ booking: ownBookingDto }),
});
export const callOffOwn = endpoint({
  method: 'post',
  path: '/api/customer-pages/:token/call-off',
  roles: 'public',
  summary: 'A customer calls a job off by the link. A fee is proposed to the desk, never charged by itself.',
  params: token,
  /** The fee that was shown: when it has grown since, nothing happens. */
  body: z.strictObject({ feeCents: positiveCents }),
  response: z.object({ booking: ownBookingDto }),
});
