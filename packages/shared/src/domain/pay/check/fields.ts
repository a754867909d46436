import { z } from 'zod';
import { exact, type Exact } from '../../money/exact.ts';

/** The kinds of values a scenario's inputs hold, each read exactly or refused with a sentence. */

const DECIMAL = /^[+-]?(\d+(\.\d*)?|\.\d+)$/;
const HOURS_AND_MINUTES = /^(\d{1,3}):([0-5]\d)$/;
const CLOCK = /^(\d{1,2}):([0-5]\d)(?::([0-5]\d))?\s*([ap])?\.?m?\.?$/i;

type Refine = z.core.$RefinementCtx;

function refuse(ctx: Refine, message: string): typeof z.NEVER {
  ctx.addIssue({ code: 'custom', message });
  return z.NEVER;
}

const textOrNumber = z
  .union([z.string(), z.number()], { error: 'needs a number, such as "46.5"' })
  .transform((value) => String(value).trim());

function decimal(text: string, ctx: Refine): Exact {
  const plain = text.replace(/^\$/, '').replace(/^(\d{1,3})(?:,\d{3})+/, (digits) => digits.replaceAll(',', ''));
  if (!DECIMAL.test(plain)) return refuse(ctx, `"${text}" is not a number`);
  return exact(plain.replace(/^([+-]?)\./, '$10.').replace(/\.$/, ''));
}

function notNegative(value: Exact, ctx: Refine): Exact {
  return value.lt(0) ? refuse(ctx, 'may not be negative') : value;
}

/** Dollars, percent, or any other signed decimal. */
export const signedField = textOrNumber.transform(decimal);
/** Dollars, dollars an hour, or percent; not negative. */
export const amountField = signedField.transform(notNegative);
export const percentField = amountField;
export const minutesField = amountField;
/** More than zero. */
export const positiveField = amountField.transform((value, ctx) =>
  value.lte(0) ? refuse(ctx, 'must be more than 0') : value,
);

/** Hours as a decimal or as "h:mm"; not negative. */
export const hoursField = textOrNumber
  .transform((text, ctx) => {
    const parts = HOURS_AND_MINUTES.exec(text);
    return parts ? exact(parts[1] ?? '0').add(exact(parts[2] ?? '0').div(60)) : decimal(text, ctx);
  })
  .transform(notNegative);

/** Hours of one workweek, which has 168 of them. */
export const weekHoursField = hoursField.transform((hours, ctx) =>
  hours.gt(168) ? refuse(ctx, 'is more than the 168 hours of a week') : hours,
);
/** Hours of one day. */
export const dayHoursField = hoursField.transform((hours, ctx) =>
  hours.gt(24) ? refuse(ctx, 'is more than the 24 hours of a day') : hours,
);

/** A clock time, "07:30", "7:30 pm" or "24:00", as exact minutes after midnight. */
export const clockField = z.string({ error: 'needs a clock time, such as "07:30"' }).transform((text, ctx) => {
  const [, hourText = '', minute = '', second = '0', half] = CLOCK.exec(text.trim()) ?? [];
  const hour = Number(hourText);
  const isValid = hourText !== '' && (half ? hour >= 1 && hour <= 12 : hour < 24 || (hour === 24 && minute === '00'));
  if (!isValid) return refuse(ctx, `"${text}" is not a clock time`);
  const hours = half ? (hour % 12) + (half.toLowerCase() === 'p' ? 12 : 0) : hour;
  return exact(hours * 60 + Number(minute)).add(exact(second).div(60));
});

export const flagField = z.union(
  [z.boolean(), z.enum(['true', 'false', 'yes', 'no']).transform((word) => word === 'true' || word === 'yes')],
  {
    error: 'needs true or false',
  },
);

/** A list with at least one entry. */
export function someOf<T extends z.ZodType>(field: T): z.ZodArray<T> {
  return z.array(field, { error: 'needs a list' }).min(1, 'is empty');
}
