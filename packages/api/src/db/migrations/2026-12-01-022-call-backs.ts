import type { Migration } from '../migration.ts';

/** A call-back puts something of a past job right, free to the customer. */
export const callBacks: Migration = {
  name: '2026-12-01-022-call-backs',
  up: `
ALTER TABLE jobs
  ADD COLUMN call_back_of uuid REFERENCES jobs,
  ADD COLUMN call_back_cause text
    CHECK (call_back_cause IN ('missed_spot', 'streaks', 'came_back', 'damage', 'left_something', 'other')),
  ADD CONSTRAINT jobs_call_back_check CHECK ((call_back_of IS NULL) = (call_back_cause IS NULL) AND call_back_of <> id);
CREATE INDEX jobs_by_call_back ON jobs (call_back_of) WHERE call_back_of IS NOT NULL;
`,
  down: `
ALTER TABLE jobs DROP CONSTRAINT jobs_call_back_check, DROP COLUMN call_back_of, DROP COLUMN call_back_cause;
`,
};
