import type { Migration } from '../migration.ts';

/** What strangers may book by themselves, the terms they accept, and the places held for them meanwhile. */
export const onlineBooking: Migration = {
  name: '2026-12-01-020-online-booking',
  up: `
CREATE TABLE online_booking_settings (
  id integer PRIMARY KEY CHECK (id = 1),
  is_on boolean NOT NULL DEFAULT false,
  -- Towns and postcodes; none for everywhere.
  places text[] NOT NULL DEFAULT '{}',
  notice_hours integer NOT NULL DEFAULT 24 CHECK (notice_hours BETWEEN 0 AND 336),
  farthest_days integer NOT NULL DEFAULT 30 CHECK (farthest_days BETWEEN 1 AND 90),
  starts text[] NOT NULL DEFAULT '{08:00,10:00,12:00,14:00}' CHECK (cardinality(starts) BETWEEN 1 AND 12),
  window_minutes integer NOT NULL DEFAULT 120 CHECK (window_minutes BETWEEN 15 AND 480),
  version integer NOT NULL DEFAULT 0
);
INSERT INTO online_booking_settings (id) VALUES (1);

CREATE TABLE online_services (service_id uuid PRIMARY KEY REFERENCES services);

-- Terms are never changed: a new version takes their place, and who accepted the old ones keeps those.
CREATE TABLE online_policies (
  version integer PRIMARY KEY CHECK (version >= 1),
  words text NOT NULL,
  free_until_hours integer NOT NULL CHECK (free_until_hours BETWEEN 0 AND 336),
  late_fee_cents bigint NOT NULL CHECK (late_fee_cents BETWEEN 0 AND 1000000),
  since timestamptz NOT NULL
);
INSERT INTO online_policies VALUES (1, 'We arrive within the window that you choose.', 24, 0, now());
CREATE FUNCTION refuse_policy_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'accepted terms never change';
END $$;
CREATE TRIGGER online_policies_stay BEFORE UPDATE OR DELETE ON online_policies FOR EACH ROW EXECUTE FUNCTION refuse_policy_change();

-- A place on a van, kept for somebody who is filling in the page; the row goes when its time is over.
CREATE TABLE booking_holds (
  id uuid PRIMARY KEY,
  van_id uuid NOT NULL REFERENCES vans,
  during tstzrange NOT NULL CHECK (NOT isempty(during)),
  window_from timestamptz NOT NULL,
  window_to timestamptz NOT NULL CHECK (window_to > window_from),
  -- The work and the place, as they were asked for.
  asked jsonb NOT NULL,
  lat double precision,
  lng double precision,
  -- Who, once the page was sent in; proved by the code that went to the address.
  email text,
  contact jsonb,
  code_hash text,
  tries integer NOT NULL DEFAULT 0,
  codes_sent integer NOT NULL DEFAULT 0,
  expires_at timestamptz NOT NULL,
  created_at timestamptz NOT NULL,
  CHECK ((lat IS NULL) = (lng IS NULL)),
  CHECK ((email IS NULL) = (contact IS NULL) AND (email IS NULL) = (code_hash IS NULL)),
  CONSTRAINT booking_holds_one_place EXCLUDE USING gist (van_id WITH =, during WITH &&)
);
CREATE INDEX booking_holds_by_expiry ON booking_holds (expires_at);

CREATE TABLE online_bookings (
  job_id uuid PRIMARY KEY REFERENCES jobs,
  policy_version integer NOT NULL REFERENCES online_policies,
  accepted_at timestamptz NOT NULL,
  -- Proposed to the desk, never charged by itself.
  proposed_fee_cents bigint NOT NULL DEFAULT 0 CHECK (proposed_fee_cents >= 0)
);
`,
  down: `
DROP TABLE online_bookings, booking_holds, online_policies, online_services, online_booking_settings;
DROP FUNCTION refuse_policy_change;
`,
};
