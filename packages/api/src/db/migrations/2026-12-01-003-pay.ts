import type { Migration } from '../migration.ts';

/** Dated rates and rules, pay weeks with their frozen lines, the audit trail and the mail outbox. */
export const pay: Migration = {
  name: '2026-12-01-003-pay',
  up: `
CREATE TABLE pay_rates (
  id uuid PRIMARY KEY,
  kind text NOT NULL CHECK (kind IN ('hourly', 'commission_percent', 'flat_service')),
  person_id uuid REFERENCES people,
  service_id uuid REFERENCES services,
  clock_kind text CHECK (clock_kind IN ('job', 'travel', 'waiting', 'shop', 'training', 'rest_break', 'meal_break')),
  value numeric(14,6) NOT NULL CHECK (value >= 0),
  starts_on date NOT NULL,
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE NULLS NOT DISTINCT (kind, person_id, service_id, clock_kind, starts_on)
);

CREATE TABLE pay_rules (
  id uuid PRIMARY KEY,
  starts_on date NOT NULL UNIQUE,
  overtime_rule_set text NOT NULL,
  minimum_wage numeric(14,6) NOT NULL CHECK (minimum_wage > 0),
  crew_split text NOT NULL CHECK (crew_split IN ('equal', 'weights', 'minutes')),
  meal_break_minutes integer NOT NULL DEFAULT 30 CHECK (meal_break_minutes BETWEEN 20 AND 120),
  workweek_starts_on integer NOT NULL CHECK (workweek_starts_on BETWEEN 1 AND 7),
  workweek_starts_at text NOT NULL DEFAULT '00:00',
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL DEFAULT now()
);

CREATE TABLE pay_weeks (
  id uuid PRIMARY KEY,
  starts_on date NOT NULL UNIQUE,
  ends_on date NOT NULL,
  starts_at timestamptz NOT NULL UNIQUE,
  ends_at timestamptz NOT NULL CHECK (ends_at > starts_at),
  state text NOT NULL DEFAULT 'draft' CHECK (state IN ('draft', 'checked', 'locked')),
  checked_at timestamptz,
  checked_by uuid REFERENCES users,
  locked_at timestamptz,
  locked_by uuid REFERENCES users,
  engine_version text,
  -- The rules and inputs that the locked lines were computed from; customers by id and job number only.
  snapshot jsonb,
  version integer NOT NULL DEFAULT 0,
  EXCLUDE USING gist (tstzrange(starts_at, ends_at) WITH &&),
  CHECK (state <> 'locked' OR (locked_at IS NOT NULL AND locked_by IS NOT NULL AND snapshot IS NOT NULL))
);

CREATE TABLE pay_lines (
  id uuid PRIMARY KEY,
  pay_week_id uuid NOT NULL REFERENCES pay_weeks,
  person_id uuid NOT NULL REFERENCES people,
  position integer NOT NULL,
  key text NOT NULL,
  amount_cents bigint NOT NULL,
  is_payable boolean NOT NULL,
  line jsonb NOT NULL,
  UNIQUE (pay_week_id, person_id, key)
);

-- A person's hours, rate and totals of a locked week, beside the lines.
CREATE TABLE pay_statements (
  pay_week_id uuid NOT NULL REFERENCES pay_weeks,
  person_id uuid NOT NULL REFERENCES people,
  gross_cents bigint NOT NULL,
  summary jsonb NOT NULL,
  PRIMARY KEY (pay_week_id, person_id)
);

CREATE TABLE pay_adjustments (
  id uuid PRIMARY KEY,
  pay_week_id uuid NOT NULL REFERENCES pay_weeks,
  person_id uuid NOT NULL REFERENCES people,
  kind text NOT NULL CHECK (kind IN ('bonus', 'discretionary_bonus', 'reimbursement', 'paid_time_off', 'deduction', 'correction')),
  amount_cents bigint NOT NULL CHECK (amount_cents <> 0),
  reason text NOT NULL CHECK (reason <> ''),
  corrects_line_id uuid REFERENCES pay_lines,
  user_id uuid NOT NULL REFERENCES users,
  at timestamptz NOT NULL,
  CHECK (kind <> 'correction' OR corrects_line_id IS NOT NULL)
);

CREATE TABLE audit_entries (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  at timestamptz NOT NULL,
  user_id uuid REFERENCES users,
  entity text NOT NULL,
  entity_id text NOT NULL,
  action text NOT NULL,
  details jsonb NOT NULL DEFAULT '{}'
);
CREATE INDEX audit_entries_by_entity ON audit_entries (entity, entity_id);

CREATE TABLE outbox_mails (
  id uuid PRIMARY KEY,
  recipient text NOT NULL,
  subject text NOT NULL,
  body text NOT NULL,
  created_at timestamptz NOT NULL DEFAULT now(),
  next_try_at timestamptz NOT NULL DEFAULT now(),
  tries integer NOT NULL DEFAULT 0,
  sent_at timestamptz,
  last_error text
);
CREATE INDEX outbox_mails_waiting ON outbox_mails (next_try_at) WHERE sent_at IS NULL;

CREATE FUNCTION refuse_locked_week() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE week uuid;
BEGIN
  IF TG_OP <> 'INSERT' THEN
    week := OLD.pay_week_id;
    IF EXISTS (SELECT 1 FROM pay_weeks WHERE id = week AND state = 'locked') THEN
      RAISE EXCEPTION 'pay week % is locked', week USING ERRCODE = 'DR001';
    END IF;
  END IF;
  IF TG_OP <> 'DELETE' THEN
    IF EXISTS (SELECT 1 FROM pay_weeks WHERE id = NEW.pay_week_id AND state = 'locked') THEN
      RAISE EXCEPTION 'pay week % is locked', NEW.pay_week_id USING ERRCODE = 'DR001';
    END IF;
    RETURN NEW;
  END IF;
  RETURN OLD;
END $$;
CREATE TRIGGER pay_lines_locked BEFORE INSERT OR UPDATE OR DELETE ON pay_lines FOR EACH ROW EXECUTE FUNCTION refuse_locked_week();
CREATE TRIGGER pay_statements_locked BEFORE INSERT OR UPDATE OR DELETE ON pay_statements FOR EACH ROW EXECUTE FUNCTION refuse_locked_week();
CREATE TRIGGER pay_adjustments_locked BEFORE INSERT OR UPDATE OR DELETE ON pay_adjustments FOR EACH ROW EXECUTE FUNCTION refuse_locked_week();

CREATE FUNCTION refuse_locked_head() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF OLD.state = 'locked' THEN
    RAISE EXCEPTION 'pay week % is locked', OLD.id USING ERRCODE = 'DR001';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
CREATE TRIGGER pay_weeks_locked BEFORE UPDATE OR DELETE ON pay_weeks FOR EACH ROW EXECUTE FUNCTION refuse_locked_head();

CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is append-only', TG_TABLE_NAME USING ERRCODE = 'DR002';
END $$;
CREATE TRIGGER audit_entries_append_only BEFORE UPDATE OR DELETE ON audit_entries FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER audit_entries_no_truncate BEFORE TRUNCATE ON audit_entries FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
CREATE TRIGGER clock_corrections_append_only BEFORE UPDATE OR DELETE ON clock_corrections FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER pay_rates_append_only BEFORE UPDATE OR DELETE ON pay_rates FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER pay_rules_append_only BEFORE UPDATE OR DELETE ON pay_rules FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER pay_lines_no_truncate BEFORE TRUNCATE ON pay_lines FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
`,
  down: `
DROP TRIGGER clock_corrections_append_only ON clock_corrections;
DROP TABLE outbox_mails, audit_entries, pay_adjustments, pay_statements, pay_lines, pay_weeks, pay_rules, pay_rates;
DROP FUNCTION refuse_locked_week, refuse_locked_head, refuse_change;
`,
};
