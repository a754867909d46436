import type { Migration } from '../migration.ts';

/** A fee for a call-off that came late, or for nobody being there, is billed without a line of the job. */
export const fees: Migration = {
  name: '2026-12-01-024-fees',
  up: 'ALTER TABLE invoice_lines ALTER COLUMN job_line_id DROP NOT NULL;',
  down: 'ALTER TABLE invoice_lines ALTER COLUMN job_line_id SET NOT NULL;',
};
