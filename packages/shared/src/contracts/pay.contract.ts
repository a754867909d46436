import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { bytes, cents, day, decimal, done, id, instant, shortText } from './fields.ts';
import { everyone } from '../authz/actor.ts';
import type { PayLine, PayWarning, PersonWeek } from '../domain/pay/pay-week.types.ts';
import { statementTimeOff } from '../domain/pay/time-off/statement-time-off.ts';

const owner = ['owner'] as const;

export const payWeekStates = ['draft', 'checked', 'locked'] as const;
export const payWeekHead = z.object({
  /** Null for a week that nobody has checked, locked or added to yet. */
  id: id.nullable(),
  startsOn: day,
  /** Last day inside the week. */
  endsOn: day,
  startsAt: instant,
  endsAt: instant,
  number: z.int(),
  state: z.enum(payWeekStates),
  checkedAt: instant.nullable(),
  checkedBy: z.string().nullable(),
  lockedAt: instant.nullable(),
  lockedBy: z.string().nullable(),
  version: z.int(),
});
export type PayWeekHead = z.infer<typeof payWeekHead>;

/** The engine's own types are the description; the shape is checked where it is computed. */
const personWeek = z.custom<PersonWeek>((value) => typeof value === 'object' && value !== null);
export const payLineDto = z.custom<PayLine & { id?: string }>((value) => typeof value === 'object' && value !== null);
export type { PayLine, PayWarning, PersonWeek };

export const adjustmentKinds = [
  'bonus',
  'discretionary_bonus',
  'reimbursement',
  'paid_time_off',
  'refund',
  'deduction',
  'correction',
] as const;
/** An amount that is a count times the dated rate of a day. */
const countedBody = z.strictObject({
  unit: z.enum(['mile', 'review']),
  quantity: decimal.refine((v) => Number(v) > 0, 'Give how many.'),
  /** The rate of this day counts. */
  on: day,
});
export const adjustmentDto = z.object({
  id,
  personId: id,
  kind: z.enum(adjustmentKinds),
  amountCents: cents,
  reason: z.string(),
  correctsLineId: id.nullable(),
  by: z.string(),
});
export const listPayWeeks = endpoint({
  method: 'get',
  path: '/api/pay/weeks',
  roles: owner,
  summary: 'The pay weeks, newest first, with gross and hours.',
  response: z.object({
    weeks: z.array(
      payWeekHead.extend({
        /** Null until the week is locked; tips to be paid out are in the gross and named beside it. */
        grossCents: z.int().nullable(),
        tipCents: z.int().nullable(),
        salesCents: z.int(),
      }),
    ),
  }),
});
/** A locked line that a correction names, by the database's id of the line. */
const correctedLine = z.object({
  startsOn: day,
  number: z.int(),
  key: z.string(),
  label: z.string(),
  position: z.int(),
});
const correctedLines = z.record(z.string(), correctedLine);
/** Customers by job id, from today's rows: lines name them by job number only. */
const customers = z.record(z.string(), z.string());
export type CorrectedLine = z.infer<typeof correctedLine>;
/** Locked weeks that end in the year of this week, up to it; the week itself counts while it is open too. */
const yearToDate = z.object({
  year: z.int(),
  weeks: z.int(),
  /** Exact hours, a fraction. */
  hours: z.string(),
  grossCents: z.int(),
  tipCents: z.int(),
  overtimePremiumCents: z.int(),
});
export type YearToDate = z.infer<typeof yearToDate>;
/** By person. */
const yearsToDate = z.record(z.string(), yearToDate);
export const payWeekDto = z.object({
  week: payWeekHead,
  people: z.array(personWeek),
  adjustments: z.array(adjustmentDto),
  salesCents: z.int(),
  /** What stored lines are called in the database, by person and key; only for a locked week. */
  lineIds: z.record(z.string(), id),
  engineVersion: z.string(),
  /**
   * For a locked week: what today's records would pay instead, where that differs and corrections in other weeks,
   * `correctedCents` in all, have not made it up. Paid by a correction in an open week.
   */
  lateDifferences: z.array(
    z.object({
      personId: id,
      name: z.string(),
      lockedCents: z.int(),
      nowCents: z.int(),
      correctedCents: z.int(),
    }),
  ),
  correctedLines,
  customers,
  yearsToDate,
  /** Balances of paid time off by person: of a locked week as they were when it was locked, of an open one when asked for. */
  timeOff: z.record(z.string(), z.array(statementTimeOff)),
  /** When the clock entries and jobs that warnings name took place, by their ids. */
  warningTimes: z.record(z.string(), instant),
  /** Of a week that is not locked: visits of days gone by that nobody ended, so that their work earns nothing yet. */
  unended: z.array(z.object({ visitId: id, jobNumber: z.int(), day, crewNames: z.array(z.string()) })),
});
export type PayWeekDto = z.infer<typeof payWeekDto>;
const weekParam = z.object({ startsOn: day });
export const getPayWeek = endpoint({
  method: 'get',
  path: '/api/pay/weeks/:startsOn',
  roles: owner,
  summary: 'The pay week that holds a day: per person hours, lines and warnings, each line with its working.',
  params: weekParam,
  /** Of an open week, everybody's balances of paid time off too. */
  query: z.object({ timeOff: z.literal('all').optional() }),
  response: payWeekDto,
});
export const setPayWeekState = endpoint({
  method: 'post',
  path: '/api/pay/weeks/:startsOn/state',
  roles: owner,
  summary: 'Mark as checked, back to draft, or lock. A locked week never changes.',
  params: weekParam,
  body: z.strictObject({ to: z.enum(payWeekStates), version: z.int() }),
  response: payWeekDto,
});
const takingKinds: readonly string[] = ['deduction', 'refund'];
export const addAdjustment = endpoint({
  method: 'post',
  path: '/api/pay/weeks/:startsOn/adjustments',
  roles: owner,
  summary: 'Add an amount with its reason to an open week; a correction names the locked line.',
  params: weekParam,
  body: z
    .strictObject({
      personId: id,
      kind: z.enum(adjustmentKinds),
      /** Null where it is counted. */
      amountCents: cents.refine((v) => v !== 0, 'Give an amount.').nullable(),
      reason: shortText.min(1, 'Say what it is for.'),
      correctsLineId: id.nullable(),
      counted: countedBody.nullable().default(null),
      refundReasonId: id.nullable().default(null),
    })
    .refine((a) => (a.amountCents === null) === (a.counted !== null), {
      path: ['amountCents'],
      message: 'Give an amount.',
    })
    .refine(({ kind, amountCents: v }) => v === null || kind === 'correction' || v < 0 === takingKinds.includes(kind), {
      path: ['amountCents'],
      message: 'A deduction or refund is below zero, everything else but a correction above.',
    })
    .refine((a) => a.counted === null || a.kind === (a.counted.unit === 'mile' ? 'reimbursement' : 'bonus'), {
      path: ['kind'],
      message: 'Miles are a reimbursement, reviews a bonus.',
    })
    .refine((a) => (a.kind === 'refund') === (a.refundReasonId !== null), {
      path: ['refundReasonId'],
      message: 'Choose why the customer was refunded.',
    })
    .refine((a) => a.kind !== 'correction' || a.correctsLineId !== null, {
      path: ['correctsLineId'],
      message: 'Choose the locked line that this corrects.',
    }),
  response: payWeekDto,
});
export const removeAdjustment = endpoint({
  method: 'delete',
  path: '/api/pay/adjustments/:id',
  roles: owner,
  summary: 'Take an adjustment out of an open week.',
  params: z.object({ id }),
  response: done,
});
export const exportPayWeek = endpoint({
  method: 'get',
  path: '/api/pay/weeks/:startsOn/export.csv',
  roles: owner,
  summary: 'The week for a payroll processor: a row per person and line (RFC 4180).',
  params: weekParam,
  response: z.string(),
  format: 'csv',
});

export const statementHead = z.object({
  weekId: id,
  startsOn: day,
  endsOn: day,
  number: z.int(),
  lockedAt: instant,
  grossCents: z.int(),
});
export const listStatements = endpoint({
  method: 'get',
  path: '/api/pay/statements',
  roles: everyone,
  summary: 'One’s own statements of locked weeks.',
  response: z.object({ statements: z.array(statementHead) }),
});
export const getStatement = endpoint({
  method: 'get',
  path: '/api/pay/statements/:startsOn/:personId',
  roles: everyone,
  summary: 'One person’s statement of a week: one’s own when locked, anybody’s for the owner.',
  params: weekParam.extend({ personId: id }),
  response: z.object({
    week: payWeekHead,
    person: personWeek,
    companyName: z.string(),
    correctedLines,
    customers,
    yearToDate,
    timeOff: z.array(statementTimeOff),
  }),
});
export const getStatementPdf = endpoint({
  method: 'get',
  path: '/api/pay/statements/:startsOn/:personId/statement.pdf',
  roles: everyone,
  summary: 'The same statement as a PDF on Letter paper, fonts embedded.',
  params: weekParam.extend({ personId: id }),
  response: bytes,
  format: 'pdf',
});
export type StatementDto = z.infer<(typeof getStatement)['response']>;

export const getWeekSoFar = endpoint({
  method: 'get',
  path: '/api/pay/week-so-far',
  roles: ['technician'],
  summary: 'What one’s own running week comes to so far: an estimate until the week is locked.',
  response: z.object({
    startsOn: day,
    endsOn: day,
    number: z.int(),
    asOf: instant,
    isEstimate: z.literal(true),
    hoursWorked: z.string(),
    overtimeHours: z.string(),
    grossCents: z.int(),
    tipCents: z.int(),
    /** What could still change it, in words. */
    warnings: z.array(z.string()),
  }),
});
export type WeekSoFar = z.infer<(typeof getWeekSoFar)['response']>;
