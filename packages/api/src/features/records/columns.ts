import { z } from 'zod';
import { customerEmail } from '@driprail/shared/contracts/customers-record.contract';
import { clockTime, day, name, phone, sizeClasses, sizeClassNames } from '@driprail/shared/contracts/fields';
import type { SizeClass } from '@driprail/shared/contracts/fields';

const optional = (max: number) => z.string().max(max, `At most ${max} letters.`).default('');
const yesNo = z
  .enum(['yes', 'no', ''], 'Say yes or no.')
  .default('')
  .transform((value) => value === 'yes');
const coordinate = (limit: number) =>
  z
    .string()
    .default('')
    .transform((text, context) => {
      if (text === '') return null;
      const value = Number(text);
      if (Number.isFinite(value) && Math.abs(value) <= limit) return value;
      context.addIssue({ code: 'custom', message: `Give a number from -${limit} to ${limit}, or nothing.` });
      return z.NEVER;
    });
/** Takes the code or the name that people see. */
const sizeClass = z
  .string()
  .default('')
  .transform((text, context): SizeClass | null => {
    if (text === '') return null;
    const found = sizeClasses.find(
      (size) => size === text || sizeClassNames[size].toLowerCase() === text.toLowerCase(),
    );
    if (found) return found;
    context.addIssue({ code: 'custom', message: `Give one of ${sizeClasses.join(', ')}.` });
    return z.NEVER;
  });

/** A row of customers.csv. Rows of one name and phone are one customer: a new street is another address, a new vehicle another vehicle. */
export const customerRow = z.strictObject({
  name,
  company: yesNo,
  phone: phone.default(''),
  email: customerEmail.default(''),
  street: z.string().min(1, 'Give the street and number.').max(160),
  city: optional(80),
  zip: optional(16),
  area: optional(60),
  lat: coordinate(90),
  lng: coordinate(180),
  gate_code: optional(40),
  access_notes: optional(300),
  spigot: yesNo,
  outlet: yesNo,
  vehicle: optional(80),
  color: optional(40),
  plate: optional(16),
  size_class: sizeClass,
  notes: optional(10_000),
});
export type CustomerRow = z.infer<typeof customerRow>;

/** A row of jobs.csv. Rows of one reference are the lines of one job. */
export const jobRow = z.strictObject({
  ref: z.string().min(1, 'Give a reference: rows with the same one are one job.').max(60),
  customer: name,
  street: optional(160),
  service: z.string().min(1, 'Name a service of the menu.'),
  plate: optional(16),
  size_class: sizeClass,
  price: z
    .string()
    .regex(/^(\d{1,6}(\.\d{1,2})?)?$/, 'Give an amount like 240.00, or nothing for the menu’s.')
    .default(''),
  date: day.or(z.literal('')).default(''),
  from: clockTime.or(z.literal('')).default(''),
  to: clockTime.or(z.literal('')).default(''),
  notes: optional(10_000),
});
export type JobRow = z.infer<typeof jobRow>;
