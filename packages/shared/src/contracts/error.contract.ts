import { z } from 'zod';

/** One refusal or warning of a plan: what, in a sentence, and the facts it stands on. */
export const finding = z.object({
  visitId: z.uuid(),
  code: z.string(),
  /** Stays the same while the facts stay the same, so that a reason is asked for once. */
  key: z.string(),
  message: z.string(),
});

/** The one shape of every refusal. `fields` maps a path in the body ("lines.0.serviceId") to a sentence. */
export const errorBody = z.object({
  error: z.object({
    code: z.string(),
    message: z.string(),
    fields: z.record(z.string(), z.string()).optional(),
    hint: z
      .object({
        refusals: z.array(finding).optional(),
        warnings: z.array(finding).optional(),
        /** The newer state after a version mismatch. */
        current: z.unknown().optional(),
        requestId: z.string().optional(),
        /** Whose session somebody ended: what this device kept for that user goes. */
        endedFor: z.uuid().optional(),
      })
      .optional(),
  }),
});
export type ErrorBody = z.infer<typeof errorBody>;
export type ErrorHint = NonNullable<ErrorBody['error']['hint']>;
