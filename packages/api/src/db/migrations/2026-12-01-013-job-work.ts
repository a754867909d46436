import type { Migration } from '../migration.ts';

/** What is done at the car: checklists, must-knows, presses at work, and changes of a job. */
export const jobWork: Migration = {
  name: '2026-12-01-013-job-work',
  up: `
-- Each save is a new version, so that a visit keeps the steps it began with.
CREATE TABLE service_checklists (
  service_id uuid NOT NULL REFERENCES services,
  version integer NOT NULL CHECK (version >= 1),
  asks_note boolean NOT NULL DEFAULT false,
  steps jsonb NOT NULL CHECK (jsonb_typeof(steps) = 'array'),
  created_by uuid REFERENCES users,
  created_at timestamptz NOT NULL DEFAULT now(),
  PRIMARY KEY (service_id, version)
);
CREATE TRIGGER service_checklists_append_only BEFORE UPDATE OR DELETE ON service_checklists FOR EACH ROW EXECUTE FUNCTION refuse_change();

-- The version a line goes by, fixed when work starts.
CREATE TABLE visit_checklists (
  visit_id uuid NOT NULL REFERENCES visits ON DELETE CASCADE,
  job_line_id uuid NOT NULL REFERENCES job_lines ON DELETE CASCADE,
  service_id uuid NOT NULL,
  version integer NOT NULL,
  PRIMARY KEY (visit_id, job_line_id),
  FOREIGN KEY (service_id, version) REFERENCES service_checklists (service_id, version)
);

-- Presses at the car, appended. A line may be dropped later; what was done on it stays, so lines are named, not referenced.
CREATE TABLE work_events (
  id uuid PRIMARY KEY,
  visit_id uuid NOT NULL REFERENCES visits,
  kind text NOT NULL CHECK (kind IN ('confirm', 'tick', 'untick', 'start_line', 'stop_line', 'used', 'note', 'go_on', 'key_taken', 'key_back')),
  steps jsonb NOT NULL DEFAULT '[]',
  line_id uuid,
  keys text[] NOT NULL DEFAULT '{}',
  words text NOT NULL DEFAULT '',
  user_id uuid NOT NULL REFERENCES users,
  person_id uuid REFERENCES people,
  device_at timestamptz NOT NULL,
  received_at timestamptz NOT NULL,
  occurred_at timestamptz NOT NULL,
  is_corrected boolean NOT NULL DEFAULT false
);
CREATE INDEX work_events_by_visit ON work_events (visit_id, occurred_at);
CREATE INDEX work_events_of_keys ON work_events (visit_id, occurred_at) WHERE kind IN ('key_taken', 'key_back');
CREATE TRIGGER work_events_append_only BEFORE UPDATE OR DELETE ON work_events FOR EACH ROW EXECUTE FUNCTION refuse_change();

-- A price that was quoted never changes in silence: a change is a row with both sides.
CREATE TABLE job_changes (
  id uuid PRIMARY KEY,
  visit_id uuid NOT NULL REFERENCES visits,
  job_id uuid NOT NULL REFERENCES jobs,
  kind text NOT NULL CHECK (kind IN ('add', 'drop', 'swap', 'condition')),
  state text NOT NULL CHECK (state IN ('done', 'asked', 'accepted', 'declined', 'quote')),
  words text NOT NULL CHECK (words <> ''),
  reason text NOT NULL CHECK (reason <> ''),
  before jsonb NOT NULL,
  after jsonb NOT NULL,
  price_difference_cents bigint NOT NULL,
  minutes_difference integer NOT NULL,
  finish_at timestamptz NOT NULL,
  hindrances jsonb NOT NULL DEFAULT '[]',
  is_board_not_asked boolean NOT NULL DEFAULT false,
  said_yes_by text NOT NULL DEFAULT '',
  said_yes_at timestamptz NOT NULL,
  user_id uuid NOT NULL REFERENCES users,
  person_id uuid REFERENCES people,
  device_at timestamptz NOT NULL,
  received_at timestamptz NOT NULL,
  occurred_at timestamptz NOT NULL,
  is_corrected boolean NOT NULL DEFAULT false,
  answered_by uuid REFERENCES users,
  answered_at timestamptz,
  answer text NOT NULL DEFAULT '',
  CHECK ((answered_by IS NULL) = (answered_at IS NULL)),
  CHECK (state NOT IN ('accepted', 'declined') OR answered_at IS NOT NULL)
);
CREATE INDEX job_changes_by_job ON job_changes (job_id);
CREATE INDEX job_changes_by_visit ON job_changes (visit_id);
CREATE INDEX job_changes_asked ON job_changes (occurred_at) WHERE state = 'asked';

CREATE FUNCTION refuse_rewritten_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  -- A customer's name can be erased.
  IF TG_OP = 'UPDATE' AND NEW.said_yes_by = '' AND to_jsonb(NEW) - 'said_yes_by' = to_jsonb(OLD) - 'said_yes_by' THEN
    RETURN NEW;
  END IF;
  IF TG_OP = 'DELETE' OR OLD.state <> 'asked'
     OR (NEW.before, NEW.after, NEW.price_difference_cents, NEW.said_yes_by, NEW.said_yes_at, NEW.reason)
        IS DISTINCT FROM (OLD.before, OLD.after, OLD.price_difference_cents, OLD.said_yes_by, OLD.said_yes_at, OLD.reason) THEN
    RAISE EXCEPTION 'a change of a job is answered once and never rewritten' USING ERRCODE = 'DR002';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER job_changes_kept BEFORE UPDATE OR DELETE ON job_changes FOR EACH ROW EXECUTE FUNCTION refuse_rewritten_change();

ALTER TABLE customers
  ADD COLUMN is_scent_free boolean NOT NULL DEFAULT false,
  ADD COLUMN rings_first boolean NOT NULL DEFAULT false,
  ADD COLUMN must_know text NOT NULL DEFAULT '';
ALTER TABLE addresses
  ADD COLUMN has_dog boolean NOT NULL DEFAULT false,
  ADD COLUMN shuts_gate boolean NOT NULL DEFAULT false,
  ADD COLUMN drains_to_creek boolean NOT NULL DEFAULT false,
  ADD COLUMN takes_key boolean NOT NULL DEFAULT false,
  ADD COLUMN key_goes_back text NOT NULL DEFAULT '',
  ADD COLUMN must_know text NOT NULL DEFAULT '';
ALTER TABLE vehicles
  ADD COLUMN is_coated boolean NOT NULL DEFAULT false,
  ADD COLUMN must_know text NOT NULL DEFAULT '';
`,
  down: `
ALTER TABLE vehicles DROP COLUMN is_coated, DROP COLUMN must_know;
ALTER TABLE addresses DROP COLUMN has_dog, DROP COLUMN shuts_gate, DROP COLUMN drains_to_creek, DROP COLUMN takes_key,
  DROP COLUMN key_goes_back, DROP COLUMN must_know;
ALTER TABLE customers DROP COLUMN is_scent_free, DROP COLUMN rings_first, DROP COLUMN must_know;
DROP TABLE job_changes, work_events, visit_checklists, service_checklists;
DROP FUNCTION refuse_rewritten_change;
`,
};
