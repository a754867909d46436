import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { clockTime } from './fields.ts';
import { messageKinds } from '../domain/messages/kinds.ts';
import { placeholderFault } from '../domain/messages/placeholders.ts';

/** A field of a template: what stands in braces must be known. */
const template = (most: number) =>
  z
    .string()
    .trim()
    .min(1, 'Write something, or go back to our words.')
    .max(most, `At most ${most.toLocaleString('en-US')} letters.`)
    .superRefine((text, context) => {
      const fault = placeholderFault(text);
      if (fault) context.addIssue({ code: 'custom', message: fault });
    });

const words = {
  subject: template(150).refine((text) => !/[\r\n]/.test(text), 'A subject is one line.'),
  body: template(5000),
  text: template(480),
};

export const messageHours = z.object({
  quietFrom: clockTime,
  quietTo: clockTime,
  reminderAt: clockTime,
  feedbackHours: z.int('Give whole hours.').min(1, 'At least 1 hour.').max(72, 'At most 72 hours.'),
  version: z.int(),
});
export type MessageHours = z.infer<typeof messageHours>;

export const messageKindDto = z.object({
  kind: z.enum(messageKinds),
  isOn: z.boolean(),
  subject: z.string(),
  body: z.string(),
  text: z.string(),
  /** Whether the words are the ones each company starts with. */
  isOurs: z.boolean(),
  version: z.int(),
});
export type MessageKindDto = z.infer<typeof messageKindDto>;

export const getMessageSettings = endpoint({
  method: 'get',
  path: '/api/message-settings',
  roles: ['owner'],
  summary: 'Hours of messages to customers, and each kind with its words.',
  response: z.object({ hours: messageHours, kinds: z.array(messageKindDto) }),
});
export const updateMessageHours = endpoint({
  method: 'put',
  path: '/api/message-settings',
  roles: ['owner'],
  summary: 'Change quiet hours, the reminder’s hour and the wait before asking how it went.',
  body: messageHours.strict(),
  response: z.object({ hours: messageHours }),
});
export const updateMessageKind = endpoint({
  method: 'put',
  path: '/api/message-kinds/:kind',
  roles: ['owner'],
  summary: 'Switch a kind of message on or off, or change its words.',
  params: z.object({ kind: z.enum(messageKinds) }),
  body: z.strictObject({ isOn: z.boolean(), ...words, version: z.int() }),
  response: z.object({ kind: messageKindDto }),
});
export const previewMessage = endpoint({
  method: 'post',
  path: '/api/message-kinds/:kind/preview',
  roles: ['owner'],
  summary: 'A message with the next real job’s facts, or sample ones; nothing is sent.',
  params: z.object({ kind: z.enum(messageKinds) }),
  body: z.strictObject(words),
  response: z.object({
    /** Whose job it shows; null: a sample. */
    jobNumber: z.int().nullable(),
    subject: z.string(),
    html: z.string(),
    text: z.string(),
  }),
});
