import type { Migration } from '../migration.ts';

/** The company, its people and logins, its vans, its customers and what it sells. */
export const company: Migration = {
  name: '2026-12-01-001-company',
  up: `
CREATE EXTENSION IF NOT EXISTS btree_gist;

CREATE TABLE company_settings (
  id integer PRIMARY KEY CHECK (id = 1),
  name text NOT NULL,
  phone text NOT NULL DEFAULT '',
  email text NOT NULL DEFAULT '',
  zone text NOT NULL,
  clock text NOT NULL DEFAULT '12' CHECK (clock IN ('12', '24')),
  units text NOT NULL DEFAULT 'us' CHECK (units IN ('us', 'metric')),
  day_starts_at text NOT NULL DEFAULT '07:30',
  day_ends_at text NOT NULL DEFAULT '18:00',
  undo_seconds integer NOT NULL DEFAULT 120 CHECK (undo_seconds BETWEEN 0 AND 600),
  reason_kinds text[] NOT NULL DEFAULT '{missing_skill,missing_equipment,outside_window}',
  version integer NOT NULL DEFAULT 0,
  updated_at timestamptz NOT NULL DEFAULT now()
);

CREATE TABLE people (
  id uuid PRIMARY KEY,
  name text NOT NULL CHECK (name <> ''),
  phone text NOT NULL DEFAULT '',
  skills text[] NOT NULL DEFAULT '{}',
  is_trainee boolean NOT NULL DEFAULT false,
  is_active boolean NOT NULL DEFAULT true,
  version integer NOT NULL DEFAULT 0,
  created_at timestamptz NOT NULL DEFAULT now()
);

-- Tip eligibility is a dated fact of the person, by duties, not by role (29 USC 203(m)(2)(B)).
CREATE TABLE tip_standings (
  person_id uuid NOT NULL REFERENCES people,
  starts_on date NOT NULL,
  shares_tips boolean NOT NULL,
  PRIMARY KEY (person_id, starts_on)
);

CREATE TABLE time_off (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  starts_on date NOT NULL,
  ends_on date NOT NULL CHECK (ends_on >= starts_on),
  note text NOT NULL DEFAULT ''
);

CREATE TABLE users (
  id uuid PRIMARY KEY,
  name text NOT NULL,
  email text NOT NULL CHECK (email = lower(email)),
  password_hash text,
  role text NOT NULL CHECK (role IN ('owner', 'dispatcher', 'technician')),
  person_id uuid UNIQUE REFERENCES people,
  is_active boolean NOT NULL DEFAULT true,
  last_seen_at timestamptz,
  created_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (email)
);

CREATE TABLE session (
  sid varchar PRIMARY KEY,
  sess json NOT NULL,
  expire timestamp(6) NOT NULL,
  user_id uuid GENERATED ALWAYS AS ((sess -> 'passport' ->> 'user')::uuid) STORED
);
CREATE INDEX session_by_expiry ON session (expire);
CREATE INDEX session_by_user ON session (user_id);

-- Single-use links; only a hash of the token is kept.
CREATE TABLE login_links (
  id uuid PRIMARY KEY,
  user_id uuid NOT NULL REFERENCES users,
  kind text NOT NULL CHECK (kind IN ('invitation', 'reset')),
  token_hash text NOT NULL UNIQUE,
  expires_at timestamptz NOT NULL,
  used_at timestamptz
);

CREATE TABLE vans (
  id uuid PRIMARY KEY,
  name text NOT NULL CHECK (name <> ''),
  plate text NOT NULL DEFAULT '',
  equipment text[] NOT NULL DEFAULT '{}',
  notes text NOT NULL DEFAULT '',
  position integer NOT NULL DEFAULT 0,
  is_active boolean NOT NULL DEFAULT true,
  version integer NOT NULL DEFAULT 0
);
CREATE UNIQUE INDEX vans_one_name ON vans (lower(name)) WHERE is_active;

CREATE TABLE van_crew (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  van_id uuid NOT NULL REFERENCES vans,
  span tstzrange NOT NULL CHECK (NOT isempty(span) AND NOT lower_inf(span) AND NOT upper_inf(span)),
  position integer NOT NULL DEFAULT 0,
  CONSTRAINT van_crew_person_in_one_van EXCLUDE USING gist (person_id WITH =, span WITH &&) DEFERRABLE INITIALLY IMMEDIATE
);
CREATE INDEX van_crew_by_van ON van_crew USING gist (van_id, span);

CREATE TABLE customers (
  id uuid PRIMARY KEY,
  name text NOT NULL CHECK (name <> ''),
  is_company boolean NOT NULL DEFAULT false,
  phone text NOT NULL DEFAULT '',
  email text NOT NULL DEFAULT '',
  notes text NOT NULL DEFAULT '',
  version integer NOT NULL DEFAULT 0,
  created_at timestamptz NOT NULL DEFAULT now()
);

CREATE TABLE addresses (
  id uuid PRIMARY KEY,
  customer_id uuid NOT NULL REFERENCES customers,
  line text NOT NULL CHECK (line <> ''),
  city text NOT NULL DEFAULT '',
  postcode text NOT NULL DEFAULT '',
  area text NOT NULL DEFAULT '',
  lat double precision CHECK (lat BETWEEN -90 AND 90),
  lng double precision CHECK (lng BETWEEN -180 AND 180),
  gate_code text NOT NULL DEFAULT '',
  access_notes text NOT NULL DEFAULT '',
  has_water boolean NOT NULL DEFAULT false,
  has_power boolean NOT NULL DEFAULT false,
  position integer NOT NULL DEFAULT 0,
  is_active boolean NOT NULL DEFAULT true
);
CREATE INDEX addresses_by_customer ON addresses (customer_id);

CREATE TABLE vehicles (
  id uuid PRIMARY KEY,
  customer_id uuid NOT NULL REFERENCES customers,
  label text NOT NULL CHECK (label <> ''),
  color text NOT NULL DEFAULT '',
  plate text NOT NULL DEFAULT '',
  size_class text NOT NULL CHECK (size_class IN ('coupe', 'sedan', 'small_suv', 'large_suv', 'van')),
  notes text NOT NULL DEFAULT '',
  position integer NOT NULL DEFAULT 0,
  is_active boolean NOT NULL DEFAULT true
);
CREATE INDEX vehicles_by_customer ON vehicles (customer_id);

CREATE TABLE services (
  id uuid PRIMARY KEY,
  name text NOT NULL CHECK (name <> ''),
  kind text NOT NULL CHECK (kind IN ('package', 'single', 'add_on')),
  description text NOT NULL DEFAULT '',
  skills text[] NOT NULL DEFAULT '{}',
  equipment text[] NOT NULL DEFAULT '{}',
  is_active boolean NOT NULL DEFAULT true,
  position integer NOT NULL DEFAULT 0,
  version integer NOT NULL DEFAULT 0
);
CREATE UNIQUE INDEX services_one_name ON services (lower(name)) WHERE is_active;

-- Start-dated: a new price is a new row, what was quoted keeps its own.
CREATE TABLE service_prices (
  service_id uuid NOT NULL REFERENCES services,
  size_class text NOT NULL CHECK (size_class IN ('coupe', 'sedan', 'small_suv', 'large_suv', 'van')),
  starts_on date NOT NULL,
  price_cents bigint NOT NULL CHECK (price_cents >= 0),
  minutes integer NOT NULL CHECK (minutes BETWEEN 5 AND 10080),
  PRIMARY KEY (service_id, size_class, starts_on)
);
`,
  down: `
DROP TABLE service_prices, services, vehicles, addresses, customers, van_crew, vans, login_links, session, users, time_off,
  tip_standings, people, company_settings;
`,
};
