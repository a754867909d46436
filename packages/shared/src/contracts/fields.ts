import { z } from 'zod';
import { wholeSeconds } from '../domain/time/zone.ts';

/** Small schemas that several contracts share, each with a sentence that tells a person what to do. */
export const id = z.uuid('Choose one from the list.');
export const day = z.iso.date('Give a date like 2026-05-14.');
/** Any offset comes in, whole seconds of UTC go on. */
export const instant = z.iso.datetime({ offset: true, message: 'Give a date and time.' }).transform(wholeSeconds);
export const clockTime = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'Give a time like 08:30.');
export const planVersion = z.int().min(0);
export const cents = z
  .int('Give an amount in dollars and cents.')
  .min(-100_000_000, 'That amount is too large.')
  .max(100_000_000, 'That amount is too large.');
export const positiveCents = cents.min(0, 'An amount can’t be below zero.');
export const minutes = z
  .int('Give whole minutes.')
  .min(5, 'At least 5 minutes.')
  .max(7 * 24 * 60, 'At most a week.');
/** A dated rate, percent or price kept exactly: at most eight digits before and six after the point. */
export const decimal = z.string().regex(/^\d{1,8}(\.\d{1,6})?$/, 'Give a number like 19.50.');
export const name = z.string().trim().min(1, 'Give a name.').max(120, 'At most 120 letters.');
export const shortText = z.string().trim().max(300, 'At most 300 letters.');
export const longText = z.string().trim().max(10_000, 'At most 10,000 letters.');
export const email = z.email('Give an e-mail address like name@company.example.').max(254).toLowerCase();
export const phone = z
  .string()
  .trim()
  .max(40, 'At most 40 letters.')
  .regex(/^[0-9+()\-.\sx]*$/i, 'Give a phone number with digits, like 555-0142.');
export const password = z.string().min(10, 'At least 10 letters.').max(200, 'At most 200 letters.');
export const zone = z.string().refine(isZone, 'Choose a time zone like America/New_York.');

export const sizeClasses = ['coupe', 'sedan', 'small_suv', 'large_suv', 'van'] as const;
export const sizeClass = z.enum(sizeClasses, 'Choose a size class.');
export type SizeClass = (typeof sizeClasses)[number];
export const sizeClassNames: Record<SizeClass, string> = {
  coupe: 'Coupe',
  sedan: 'Sedan',
  small_suv: 'Small SUV',
  large_suv: 'Large SUV or truck',
  van: 'Van',
};

export const skills = ['correction', 'coating', 'interior', 'lead'] as const;
export const skill = z.enum(skills);
export type Skill = (typeof skills)[number];
export const equipmentKinds = ['polisher', 'extractor', 'generator', 'water_tank', 'steamer'] as const;
export const equipment = z.enum(equipmentKinds);
export type Equipment = (typeof equipmentKinds)[number];
export const skillNames: Record<Skill, string> = {
  correction: 'Correction',
  coating: 'Coating',
  interior: 'Interior',
  lead: 'Lead',
};
export const equipmentNames: Record<Equipment, string> = {
  polisher: 'Polisher',
  extractor: 'Extractor',
  generator: 'Generator',
  water_tank: 'Water tank',
  steamer: 'Steamer',
};

export const roleName = z.enum(['owner', 'dispatcher', 'technician'], 'Choose a role.');
export const done = z.object({ ok: z.literal(true) });
/** A file, as it is sent. */
export const bytes = z.custom<Uint8Array>((value) => value instanceof Uint8Array);

function isZone(value: string): boolean {
  try {
    new Intl.DateTimeFormat('en-US', { timeZone: value });
    return true;
  } catch {
    return false;
  }
}
