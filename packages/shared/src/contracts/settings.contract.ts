import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { clockTime, email, name, password, phone, zone } from './fields.ts';
import { sessionDto } from './session.contract.ts';
import { everyone } from '../authz/actor.ts';
import { warningCodes } from '../domain/board/findings.ts';

export const settingsDto = z.object({
  name,
  phone,
  email: email.or(z.literal('')),
  zone,
  clock: z.enum(['12', '24']),
  units: z.enum(['us', 'metric']),
  dayStartsAt: clockTime,
  dayEndsAt: clockTime,
  undoSeconds: z.int().min(0).max(600),
  /** Kinds of warning that are only saved with a reason. */
  reasonKinds: z.array(z.enum(warningCodes)),
  /** Whether the mail at the lock names gross and hours beside the link; off to begin with, mail is not private. */
  statementMailShowsFigures: z.boolean(),
  /** What a crew calls in an emergency. */
  emergencyNumber: phone.min(2, 'Give the emergency number of the place, like 911.').default('911'),
  /** Minutes of work without a break after which the phone reminds; null: it does not. Places differ, the owner sets it. */
  mealReminderMinutes: z.int().min(60).max(720).nullable().default(null),
  restReminderMinutes: z.int().min(30).max(720).nullable().default(null),
  /** Days from an invoice's own to the day it is due. */
  /** The largest discount that a dispatcher gives without the owner, percent of the job. */
  deskDiscountPercent: z.int('Give a whole percent.').min(0).max(100, 'At most 100 percent.').default(100),
  invoiceDueDays: z
    .int('Give whole days.')
    .min(0, 'An invoice can’t be due before it is sent.')
    .max(120, 'At most 120 days.'),
  version: z.int(),
});
export type SettingsDto = z.infer<typeof settingsDto>;

export const getSettings = endpoint({
  method: 'get',
  path: '/api/settings',
  roles: everyone,
  summary: 'The company’s settings.',
  response: z.object({ settings: settingsDto }),
});
export const updateSettings = endpoint({
  method: 'put',
  path: '/api/settings',
  roles: ['owner'],
  summary: 'Change the company’s settings.',
  body: settingsDto.strict(),
  response: z.object({ settings: settingsDto }),
});
export const getSetUp = endpoint({
  method: 'get',
  path: '/api/set-up',
  roles: 'public',
  summary: 'Whether this company still waits to be set up.',
  response: z.object({ isNeeded: z.boolean() }),
});
export const completeSetUp = endpoint({
  method: 'post',
  path: '/api/set-up',
  roles: 'public',
  summary: 'Set up the company and its owner with the one-time code printed in the terminal; signs the owner in.',
  body: z.strictObject({
    code: z.string().trim().min(1, 'Give the code that the terminal shows.').max(40),
    companyName: name,
    zone,
    ownerName: name,
    email,
    password,
  }),
  response: sessionDto,
});
