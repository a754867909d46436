import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { day, done, id } from './fields.ts';

const owner = ['owner'] as const;

const unpaidJob = z.object({
  jobId: id,
  jobNumber: z.int(),
  customerName: z.string(),
  /** Company-zone day of the last finished line. */
  doneOn: day,
  /** After the discount, before tax and tips. */
  totalCents: z.int(),
});
const paidJob = unpaidJob.extend({ paidOn: day, recordedBy: z.string(), mayTakeBack: z.boolean() });
export type UnpaidJob = z.infer<typeof unpaidJob>;
export type PaidJob = z.infer<typeof paidJob>;

export const listJobsPaid = endpoint({
  method: 'get',
  path: '/api/pay/jobs-paid',
  roles: owner,
  summary: 'Jobs whose commission waits until the customer pays, oldest first, and those paid for lately.',
  response: z.object({ waiting: z.array(unpaidJob), paid: z.array(paidJob) }),
});
export const markJobPaid = endpoint({
  method: 'post',
  path: '/api/pay/jobs-paid',
  roles: owner,
  summary: 'The customer has paid this job in full; its commission is settled in the week that holds the day.',
  body: z.strictObject({ jobId: id, paidOn: day }),
  response: done,
});
export const takeBackJobPaid = endpoint({
  method: 'delete',
  path: '/api/pay/jobs-paid/:jobId',
  roles: owner,
  summary: 'The job was not paid after all; only while the week that settled it is open.',
  params: z.object({ jobId: id }),
  response: done,
});
