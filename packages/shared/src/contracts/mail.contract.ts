import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { id, instant } from './fields.ts';

export const listLocalMail = endpoint({
  method: 'get',
  path: '/api/local-mail',
  roles: ['owner'],
  summary: 'What the local mail fake took; only with the fake, on loopback.',
  response: z.object({
    mails: z.array(
      z.object({
        ...{ id, to: z.string(), subject: z.string(), text: z.string(), at: instant },
        html: z.string().optional(),
        /** The calendar file that came with it. */
        calendar: z.string().optional(),
      }),
    ),
    texts: z.array(z.object({ key: z.string(), to: z.string(), body: z.string(), at: instant })),
  }),
});
