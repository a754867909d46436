import type { Migration } from '../migration.ts';

/** Commission may be earned when the customer has paid; which jobs are paid, from when on. */
export const commissionWhenPaid: Migration = {
  name: '2026-12-01-008-commission-when-paid',
  up: `
ALTER TABLE pay_rules ADD COLUMN commission_earned text NOT NULL DEFAULT 'done' CHECK (commission_earned IN ('done', 'paid'));

-- A job paid in full. Taken back by deleting the row, which the audit trail keeps.
CREATE TABLE jobs_paid (
  job_id uuid PRIMARY KEY REFERENCES jobs,
  paid_at timestamptz NOT NULL,
  recorded_by uuid NOT NULL REFERENCES users,
  recorded_at timestamptz NOT NULL
);
CREATE INDEX jobs_paid_by_time ON jobs_paid (paid_at);
`,
  down: `
DROP TABLE jobs_paid;
ALTER TABLE pay_rules DROP COLUMN commission_earned;
`,
};
