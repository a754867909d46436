import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { instant } from './fields.ts';

export const auditEntities = [
  'pay_week',
  'pay_rate',
  'pay_rules',
  'pay_plan',
  'pay_adjustment',
  'payday',
  'job_paid',
  'pay_agreement',
  'refund_reason',
  'clock_entry',
  'clock_request',
  'hours',
  'tip',
  'job',
  'visit',
  'crew',
  'person',
  'customer',
  'service',
  'van',
  'login',
  'settings',
] as const;

export const auditEntryDto = z.object({
  id: z.int(),
  at: instant,
  by: z.string(),
  entity: z.string(),
  entityId: z.string(),
  action: z.string(),
  /** Before and after, as they were written in the change's own transaction. */
  details: z.record(z.string(), z.unknown()),
});
export type AuditEntryDto = z.infer<typeof auditEntryDto>;

export const listAudit = endpoint({
  method: 'get',
  path: '/api/records/audit',
  roles: ['owner'],
  summary: 'Who changed what and when, newest first; it is only ever added to.',
  query: z.object({
    entity: z.enum(auditEntities).optional(),
    /** Entries before this one, for the next page. */
    before: z.coerce.number().int().min(1).optional(),
    limit: z.coerce.number().int().min(1).max(200).default(100),
  }),
  response: z.object({ entries: z.array(auditEntryDto), next: z.int().nullable() }),
});
