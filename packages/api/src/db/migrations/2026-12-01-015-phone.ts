import type { Migration } from '../migration.ts';

/** What the phone needs of the company, and where it may be woken. */
export const phone: Migration = {
  name: '2026-12-01-015-phone',
  up: `
ALTER TABLE company_settings ADD COLUMN emergency_number text NOT NULL DEFAULT '911' CHECK (emergency_number <> '');

-- A browser that asked to be told of changes; goes with its session's person, and when its service forgets it.
CREATE TABLE push_subscriptions (
  id uuid PRIMARY KEY,
  user_id uuid NOT NULL REFERENCES users,
  endpoint text NOT NULL UNIQUE,
  p256dh text NOT NULL,
  auth text NOT NULL,
  created_at timestamptz NOT NULL
);
CREATE INDEX push_subscriptions_by_user ON push_subscriptions (user_id);
`,
  down: `
DROP TABLE push_subscriptions;
ALTER TABLE company_settings DROP COLUMN emergency_number;
`,
};
