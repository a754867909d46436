import type { Migration } from '../migration.ts';

/**
 * Tips, payments and clock entries that a locked week was paid from stay. A clock entry may still be corrected, which
 * keeps both versions, and shows as a difference to be paid in an open week; it is never deleted.
 */
export const lockedRecords: Migration = {
  name: '2026-12-01-011-locked-records',
  up: `
CREATE FUNCTION is_in_locked_week(at timestamptz) RETURNS boolean LANGUAGE sql STABLE AS $$
  SELECT EXISTS (SELECT 1 FROM pay_weeks WHERE state = 'locked' AND at >= starts_at AND at < ends_at)
$$;

CREATE FUNCTION refuse_locked_tip() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF is_in_locked_week(OLD.received_at) THEN
    RAISE EXCEPTION 'the pay week of this tip is locked' USING ERRCODE = 'DR001';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
CREATE TRIGGER tips_locked BEFORE UPDATE OR DELETE ON tips FOR EACH ROW EXECUTE FUNCTION refuse_locked_tip();

CREATE FUNCTION refuse_locked_payment() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF is_in_locked_week(OLD.paid_at) THEN
    RAISE EXCEPTION 'the pay week of this payment is locked' USING ERRCODE = 'DR001';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
CREATE TRIGGER jobs_paid_locked BEFORE UPDATE OR DELETE ON jobs_paid FOR EACH ROW EXECUTE FUNCTION refuse_locked_payment();

CREATE FUNCTION refuse_locked_entry() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF is_in_locked_week(OLD.started_at) AND (TG_OP = 'DELETE' OR NOT NEW.is_corrected OR NEW.version <= OLD.version) THEN
    RAISE EXCEPTION 'the pay week of this clock entry is locked' USING ERRCODE = 'DR001';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
CREATE TRIGGER clock_entries_locked BEFORE UPDATE OR DELETE ON clock_entries FOR EACH ROW EXECUTE FUNCTION refuse_locked_entry();
`,
  down: `
DROP TRIGGER clock_entries_locked ON clock_entries;
DROP TRIGGER jobs_paid_locked ON jobs_paid;
DROP TRIGGER tips_locked ON tips;
DROP FUNCTION refuse_locked_entry, refuse_locked_payment, refuse_locked_tip, is_in_locked_week;
`,
};
