import type { Migration } from '../migration.ts';

/** Jobs, visits, stops, what was done, and the clock. */
export const work: Migration = {
  name: '2026-12-01-002-work',
  up: `
CREATE SEQUENCE job_numbers START 1001;

CREATE TABLE jobs (
  id uuid PRIMARY KEY,
  number integer NOT NULL UNIQUE DEFAULT nextval('job_numbers'),
  customer_id uuid NOT NULL REFERENCES customers,
  address_id uuid NOT NULL REFERENCES addresses,
  window_from timestamptz,
  window_to timestamptz,
  notes text NOT NULL DEFAULT '',
  discount_cents bigint NOT NULL DEFAULT 0 CHECK (discount_cents >= 0),
  discount_reason text NOT NULL DEFAULT '',
  called_off_reason text,
  version integer NOT NULL DEFAULT 0,
  created_by uuid REFERENCES users,
  created_at timestamptz NOT NULL DEFAULT now(),
  CHECK (window_to > window_from),
  CHECK (discount_cents = 0 OR discount_reason <> '')
);
CREATE INDEX jobs_by_customer ON jobs (customer_id);

CREATE TABLE stops (id uuid PRIMARY KEY, address_id uuid NOT NULL REFERENCES addresses);

CREATE TABLE visits (
  id uuid PRIMARY KEY,
  job_id uuid NOT NULL REFERENCES jobs,
  stop_id uuid NOT NULL REFERENCES stops,
  part integer NOT NULL CHECK (part >= 1),
  van_id uuid REFERENCES vans,
  planned tstzrange,
  minutes integer NOT NULL CHECK (minutes BETWEEN 5 AND 10080),
  progress text NOT NULL DEFAULT 'unplaced'
    CHECK (progress IN ('unplaced', 'placed', 'on_the_way', 'on_site', 'working', 'part_done', 'done', 'called_off')),
  progress_since timestamptz,
  reason text NOT NULL DEFAULT '',
  accepted jsonb NOT NULL DEFAULT '[]',
  plan_version integer NOT NULL DEFAULT 0,
  version integer NOT NULL DEFAULT 0,
  created_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (job_id, part),
  CHECK ((van_id IS NULL) = (planned IS NULL)),
  CHECK (planned IS NOT NULL OR progress IN ('unplaced', 'called_off')),
  CHECK (planned IS NULL OR progress <> 'unplaced'),
  CHECK (planned IS NULL OR NOT (isempty(planned) OR lower_inf(planned) OR upper_inf(planned))),
  -- One van can't be at two stops; visits at one stop may run side by side. Real times live in visit_events.
  CONSTRAINT visits_van_at_one_stop EXCLUDE USING gist (van_id WITH =, stop_id WITH <>, planned WITH &&)
    WHERE (progress <> 'called_off') DEFERRABLE INITIALLY IMMEDIATE
);
CREATE INDEX visits_by_planned ON visits USING gist (planned);
CREATE INDEX visits_unplaced ON visits (created_at) WHERE progress = 'unplaced';

CREATE TABLE job_lines (
  id uuid PRIMARY KEY,
  job_id uuid NOT NULL REFERENCES jobs,
  service_id uuid NOT NULL REFERENCES services,
  vehicle_id uuid REFERENCES vehicles,
  size_class text NOT NULL CHECK (size_class IN ('coupe', 'sedan', 'small_suv', 'large_suv', 'van')),
  price_cents bigint NOT NULL CHECK (price_cents >= 0),
  minutes integer NOT NULL CHECK (minutes BETWEEN 5 AND 10080),
  position integer NOT NULL,
  finished_visit_id uuid REFERENCES visits,
  finished_at timestamptz,
  CHECK ((finished_visit_id IS NULL) = (finished_at IS NULL))
);
CREATE INDEX job_lines_by_job ON job_lines (job_id);
CREATE INDEX job_lines_by_finish ON job_lines (finished_at) WHERE finished_at IS NOT NULL;

CREATE TABLE visit_lines (
  visit_id uuid NOT NULL REFERENCES visits ON DELETE CASCADE,
  job_line_id uuid NOT NULL REFERENCES job_lines ON DELETE CASCADE,
  PRIMARY KEY (visit_id, job_line_id)
);
CREATE INDEX visit_lines_by_line ON visit_lines (job_line_id);

-- Who worked the visit, filled at Arrived: the only basis of shares.
CREATE TABLE visit_crew (
  visit_id uuid NOT NULL REFERENCES visits,
  person_id uuid NOT NULL REFERENCES people,
  position integer NOT NULL,
  weight integer NOT NULL DEFAULT 1 CHECK (weight BETWEEN 0 AND 100),
  is_trainee boolean NOT NULL DEFAULT false,
  PRIMARY KEY (visit_id, person_id)
);
CREATE INDEX visit_crew_by_person ON visit_crew (person_id);

-- Appended actions: taken once per user and key; the answer is kept, a refused one stays as a clash.
CREATE TABLE actions (
  user_id uuid NOT NULL REFERENCES users,
  key uuid NOT NULL,
  body_hash text NOT NULL,
  is_refused boolean NOT NULL DEFAULT false,
  status integer NOT NULL,
  answer jsonb NOT NULL,
  received_at timestamptz NOT NULL DEFAULT now(),
  PRIMARY KEY (user_id, key)
);

CREATE TABLE visit_events (
  id uuid PRIMARY KEY,
  visit_id uuid NOT NULL REFERENCES visits,
  kind text NOT NULL CHECK (kind IN ('set_off', 'arrive', 'start_work', 'part_done', 'finish', 'call_off', 'undo', 'trouble', 'plan')),
  from_progress text NOT NULL,
  to_progress text NOT NULL,
  user_id uuid REFERENCES users,
  person_id uuid REFERENCES people,
  device_at timestamptz NOT NULL,
  received_at timestamptz NOT NULL,
  -- Device time corrected by the offset at the last contact; pay uses this.
  occurred_at timestamptz NOT NULL,
  is_corrected boolean NOT NULL DEFAULT false,
  is_undone boolean NOT NULL DEFAULT false,
  trouble text,
  reason text NOT NULL DEFAULT '',
  settled_at timestamptz,
  settled_by uuid REFERENCES users,
  outcome text
);
CREATE INDEX visit_events_by_visit ON visit_events (visit_id, occurred_at);
CREATE INDEX visit_events_open_trouble ON visit_events (visit_id) WHERE kind = 'trouble' AND settled_at IS NULL;

CREATE TABLE clock_entries (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  kind text NOT NULL CHECK (kind IN ('job', 'travel', 'waiting', 'shop', 'training', 'rest_break', 'meal_break')),
  visit_id uuid REFERENCES visits,
  started_at timestamptz NOT NULL,
  ended_at timestamptz,
  is_interrupted boolean NOT NULL DEFAULT false,
  is_corrected boolean NOT NULL DEFAULT false,
  note text NOT NULL DEFAULT '',
  version integer NOT NULL DEFAULT 0,
  created_at timestamptz NOT NULL DEFAULT now(),
  CHECK (ended_at IS NULL OR ended_at >= started_at)
);
CREATE UNIQUE INDEX clock_entries_one_open ON clock_entries (person_id) WHERE ended_at IS NULL;
CREATE INDEX clock_entries_by_person ON clock_entries (person_id, started_at);
CREATE INDEX clock_entries_by_time ON clock_entries (started_at);

-- Both versions stay.
CREATE TABLE clock_corrections (
  id uuid PRIMARY KEY,
  entry_id uuid NOT NULL REFERENCES clock_entries,
  user_id uuid NOT NULL REFERENCES users,
  at timestamptz NOT NULL,
  before jsonb,
  after jsonb NOT NULL,
  reason text NOT NULL CHECK (reason <> '')
);

CREATE TABLE tips (
  id uuid PRIMARY KEY,
  job_id uuid NOT NULL REFERENCES jobs,
  amount_cents bigint NOT NULL CHECK (amount_cents > 0),
  method text NOT NULL CHECK (method IN ('card', 'cash', 'invoice')),
  already_received boolean NOT NULL DEFAULT false,
  received_at timestamptz NOT NULL,
  user_id uuid NOT NULL REFERENCES users,
  CHECK (NOT already_received OR method = 'cash')
);
CREATE INDEX tips_by_time ON tips (received_at);
`,
  down: `
DROP TABLE tips, clock_corrections, clock_entries, visit_events, actions, visit_crew, visit_lines, job_lines, visits, stops, jobs;
DROP SEQUENCE job_numbers;
`,
};
