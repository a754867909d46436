import type { Migration } from '../migration.ts';

/** What is written to customers and what they write back. */
export const messages: Migration = {
  name: '2026-12-01-019-messages',
  up: `
CREATE TABLE message_settings (
  id integer PRIMARY KEY DEFAULT 1 CHECK (id = 1),
  quiet_from text NOT NULL DEFAULT '21:00',
  quiet_to text NOT NULL DEFAULT '08:00',
  reminder_at text NOT NULL DEFAULT '17:00',
  feedback_hours integer NOT NULL DEFAULT 4 CHECK (feedback_hours BETWEEN 1 AND 72),
  version integer NOT NULL DEFAULT 1
);
INSERT INTO message_settings DEFAULT VALUES;

-- A kind without a row is on, in our own words; so is an empty template.
CREATE TABLE message_kinds (
  kind text PRIMARY KEY,
  is_on boolean NOT NULL DEFAULT true,
  subject text,
  body text,
  text_body text,
  version integer NOT NULL DEFAULT 1
);

CREATE TABLE messages (
  id uuid PRIMARY KEY,
  kind text NOT NULL CHECK (kind IN ('booked', 'moved', 'reminder', 'on_the_way', 'done', 'receipt', 'refund', 'called_off', 'feedback')),
  channel text NOT NULL CHECK (channel IN ('mail', 'text')),
  -- What happened, so that it is told once.
  event_key text NOT NULL,
  customer_id uuid NOT NULL REFERENCES customers,
  job_id uuid NOT NULL REFERENCES jobs,
  visit_id uuid REFERENCES visits,
  -- The visit event, payment, refund or invoice it tells of.
  cause_id uuid,
  amount_cents bigint,
  state text NOT NULL CHECK (state IN ('waiting', 'sending', 'sent', 'dead', 'dropped')),
  reason text NOT NULL DEFAULT '',
  created_at timestamptz NOT NULL,
  next_try_at timestamptz NOT NULL,
  last_moment timestamptz,
  tries integer NOT NULL DEFAULT 0,
  claimed_at timestamptz,
  sent_at timestamptz,
  last_error text NOT NULL DEFAULT '',
  -- As it went out.
  recipient text NOT NULL DEFAULT '',
  subject text NOT NULL DEFAULT '',
  body text NOT NULL DEFAULT '',
  told_from timestamptz,
  told_to timestamptz,
  bounced_at timestamptz,
  UNIQUE (kind, event_key, channel),
  CHECK ((state = 'sent') = (sent_at IS NOT NULL)),
  CHECK ((state = 'sending') = (claimed_at IS NOT NULL))
);
CREATE INDEX messages_waiting ON messages (next_try_at) WHERE state IN ('waiting', 'sending');
CREATE INDEX messages_by_customer ON messages (customer_id, created_at);
CREATE INDEX messages_by_job ON messages (job_id);
CREATE INDEX messages_by_time ON messages (created_at);

-- What a customer has stopped by the link in a mail or by answering STOP.
CREATE TABLE message_stops (
  customer_id uuid NOT NULL REFERENCES customers,
  what text NOT NULL CHECK (what IN ('job', 'care', 'texts')),
  at timestamptz NOT NULL,
  PRIMARY KEY (customer_id, what)
);

-- Addresses that took no mail.
CREATE TABLE mail_bounces (
  customer_id uuid NOT NULL REFERENCES customers,
  address text NOT NULL,
  reason text NOT NULL,
  at timestamptz NOT NULL,
  PRIMARY KEY (customer_id, address)
);

-- What came back; from a number that nobody is known by, without a customer.
CREATE TABLE enquiries (
  id uuid PRIMARY KEY,
  customer_id uuid REFERENCES customers,
  sender text NOT NULL,
  body text NOT NULL,
  provider_key text NOT NULL UNIQUE,
  received_at timestamptz NOT NULL,
  settled_at timestamptz,
  settled_by uuid REFERENCES users,
  CHECK ((settled_at IS NULL) = (settled_by IS NULL))
);
CREATE INDEX enquiries_open ON enquiries (received_at) WHERE settled_at IS NULL;
CREATE INDEX enquiries_by_customer ON enquiries (customer_id);
`,
  down: `
DROP TABLE enquiries, mail_bounces, message_stops, messages, message_kinds, message_settings;
`,
};
