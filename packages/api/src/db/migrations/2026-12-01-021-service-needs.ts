import type { Migration } from '../migration.ts';

/** What a service needs of the place and the weather, deposits, intervals, what a package holds, surcharges by condition. */
export const serviceNeeds: Migration = {
  name: '2026-12-01-021-service-needs',
  up: `
ALTER TABLE services
  ADD COLUMN needs_water boolean NOT NULL DEFAULT false,
  ADD COLUMN needs_power boolean NOT NULL DEFAULT false,
  ADD COLUMN needs_dry boolean NOT NULL DEFAULT false,
  ADD COLUMN needs_daylight boolean NOT NULL DEFAULT false,
  ADD COLUMN coldest_tenths integer CHECK (coldest_tenths BETWEEN -400 AND 600),
  ADD COLUMN hottest_tenths integer CHECK (hottest_tenths BETWEEN -400 AND 600),
  ADD COLUMN cure_hours integer NOT NULL DEFAULT 0 CHECK (cure_hours BETWEEN 0 AND 720),
  ADD COLUMN interval_days integer CHECK (interval_days BETWEEN 1 AND 1500),
  ADD COLUMN deposit_percent integer NOT NULL DEFAULT 0 CHECK (deposit_percent BETWEEN 0 AND 100),
  ADD CONSTRAINT services_temperatures_check CHECK (coldest_tenths < hottest_tenths);

CREATE TABLE service_includes (
  service_id uuid NOT NULL REFERENCES services,
  included_id uuid NOT NULL REFERENCES services,
  position integer NOT NULL,
  PRIMARY KEY (service_id, included_id),
  CHECK (service_id <> included_id)
);

-- What a dirtier car costs and takes on top; the latest row of a condition that has started counts.
CREATE TABLE condition_surcharges (
  id uuid PRIMARY KEY,
  condition text NOT NULL CHECK (condition IN ('dirty', 'very_dirty')),
  price_percent integer NOT NULL CHECK (price_percent BETWEEN 0 AND 300),
  minutes_percent integer NOT NULL CHECK (minutes_percent BETWEEN 0 AND 300),
  starts_on date NOT NULL,
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL,
  UNIQUE (condition, starts_on)
);
CREATE TRIGGER condition_surcharges_append_only BEFORE UPDATE OR DELETE ON condition_surcharges FOR EACH ROW EXECUTE FUNCTION refuse_change();

-- The largest discount that a dispatcher gives without the owner, percent of the job's price.
ALTER TABLE company_settings ADD COLUMN desk_discount_percent integer NOT NULL DEFAULT 100 CHECK (desk_discount_percent BETWEEN 0 AND 100);
`,
  down: `
ALTER TABLE company_settings DROP COLUMN desk_discount_percent;
DROP TABLE condition_surcharges, service_includes;
ALTER TABLE services DROP CONSTRAINT services_temperatures_check,
  DROP COLUMN needs_water, DROP COLUMN needs_power, DROP COLUMN needs_dry, DROP COLUMN needs_daylight, DROP COLUMN coldest_tenths,
  DROP COLUMN hottest_tenths, DROP COLUMN cure_hours, DROP COLUMN interval_days, DROP COLUMN deposit_percent;
`,
};
