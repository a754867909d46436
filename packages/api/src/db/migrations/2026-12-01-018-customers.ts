import type { Migration } from '../migration.ts';

/** The whole record of a customer, and one row of words to find it by. */
export const customers: Migration = {
  name: '2026-12-01-018-customers',
  up: `
-- In Debian's postgresql package like btree_gist, and as trusted.
CREATE EXTENSION IF NOT EXISTS pg_trgm;

ALTER TABLE customers
  ADD COLUMN tags text[] NOT NULL DEFAULT '{}',
  -- The record that took this one in; a chain is never longer than one.
  ADD COLUMN merged_into uuid REFERENCES customers CHECK (merged_into <> id),
  ADD COLUMN merged_at timestamptz,
  ADD COLUMN erased_at timestamptz,
  ADD CONSTRAINT customers_merged_when CHECK ((merged_into IS NULL) = (merged_at IS NULL));
CREATE INDEX customers_merged ON customers (merged_into) WHERE merged_into IS NOT NULL;

CREATE TABLE customer_crew (
  customer_id uuid NOT NULL REFERENCES customers,
  person_id uuid NOT NULL REFERENCES people,
  position integer NOT NULL,
  PRIMARY KEY (customer_id, person_id)
);

-- Every answer stays; the latest counts.
CREATE TABLE customer_consents (
  id uuid PRIMARY KEY,
  customer_id uuid NOT NULL REFERENCES customers,
  channel text NOT NULL CHECK (channel IN ('mail', 'text')),
  is_given boolean NOT NULL,
  given_on date NOT NULL,
  how text NOT NULL CHECK (how <> ''),
  user_id uuid REFERENCES users,
  recorded_at timestamptz NOT NULL
);
CREATE INDEX customer_consents_by_customer ON customer_consents (customer_id, channel, recorded_at);

-- Looked at, and not the same customer.
CREATE TABLE customers_apart (
  customer_id uuid NOT NULL REFERENCES customers,
  other_id uuid NOT NULL REFERENCES customers,
  user_id uuid NOT NULL REFERENCES users,
  at timestamptz NOT NULL,
  PRIMARY KEY (customer_id, other_id),
  CHECK (customer_id < other_id)
);

ALTER TABLE addresses
  ADD COLUMN label text NOT NULL DEFAULT '',
  ADD COLUMN drain text NOT NULL DEFAULT 'unknown' CHECK (drain IN ('unknown', 'sewer', 'storm', 'soakaway')),
  ADD COLUMN wash_water text CHECK (wash_water IN ('reclaim', 'mat', 'lawn', 'wash_bay')),
  ADD COLUMN permit_number text NOT NULL DEFAULT '',
  ADD COLUMN permit_until date,
  ADD COLUMN owner_consent_by text NOT NULL DEFAULT '',
  ADD COLUMN owner_consent_on date,
  ADD CONSTRAINT addresses_consent_whole CHECK ((owner_consent_by = '') = (owner_consent_on IS NULL));
UPDATE addresses SET drain = 'storm' WHERE drains_to_creek;
ALTER TABLE addresses DROP COLUMN drains_to_creek;
ALTER TABLE addresses ADD COLUMN drains_to_creek boolean GENERATED ALWAYS AS (drain = 'storm') STORED;

ALTER TABLE vehicles
  ADD COLUMN year integer CHECK (year BETWEEN 1900 AND 2100),
  ADD COLUMN make text NOT NULL DEFAULT '',
  ADD COLUMN model text NOT NULL DEFAULT '',
  ADD COLUMN vin text NOT NULL DEFAULT '',
  ADD COLUMN wheel_finish text NOT NULL DEFAULT 'unsure'
    CHECK (wheel_finish IN ('unsure', 'painted', 'clear_coated', 'powder_coated', 'chrome', 'polished', 'bare')),
  ADD COLUMN paint text NOT NULL DEFAULT '',
  ADD COLUMN interior text NOT NULL DEFAULT '';
UPDATE vehicles SET model = label WHERE label !~ '^(19|20)[0-9]{2} +[^ ]';
UPDATE vehicles SET year = left(label, 4)::integer, model = ltrim(substr(label, 5)) WHERE label ~ '^(19|20)[0-9]{2} +[^ ]';

-- The same as folded() in the shared rules.
CREATE FUNCTION folded(words text) RETURNS text IMMUTABLE PARALLEL SAFE LANGUAGE sql AS $$
  SELECT lower(regexp_replace(normalize(words, NFKD), '[\\u0300-\\u036f\\u0591-\\u05c7\\u064b-\\u065f''’ʼ‘\`]', '', 'g'))
$$;
CREATE FUNCTION tight(words text) RETURNS text IMMUTABLE PARALLEL SAFE LANGUAGE sql AS $$
  SELECT regexp_replace(folded(words), '[[:space:].()+-]', '', 'g')
$$;

-- All that a customer is found by: also what the records said that were merged into it.
CREATE TABLE customer_words (
  customer_id uuid PRIMARY KEY REFERENCES customers ON DELETE CASCADE,
  words text NOT NULL
);
CREATE INDEX customer_words_any_part ON customer_words USING gin (words gin_trgm_ops);

CREATE FUNCTION customer_words_of(wanted uuid) RETURNS text STABLE LANGUAGE sql AS $$
  SELECT concat_ws(E'\\n',
    (SELECT string_agg(folded(concat_ws(E'\\n', c.name, c.phone, c.email, array_to_string(c.tags, E'\\n'))) || E'\\n' || tight(c.phone), E'\\n')
       FROM customers c WHERE c.id = wanted OR c.merged_into = wanted),
    (SELECT string_agg(folded(concat_ws(' ', a.label, a.line, a.area, a.city, a.postcode)), E'\\n') FROM addresses a WHERE a.customer_id = wanted),
    (SELECT string_agg(folded(v.plate) || E'\\n' || tight(v.plate) || E'\\n' || tight(v.vin), E'\\n') FROM vehicles v WHERE v.customer_id = wanted))
$$;

CREATE FUNCTION keep_customer_words(changed uuid) RETURNS void LANGUAGE sql AS $$
  INSERT INTO customer_words (customer_id, words) SELECT changed, customer_words_of(changed)
  ON CONFLICT (customer_id) DO UPDATE SET words = excluded.words
$$;

CREATE FUNCTION customer_changed() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF NEW.merged_into IS NULL THEN
    PERFORM keep_customer_words(NEW.id);
  ELSE
    DELETE FROM customer_words WHERE customer_id = NEW.id;
    PERFORM keep_customer_words(NEW.merged_into);
  END IF;
  RETURN NULL;
END $$;
CREATE TRIGGER customers_words AFTER INSERT OR UPDATE ON customers FOR EACH ROW EXECUTE FUNCTION customer_changed();

CREATE FUNCTION customer_part_changed() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  PERFORM keep_customer_words(NEW.customer_id);
  IF TG_OP = 'UPDATE' AND OLD.customer_id <> NEW.customer_id AND EXISTS (SELECT 1 FROM customer_words WHERE customer_id = OLD.customer_id) THEN
    PERFORM keep_customer_words(OLD.customer_id);
  END IF;
  RETURN NULL;
END $$;
CREATE TRIGGER addresses_words AFTER INSERT OR UPDATE ON addresses FOR EACH ROW EXECUTE FUNCTION customer_part_changed();
CREATE TRIGGER vehicles_words AFTER INSERT OR UPDATE ON vehicles FOR EACH ROW EXECUTE FUNCTION customer_part_changed();
INSERT INTO customer_words (customer_id, words) SELECT id, customer_words_of(id) FROM customers;

-- Files whose rows are gone: named in the transaction that erased them, forgotten when the file is gone too.
CREATE TABLE files_to_remove (storage_key text PRIMARY KEY, since timestamptz NOT NULL);

-- A customer's initials go on request, whatever state the visit is in; nothing else of a walk-round may change with them.
CREATE OR REPLACE FUNCTION refuse_frozen_walk_round() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'INSERT' THEN
    IF NOT NEW.is_late AND has_work_begun(NEW.visit_id) THEN
      RAISE EXCEPTION 'work has begun: a walk-round can only come late' USING ERRCODE = 'DR004';
    END IF;
    RETURN NEW;
  END IF;
  IF TG_OP = 'UPDATE' AND NEW.initials IS NULL AND NEW.absent_reason = 'Erased on request' AND NEW.items_note = ''
     AND to_jsonb(NEW) - ARRAY['initials', 'absent_reason', 'items_note'] = to_jsonb(OLD) - ARRAY['initials', 'absent_reason', 'items_note'] THEN
    RETURN NEW;
  END IF;
  IF has_work_begun(OLD.visit_id) THEN
    RAISE EXCEPTION 'the walk-round is frozen since work began' USING ERRCODE = 'DR004';
  END IF;
  RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
END $$;
`,
  down: `
CREATE OR REPLACE FUNCTION refuse_frozen_walk_round() RETURNS trigger LANGUAGE plpgsql AS $$
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
DROP TRIGGER vehicles_words ON vehicles;
DROP TRIGGER addresses_words ON addresses;
DROP TRIGGER customers_words ON customers;
DROP FUNCTION customer_part_changed, customer_changed, keep_customer_words, customer_words_of;
DROP TABLE files_to_remove, customer_words, customers_apart, customer_consents, customer_crew;
DROP FUNCTION tight, folded;
ALTER TABLE vehicles DROP COLUMN year, DROP COLUMN make, DROP COLUMN model, DROP COLUMN vin, DROP COLUMN wheel_finish,
  DROP COLUMN paint, DROP COLUMN interior;
ALTER TABLE addresses DROP COLUMN drains_to_creek;
ALTER TABLE addresses ADD COLUMN drains_to_creek boolean NOT NULL DEFAULT false;
UPDATE addresses SET drains_to_creek = drain = 'storm';
ALTER TABLE addresses DROP CONSTRAINT addresses_consent_whole, DROP COLUMN label, DROP COLUMN drain, DROP COLUMN wash_water,
  DROP COLUMN permit_number, DROP COLUMN permit_until, DROP COLUMN owner_consent_by, DROP COLUMN owner_consent_on;
ALTER TABLE customers DROP CONSTRAINT customers_merged_when, DROP COLUMN tags, DROP COLUMN merged_into, DROP COLUMN merged_at,
  DROP COLUMN erased_at;
DROP EXTENSION pg_trgm;
`,
};
