import { z } from 'zod';
import { cashCountDto } from './cash.contract.ts';
import { paymentMethods } from './bill.dto.ts';
import { endpoint } from './endpoint.ts';
import { day, id, instant } from './fields.ts';
import { desk } from '../authz/actor.ts';
import { differenceKinds } from '../domain/billing/day-difference.ts';

const sum = z.object({ count: z.int(), cents: z.int() });
/** One day of the company's zone; integer cents. What people still hold and what pages are open is as of now. */
export const moneyDayDto = z.object({
  day,
  invoiced: z.object({ count: z.int(), netCents: z.int(), taxCents: z.int(), totalCents: z.int() }),
  credited: sum,
  methods: z.array(
    z.object({
      method: z.enum(paymentMethods),
      received: sum,
      /** Without what failed; what still waits for the payments service is in it. */
      givenBack: sum,
      waitingCents: z.int(),
      /** Held by a card holder's bank, part of what was given back. */
      disputedCents: z.int(),
    }),
  ),
  /** Recorded that day and taken back as a mistake; in none of the other figures. */
  mistaken: sum,
  /** Beside what was received by card. */
  cardTips: sum,
  /** Received less given back. */
  netReceivedCents: z.int(),
  difference: z.array(z.object({ kind: z.enum(differenceKinds), cents: z.int() })),
  cash: z.object({
    /** Taken that day with the tips handed over, what the crew kept left out. */
    takenCents: z.int(),
    tipCents: z.int(),
    countedCents: z.int(),
    counts: z.array(cashCountDto),
    /** Of this day's cash, by who holds it. */
    stillOut: z.array(z.object({ name: z.string(), cents: z.int() })),
  }),
  openPages: z.array(
    z.object({
      ...{ id, jobId: id, jobNumber: z.int(), customerName: z.string() },
      ...{ amountCents: z.int(), tipCents: z.int(), openedAt: instant },
    }),
  ),
});
export type MoneyDayDto = z.infer<typeof moneyDayDto>;

export const getMoneyDay = endpoint({
  method: 'get',
  path: '/api/money/days/:day',
  roles: desk,
  summary: 'The close of a day: invoiced, received and given back by method, tips by card, cash, pages still open.',
  params: z.object({ day }),
  response: z.object({ close: moneyDayDto }),
});
export const exportMoneyDay = endpoint({
  method: 'get',
  path: '/api/money/days/:day/payments.csv',
  roles: desk,
  summary: 'A row per payment and per amount given back on a day (RFC 4180).',
  params: z.object({ day }),
  response: z.string(),
  format: 'csv',
});
