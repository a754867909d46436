import type { Migration } from '../migration.ts';

/** Paid time off and pay for days cut short: dated rules and the ledger's own rows, all of it appended. */
export const paidTimeOff: Migration = {
  name: '2026-12-01-007-paid-time-off',
  up: `
CREATE TABLE time_off_rules (
  id uuid PRIMARY KEY,
  kind text NOT NULL CHECK (kind IN ('sick', 'vacation', 'holiday')),
  -- Null for the company's.
  person_id uuid REFERENCES people,
  -- First day of a workweek.
  starts_on date NOT NULL,
  rule jsonb NOT NULL CHECK (rule ? 'earning' AND rule ? 'pays'),
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL,
  UNIQUE NULLS NOT DISTINCT (kind, person_id, starts_on)
);

-- Opening balances and the owner's corrections; what is taken stands among the adjustments of pay weeks.
CREATE TABLE time_off_adjustments (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  kind text NOT NULL CHECK (kind IN ('sick', 'vacation', 'holiday')),
  on_date date NOT NULL,
  -- Exact, signed: "8", "-15/2".
  hours text NOT NULL CHECK (hours ~ '^-?[0-9]+(/[1-9][0-9]*)?$' AND hours <> '0'),
  reason text NOT NULL CHECK (reason <> ''),
  user_id uuid NOT NULL REFERENCES users,
  at timestamptz NOT NULL
);
CREATE INDEX time_off_adjustments_by_person ON time_off_adjustments (person_id, kind);

CREATE TABLE show_up_rules (
  id uuid PRIMARY KEY,
  pay_kind text NOT NULL CHECK (pay_kind IN ('show_up', 'no_show_trip')),
  -- Null for the company's.
  place_id uuid REFERENCES pay_places,
  starts_on date NOT NULL,
  rule jsonb NOT NULL CHECK (rule ? 'pays'),
  source text NOT NULL DEFAULT '',
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL,
  UNIQUE NULLS NOT DISTINCT (pay_kind, place_id, starts_on)
);

ALTER TABLE pay_adjustments
  ADD COLUMN time_off_kind text CHECK (time_off_kind IN ('sick', 'vacation', 'holiday')),
  ADD COLUMN time_off_hours text CHECK (time_off_hours ~ '^[0-9]+(/[1-9][0-9]*)?$' AND time_off_hours <> '0'),
  ADD COLUMN time_off_on date,
  -- Exact dollars an hour, a decimal or a fraction.
  ADD COLUMN time_off_rate text,
  -- The rule and the rate in words as they stood, and warnings that were accepted with a reason.
  ADD COLUMN time_off_basis jsonb,
  ADD CONSTRAINT pay_adjustments_time_off_whole CHECK (
    num_nulls(time_off_kind, time_off_hours, time_off_on, time_off_rate, time_off_basis) IN (0, 5)
    AND (time_off_kind IS NULL OR kind = 'paid_time_off'));
CREATE INDEX pay_adjustments_time_off ON pay_adjustments (person_id) WHERE time_off_kind IS NOT NULL;

-- Balances by kind as the statement showed them when the week was locked; null in weeks locked before.
ALTER TABLE pay_statements ADD COLUMN time_off jsonb;

CREATE TRIGGER time_off_rules_append_only BEFORE UPDATE OR DELETE ON time_off_rules FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER time_off_adjustments_append_only BEFORE UPDATE OR DELETE ON time_off_adjustments FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER show_up_rules_append_only BEFORE UPDATE OR DELETE ON show_up_rules FOR EACH ROW EXECUTE FUNCTION refuse_change();
`,
  down: `
ALTER TABLE pay_statements DROP COLUMN time_off;
ALTER TABLE pay_adjustments DROP CONSTRAINT pay_adjustments_time_off_whole, DROP COLUMN time_off_kind, DROP COLUMN time_off_hours,
  DROP COLUMN time_off_on, DROP COLUMN time_off_rate, DROP COLUMN time_off_basis;
DROP TABLE show_up_rules, time_off_adjustments, time_off_rules;
`,
};
