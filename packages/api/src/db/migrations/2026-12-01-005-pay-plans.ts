import type { Migration } from '../migration.ts';

/** How persons are paid and where they work, from dates on; all of it is appended, never overwritten. */
export const payPlans: Migration = {
  name: '2026-12-01-005-pay-plans',
  up: `
CREATE TABLE pay_plans (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  -- First day of a workweek.
  starts_on date NOT NULL,
  plan jsonb NOT NULL CHECK (plan ? 'base' AND plan ? 'extras'),
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL,
  UNIQUE (person_id, starts_on)
);

CREATE TABLE pay_places (
  id uuid PRIMARY KEY,
  name text NOT NULL CHECK (name <> ''),
  -- A known rule set by its key, or the owner's own as data.
  rule_set_key text,
  own_rules jsonb,
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL,
  CHECK ((rule_set_key IS NULL) <> (own_rules IS NULL))
);
CREATE UNIQUE INDEX pay_places_one_name ON pay_places (lower(name));

CREATE TABLE pay_place_wages (
  id uuid PRIMARY KEY,
  place_id uuid NOT NULL REFERENCES pay_places,
  starts_on date NOT NULL,
  amount numeric(14,6) NOT NULL CHECK (amount > 0),
  source text NOT NULL DEFAULT '',
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL,
  UNIQUE (place_id, starts_on)
);

-- A null place: back to the company's own rules.
CREATE TABLE person_places (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  place_id uuid REFERENCES pay_places,
  starts_on date NOT NULL,
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL,
  UNIQUE (person_id, starts_on)
);

ALTER TABLE pay_rules
  ADD COLUMN punch_rounding_minutes integer CHECK (punch_rounding_minutes IN (5, 6, 15)),
  ADD COLUMN premium_rounding text NOT NULL DEFAULT 'half_up' CHECK (premium_rounding IN ('half_up', 'up'));

CREATE TRIGGER pay_plans_append_only BEFORE UPDATE OR DELETE ON pay_plans FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER pay_places_append_only BEFORE UPDATE OR DELETE ON pay_places FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER pay_place_wages_append_only BEFORE UPDATE OR DELETE ON pay_place_wages FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER person_places_append_only BEFORE UPDATE OR DELETE ON person_places FOR EACH ROW EXECUTE FUNCTION refuse_change();
`,
  down: `
DROP TABLE person_places, pay_place_wages, pay_places, pay_plans;
ALTER TABLE pay_rules DROP COLUMN punch_rounding_minutes, DROP COLUMN premium_rounding;
`,
};
