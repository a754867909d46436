import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { day, id, name, shortText } from './fields.ts';

const owner = ['owner'] as const;

/** A refund may lower a person's commission; overtime may go by the rate in effect. Both only by a signed paper. */
export const agreementKinds = ['refunds', 'rate_in_effect'] as const;
export const agreementDto = z.object({
  id,
  personId: id,
  personName: z.string(),
  kind: z.enum(agreementKinds),
  startsOn: day,
  /** Null where the agreement ends on that day. */
  signedOn: day.nullable(),
  note: z.string(),
  setBy: z.string(),
});
export type AgreementDto = z.infer<typeof agreementDto>;

export const refundReasonDto = z.object({
  id,
  name: z.string(),
  lowersCommission: z.boolean(),
  startsOn: day,
  setBy: z.string(),
});
export type RefundReasonDto = z.infer<typeof refundReasonDto>;

export const listAgreements = endpoint({
  method: 'get',
  path: '/api/pay/agreements',
  roles: owner,
  summary: 'What persons agreed to in writing, and the reasons for refunds with what each does to commission.',
  response: z.object({ agreements: z.array(agreementDto), refundReasons: z.array(refundReasonDto) }),
});
export const addAgreement = endpoint({
  method: 'post',
  path: '/api/pay/agreements',
  roles: owner,
  summary: 'A signed agreement from the first day of a workweek on, or its end.',
  body: z
    .strictObject({
      personId: id,
      kind: z.enum(agreementKinds),
      startsOn: day,
      signedOn: day.nullable(),
      note: shortText,
    })
    .refine((a) => a.signedOn === null || a.signedOn <= a.startsOn, {
      path: ['signedOn'],
      message: 'It must be signed before the first week it holds for.',
    })
    .refine((a) => a.signedOn === null || a.note !== '', {
      path: ['note'],
      message: 'Say what was agreed and where the paper is kept.',
    }),
  response: z.object({ agreement: agreementDto }),
});
export const addRefundReason = endpoint({
  method: 'post',
  path: '/api/pay/refund-reasons',
  roles: owner,
  summary: 'A reason for refunds, from a day on: whether it lowers commission. The same name again changes it.',
  body: z.strictObject({ name, lowersCommission: z.boolean(), startsOn: day }),
  response: z.object({ refundReason: refundReasonDto }),
});
