import type { Migration } from '../migration.ts';

/**
 * Walk-rounds, marks and photos. What was put down before work is frozen while the visit is past Start work; what is
 * added later is a row of its own, marked as such. Pieces of a photo wait here until it is whole.
 */
export const walkRounds: Migration = {
  name: '2026-12-01-012-walk-rounds',
  up: `
ALTER TABLE services ADD COLUMN photo_set text NOT NULL DEFAULT 'quick' CHECK (photo_set IN ('none', 'quick', 'full'));
UPDATE services SET photo_set = 'none' WHERE kind = 'add_on';

CREATE TABLE walk_rounds (
  id uuid PRIMARY KEY,
  visit_id uuid NOT NULL REFERENCES visits,
  vehicle_id uuid REFERENCES vehicles,
  body text NOT NULL CHECK (body IN ('coupe', 'sedan', 'hatchback', 'suv', 'pickup', 'van')),
  paint text CHECK (paint IN ('good', 'fair', 'poor')),
  interior text CHECK (interior IN ('good', 'fair', 'poor')),
  odometer integer CHECK (odometer BETWEEN 0 AND 9999999),
  has_items boolean,
  items_note text NOT NULL DEFAULT '',
  may_move boolean,
  is_too_dirty boolean NOT NULL DEFAULT false,
  missing_reason text NOT NULL DEFAULT '',
  absent_reason text NOT NULL DEFAULT '',
  initials jsonb,
  photo_views jsonb NOT NULL DEFAULT '[]',
  -- It reached the server after work had begun.
  is_late boolean NOT NULL DEFAULT false,
  user_id uuid NOT NULL REFERENCES users,
  device_at timestamptz NOT NULL,
  received_at timestamptz NOT NULL,
  occurred_at timestamptz NOT NULL,
  is_corrected boolean NOT NULL DEFAULT false,
  UNIQUE NULLS NOT DISTINCT (visit_id, vehicle_id),
  -- The customer signed, or it is said why not.
  CHECK ((initials IS NULL) = (absent_reason <> ''))
);
CREATE INDEX walk_rounds_by_vehicle ON walk_rounds (vehicle_id, occurred_at) WHERE vehicle_id IS NOT NULL;

CREATE TABLE walk_marks (
  id uuid PRIMARY KEY,
  visit_id uuid NOT NULL REFERENCES visits,
  vehicle_id uuid REFERENCES vehicles,
  position integer NOT NULL,
  x integer NOT NULL CHECK (x BETWEEN 0 AND 1000),
  y integer NOT NULL CHECK (y BETWEEN 0 AND 1000),
  place text NOT NULL CHECK (place <> ''),
  kind text NOT NULL CHECK (kind IN ('scratch', 'chip', 'dent', 'swirl', 'stain', 'tear', 'etching', 'curb_rash',
    'cracked_glass', 'burn', 'loose_part', 'warning_lamp')),
  size text NOT NULL CHECK (size IN ('small', 'medium', 'large')),
  note text NOT NULL DEFAULT '',
  carried_from uuid REFERENCES walk_marks,
  answer text CHECK (answer IN ('still_there', 'worse', 'gone')),
  is_addition boolean NOT NULL DEFAULT false,
  user_id uuid NOT NULL REFERENCES users,
  received_at timestamptz NOT NULL,
  occurred_at timestamptz NOT NULL,
  CHECK (answer IS NULL OR carried_from IS NOT NULL)
);
CREATE INDEX walk_marks_by_visit ON walk_marks (visit_id);

-- The answer to "too dirty to see": after the wash, before any machine.
CREATE TABLE walk_looks (
  id uuid PRIMARY KEY,
  visit_id uuid NOT NULL REFERENCES visits,
  vehicle_id uuid REFERENCES vehicles,
  outcome text NOT NULL CHECK (outcome IN ('nothing_new', 'new_marks')),
  note text NOT NULL DEFAULT '',
  user_id uuid NOT NULL REFERENCES users,
  device_at timestamptz NOT NULL,
  received_at timestamptz NOT NULL,
  occurred_at timestamptz NOT NULL,
  is_corrected boolean NOT NULL DEFAULT false
);
CREATE INDEX walk_looks_by_visit ON walk_looks (visit_id);

CREATE TABLE photos (
  id uuid PRIMARY KEY,
  visit_id uuid NOT NULL REFERENCES visits,
  vehicle_id uuid REFERENCES vehicles,
  view text NOT NULL CHECK (view IN ('front', 'rear', 'left', 'right', 'roof_hood', 'wheels', 'interior_front',
    'interior_rear', 'odometer', 'extra')),
  moment text NOT NULL CHECK (moment IN ('before', 'after', 'second_look')),
  bytes integer NOT NULL CHECK (bytes > 0),
  sha256 text NOT NULL CHECK (sha256 ~ '^[0-9a-f]{64}$'),
  received_bytes integer NOT NULL DEFAULT 0 CHECK (received_bytes BETWEEN 0 AND bytes),
  -- Why its content was not taken; the same press gets the same answer again.
  refused text,
  width integer CHECK (width > 0),
  height integer CHECK (height > 0),
  storage_key text UNIQUE,
  stored_at timestamptz,
  is_addition boolean NOT NULL DEFAULT false,
  user_id uuid NOT NULL REFERENCES users,
  device_at timestamptz NOT NULL,
  received_at timestamptz NOT NULL,
  occurred_at timestamptz NOT NULL,
  is_corrected boolean NOT NULL DEFAULT false,
  CHECK ((stored_at IS NULL) = (storage_key IS NULL) AND (stored_at IS NULL) = (width IS NULL) AND (width IS NULL) = (height IS NULL)),
  CHECK (stored_at IS NULL OR (received_bytes = bytes AND refused IS NULL))
);
CREATE INDEX photos_by_visit ON photos (visit_id);

CREATE TABLE photo_pieces (
  photo_id uuid NOT NULL REFERENCES photos ON DELETE CASCADE,
  starts_at integer NOT NULL CHECK (starts_at >= 0),
  content bytea NOT NULL CHECK (octet_length(content) > 0),
  PRIMARY KEY (photo_id, starts_at)
);

CREATE FUNCTION has_work_begun(visit uuid) RETURNS boolean LANGUAGE sql STABLE AS $$
  SELECT EXISTS (SELECT 1 FROM visits WHERE id = visit AND progress IN ('working', 'part_done', 'done'))
$$;

CREATE FUNCTION refuse_frozen_walk_round() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'INSERT' THEN
    IF NOT NEW.is_late AND has_work_begun(NEW.visit_id) THEN
      RAISE EXCEPTION 'work has begun: a walk-round can only come late' USING ERRCODE = 'DR004';
    END IF;
    RETURN NEW;
  END IF;
  IF has_work_begun(OLD.visit_id) THEN
    RAISE EXCEPTION 'the walk-round is frozen since work began' USING ERRCODE = 'DR004';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
CREATE TRIGGER walk_rounds_frozen BEFORE INSERT OR UPDATE OR DELETE ON walk_rounds FOR EACH ROW EXECUTE FUNCTION refuse_frozen_walk_round();

CREATE FUNCTION refuse_frozen_mark() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'INSERT' THEN
    IF NOT NEW.is_addition AND has_work_begun(NEW.visit_id) THEN
      RAISE EXCEPTION 'work has begun: a mark can only be added as such' USING ERRCODE = 'DR004';
    END IF;
    RETURN NEW;
  END IF;
  IF has_work_begun(OLD.visit_id) THEN
    RAISE EXCEPTION 'the mark is frozen since work began' USING ERRCODE = 'DR004';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
CREATE TRIGGER walk_marks_frozen BEFORE INSERT OR UPDATE OR DELETE ON walk_marks FOR EACH ROW EXECUTE FUNCTION refuse_frozen_mark();

CREATE TRIGGER walk_looks_appended BEFORE UPDATE OR DELETE ON walk_looks FOR EACH ROW EXECUTE FUNCTION refuse_change();

CREATE FUNCTION refuse_stored_photo() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF OLD.stored_at IS NOT NULL THEN
    RAISE EXCEPTION 'a stored photo never changes' USING ERRCODE = 'DR004';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER photos_stored BEFORE UPDATE ON photos FOR EACH ROW EXECUTE FUNCTION refuse_stored_photo();
`,
  down: `
DROP TABLE photo_pieces, photos, walk_looks, walk_marks, walk_rounds;
DROP FUNCTION refuse_stored_photo, refuse_frozen_mark, refuse_frozen_walk_round, has_work_begun;
ALTER TABLE services DROP COLUMN photo_set;
`,
};
