import type { Migration } from '../migration.ts';

/** Paydays: which locked weeks are handed over together, and when; and whether the mail at the lock names figures. */
export const paydays: Migration = {
  name: '2026-12-01-006-paydays',
  up: `
CREATE TABLE paydays (
  id uuid PRIMARY KEY,
  pays_on date NOT NULL,
  note text NOT NULL DEFAULT '',
  made_by uuid NOT NULL REFERENCES users,
  made_at timestamptz NOT NULL,
  handed_over_at timestamptz,
  handed_over_by uuid REFERENCES users,
  version integer NOT NULL DEFAULT 0,
  CHECK ((handed_over_at IS NULL) = (handed_over_by IS NULL))
);

-- A week is on one payday at most.
CREATE TABLE payday_weeks (
  payday_id uuid NOT NULL REFERENCES paydays,
  pay_week_id uuid NOT NULL UNIQUE REFERENCES pay_weeks,
  PRIMARY KEY (payday_id, pay_week_id)
);

CREATE FUNCTION refuse_handed_over_payday() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF OLD.handed_over_at IS NOT NULL THEN
    RAISE EXCEPTION 'payday % is handed over', OLD.id USING ERRCODE = 'DR003';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
CREATE TRIGGER paydays_handed_over BEFORE UPDATE OR DELETE ON paydays FOR EACH ROW EXECUTE FUNCTION refuse_handed_over_payday();

-- The payday's row is held meanwhile, so that a hand-over at the same moment waits or is seen.
CREATE FUNCTION refuse_handed_over_weeks() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE handed timestamptz;
BEGIN
  IF TG_OP <> 'INSERT' THEN
    SELECT handed_over_at INTO handed FROM paydays WHERE id = OLD.payday_id FOR SHARE;
    IF handed IS NOT NULL THEN
      RAISE EXCEPTION 'payday % is handed over', OLD.payday_id USING ERRCODE = 'DR003';
    END IF;
  END IF;
  IF TG_OP <> 'DELETE' THEN
    SELECT handed_over_at INTO handed FROM paydays WHERE id = NEW.payday_id FOR SHARE;
    IF handed IS NOT NULL THEN
      RAISE EXCEPTION 'payday % is handed over', NEW.payday_id USING ERRCODE = 'DR003';
    END IF;
    IF NOT EXISTS (SELECT 1 FROM pay_weeks WHERE id = NEW.pay_week_id AND state = 'locked') THEN
      RAISE EXCEPTION 'pay week % is not locked', NEW.pay_week_id USING ERRCODE = 'DR004';
    END IF;
    RETURN NEW;
  END IF;
  RETURN OLD;
END $$;
CREATE TRIGGER payday_weeks_handed_over BEFORE INSERT OR UPDATE OR DELETE ON payday_weeks FOR EACH ROW EXECUTE FUNCTION refuse_handed_over_weeks();
CREATE TRIGGER paydays_no_truncate BEFORE TRUNCATE ON paydays FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
CREATE TRIGGER payday_weeks_no_truncate BEFORE TRUNCATE ON payday_weeks FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();

ALTER TABLE company_settings ADD COLUMN statement_mail_shows_figures boolean NOT NULL DEFAULT false;
`,
  down: `
ALTER TABLE company_settings DROP COLUMN statement_mail_shows_figures;
DROP TABLE payday_weeks, paydays;
DROP FUNCTION refuse_handed_over_payday, refuse_handed_over_weeks;
`,
};
