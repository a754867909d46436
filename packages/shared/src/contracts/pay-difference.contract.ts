import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { day, instant } from './fields.ts';
import type { PersonDifference } from '../domain/pay/week-difference.ts';

/** The engine's own types are the description. */
const personDifference = z.custom<PersonDifference>((value) => typeof value === 'object' && value !== null);

export const getPayDifference = endpoint({
  method: 'get',
  path: '/api/pay/weeks/:startsOn/difference',
  roles: ['owner'],
  summary: 'What differs in a week against the week before, or against the figures as they were last checked.',
  params: z.object({ startsOn: day }),
  query: z.object({ against: z.enum(['week_before', 'last_checked']) }),
  response: z.object({
    against: z.object({
      startsOn: day,
      number: z.int(),
      /** When the figures were checked; null for the week before. */
      checkedAt: instant.nullable(),
    }),
    /** Null where the week was never checked. */
    people: z.array(personDifference).nullable(),
    unchanged: z.int(),
  }),
});

export const listLateWeeks = endpoint({
  method: 'get',
  path: '/api/pay/late-weeks',
  roles: ['owner'],
  summary: 'Locked weeks of the last month that today’s records would pay otherwise, and no correction has made up.',
  response: z.object({
    weeks: z.array(
      z.object({
        startsOn: day,
        number: z.int(),
        people: z.array(z.object({ name: z.string(), missingCents: z.int() })),
      }),
    ),
  }),
});
