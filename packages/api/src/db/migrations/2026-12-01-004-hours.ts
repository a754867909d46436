import type { Migration } from '../migration.ts';

/** What a person says of their hours, and what is asked or proposed to be changed in them. Both versions stay. */
export const hours: Migration = {
  name: '2026-12-01-004-hours',
  up: `
CREATE TABLE clock_requests (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  -- Null asks for time that the clock missed.
  entry_id uuid REFERENCES clock_entries,
  -- 'asked' by the person, decided at the desk; 'proposed' by the desk, decided by the person.
  direction text NOT NULL CHECK (direction IN ('asked', 'proposed')),
  user_id uuid NOT NULL REFERENCES users,
  at timestamptz NOT NULL,
  before jsonb,
  after jsonb NOT NULL,
  reason text NOT NULL CHECK (reason <> ''),
  state text NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'agreed', 'refused')),
  decided_by uuid REFERENCES users,
  decided_at timestamptz,
  answer text NOT NULL DEFAULT '',
  CHECK ((state = 'open') = (decided_at IS NULL))
);
CREATE INDEX clock_requests_open ON clock_requests (person_id) WHERE state = 'open';

-- Append-only: the newest row of a person and week is what is said now.
CREATE TABLE hours_words (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  week_starts_on date NOT NULL,
  is_right boolean NOT NULL,
  note text NOT NULL DEFAULT '',
  user_id uuid NOT NULL REFERENCES users,
  at timestamptz NOT NULL
);
CREATE INDEX hours_words_by_week ON hours_words (week_starts_on, person_id, at);
CREATE TRIGGER hours_words_append_only BEFORE UPDATE OR DELETE ON hours_words FOR EACH ROW EXECUTE FUNCTION refuse_change();
`,
  down: `DROP TABLE hours_words, clock_requests;`,
};
