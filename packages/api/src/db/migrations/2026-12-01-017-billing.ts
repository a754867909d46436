import type { Migration } from '../migration.ts';

/** Invoices with their tax, payments, refunds with credit notes, the customer's own page, cash handed in. */
export const billing: Migration = {
  name: '2026-12-01-017-billing',
  up: `
ALTER TABLE services ADD COLUMN tax_class text NOT NULL DEFAULT 'standard' CHECK (tax_class IN ('standard', 'reduced', 'untaxed'));
ALTER TABLE company_settings
  ADD COLUMN invoice_due_days integer NOT NULL DEFAULT 14 CHECK (invoice_due_days BETWEEN 0 AND 120),
  -- Jobs finished before are not billed by themselves.
  ADD COLUMN bills_from timestamptz NOT NULL DEFAULT now();

-- Entered by the owner; the latest row of a name, class and town that has started counts, zero percent ends it.
CREATE TABLE tax_rates (
  id uuid PRIMARY KEY,
  name text NOT NULL CHECK (name <> ''),
  tax_class text NOT NULL CHECK (tax_class IN ('standard', 'reduced')),
  place text NOT NULL DEFAULT '',
  percent numeric(14,6) NOT NULL CHECK (percent BETWEEN 0 AND 100),
  starts_on date NOT NULL,
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL
);
CREATE UNIQUE INDEX tax_rates_once ON tax_rates (lower(name), tax_class, lower(place), starts_on);
CREATE TRIGGER tax_rates_append_only BEFORE UPDATE OR DELETE ON tax_rates FOR EACH ROW EXECUTE FUNCTION refuse_change();

-- Locked and counted up in the transaction that writes the document: no gaps, no number twice.
CREATE TABLE document_counters (kind text PRIMARY KEY CHECK (kind IN ('invoice', 'credit_note')), last_number integer NOT NULL);
INSERT INTO document_counters VALUES ('invoice', 1000), ('credit_note', 100);

CREATE TABLE invoices (
  id uuid PRIMARY KEY,
  number integer NOT NULL UNIQUE,
  job_id uuid NOT NULL REFERENCES jobs,
  customer_id uuid NOT NULL REFERENCES customers,
  issued_at timestamptz NOT NULL,
  issued_by uuid REFERENCES users,
  due_on date NOT NULL,
  bill_to jsonb NOT NULL,
  place text NOT NULL,
  discount_reason text NOT NULL DEFAULT '',
  net_cents bigint NOT NULL CHECK (net_cents >= 0),
  tax_cents bigint NOT NULL CHECK (tax_cents >= 0),
  total_cents bigint NOT NULL CHECK (total_cents = net_cents + tax_cents),
  -- Credited whole: the job may be billed anew.
  voided_at timestamptz
);
CREATE UNIQUE INDEX invoices_one_per_job ON invoices (job_id) WHERE voided_at IS NULL;
CREATE INDEX invoices_by_customer ON invoices (customer_id);

CREATE TABLE invoice_lines (
  id uuid PRIMARY KEY,
  invoice_id uuid NOT NULL REFERENCES invoices,
  job_line_id uuid NOT NULL REFERENCES job_lines,
  label text NOT NULL,
  detail text NOT NULL DEFAULT '',
  tax_class text NOT NULL CHECK (tax_class IN ('standard', 'reduced', 'untaxed')),
  price_cents bigint NOT NULL CHECK (price_cents >= 0),
  discount_cents bigint NOT NULL CHECK (discount_cents BETWEEN 0 AND price_cents),
  position integer NOT NULL
);
CREATE INDEX invoice_lines_by_invoice ON invoice_lines (invoice_id);
CREATE TABLE invoice_taxes (
  id uuid PRIMARY KEY,
  invoice_id uuid NOT NULL REFERENCES invoices,
  name text NOT NULL,
  place text NOT NULL DEFAULT '',
  tax_class text NOT NULL,
  percent numeric(14,6) NOT NULL,
  base_cents bigint NOT NULL,
  tax_cents bigint NOT NULL,
  position integer NOT NULL
);
CREATE INDEX invoice_taxes_by_invoice ON invoice_taxes (invoice_id);

-- A request for a card payment at the payments service; its id is the key that makes it happen once.
CREATE TABLE card_attempts (
  id uuid PRIMARY KEY,
  job_id uuid NOT NULL REFERENCES jobs,
  amount_cents bigint NOT NULL CHECK (amount_cents > 0),
  tip_cents bigint NOT NULL DEFAULT 0 CHECK (tip_cents >= 0),
  state text NOT NULL DEFAULT 'open' CHECK (state IN ('open', 'paid', 'expired', 'failed')),
  provider_ref text UNIQUE,
  url text,
  created_at timestamptz NOT NULL,
  created_by uuid REFERENCES users,
  settled_at timestamptz
);
CREATE INDEX card_attempts_by_job ON card_attempts (job_id);

CREATE TABLE payments (
  id uuid PRIMARY KEY,
  job_id uuid NOT NULL REFERENCES jobs,
  method text NOT NULL CHECK (method IN ('cash', 'check', 'card', 'transfer')),
  -- Towards the job; a tip is a row of its own.
  amount_cents bigint NOT NULL CHECK (amount_cents > 0),
  received_at timestamptz NOT NULL,
  recorded_at timestamptz NOT NULL,
  recorded_by uuid REFERENCES users,
  -- Who took it in hand.
  person_id uuid REFERENCES people,
  reference text NOT NULL DEFAULT '',
  attempt_id uuid UNIQUE REFERENCES card_attempts,
  provider_ref text UNIQUE,
  CHECK ((method = 'card') = (provider_ref IS NOT NULL))
);
CREATE INDEX payments_by_job ON payments (job_id);
CREATE INDEX payments_by_time ON payments (received_at);
ALTER TABLE tips ADD COLUMN payment_id uuid REFERENCES payments, ALTER COLUMN user_id DROP NOT NULL;
ALTER TABLE jobs_paid ALTER COLUMN recorded_by DROP NOT NULL;

CREATE TABLE credit_notes (
  id uuid PRIMARY KEY,
  number integer NOT NULL UNIQUE,
  invoice_id uuid NOT NULL REFERENCES invoices,
  reason_id uuid REFERENCES refund_reasons,
  note text NOT NULL DEFAULT '',
  net_cents bigint NOT NULL CHECK (net_cents >= 0),
  tax_cents bigint NOT NULL CHECK (tax_cents >= 0),
  issued_at timestamptz NOT NULL,
  issued_by uuid NOT NULL REFERENCES users,
  CHECK (net_cents + tax_cents > 0)
);
CREATE INDEX credit_notes_by_invoice ON credit_notes (invoice_id);
CREATE TABLE credit_note_lines (
  credit_note_id uuid NOT NULL REFERENCES credit_notes,
  invoice_line_id uuid NOT NULL REFERENCES invoice_lines,
  net_cents bigint NOT NULL CHECK (net_cents > 0),
  PRIMARY KEY (credit_note_id, invoice_line_id)
);
CREATE TABLE credit_note_taxes (
  credit_note_id uuid NOT NULL REFERENCES credit_notes,
  invoice_tax_id uuid NOT NULL REFERENCES invoice_taxes,
  tax_cents bigint NOT NULL CHECK (tax_cents > 0),
  PRIMARY KEY (credit_note_id, invoice_tax_id)
);

-- Money that goes back. A card refund is asked for in the transaction and made after it, again until the service has answered.
CREATE TABLE refunds (
  id uuid PRIMARY KEY,
  payment_id uuid NOT NULL REFERENCES payments,
  kind text NOT NULL CHECK (kind IN ('refund', 'mistake', 'dispute')),
  amount_cents bigint NOT NULL CHECK (amount_cents > 0),
  credit_note_id uuid REFERENCES credit_notes,
  note text NOT NULL DEFAULT '',
  state text NOT NULL CHECK (state IN ('asked', 'done', 'failed')),
  fault text NOT NULL DEFAULT '',
  made_at timestamptz NOT NULL,
  made_by uuid REFERENCES users,
  provider_ref text UNIQUE
);
CREATE INDEX refunds_by_payment ON refunds (payment_id);
CREATE INDEX refunds_asked ON refunds (made_at) WHERE state = 'asked';

CREATE FUNCTION refuse_refund_past_payment() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE received bigint;
BEGIN
  SELECT amount_cents INTO received FROM payments WHERE id = NEW.payment_id FOR UPDATE;
  IF (SELECT coalesce(sum(amount_cents), 0) FROM refunds WHERE payment_id = NEW.payment_id AND state <> 'failed' AND id <> NEW.id)
     + NEW.amount_cents > received THEN
    RAISE EXCEPTION 'more than was received' USING ERRCODE = 'DR005';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER refunds_within_payment BEFORE INSERT ON refunds FOR EACH ROW EXECUTE FUNCTION refuse_refund_past_payment();

-- Each event of the payments service is taken once, in whatever order it comes.
CREATE TABLE payment_events (
  id text PRIMARY KEY,
  kind text NOT NULL,
  happened_at timestamptz NOT NULL,
  received_at timestamptz NOT NULL
);

-- Cash that a person took, counted at the desk. Over and short are noted and never touch pay.
CREATE TABLE cash_counts (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  expected_cents bigint NOT NULL CHECK (expected_cents >= 0),
  counted_cents bigint NOT NULL CHECK (counted_cents >= 0),
  note text NOT NULL DEFAULT '',
  counted_at timestamptz NOT NULL,
  counted_by uuid NOT NULL REFERENCES users,
  CHECK (expected_cents = counted_cents OR note <> '')
);
CREATE TABLE cash_count_payments (
  payment_id uuid PRIMARY KEY REFERENCES payments,
  cash_count_id uuid NOT NULL REFERENCES cash_counts
);

-- The customer's own page of a job. The token is signed, never stored; ended by its date or taken back.
CREATE TABLE customer_links (
  id uuid PRIMARY KEY,
  job_id uuid NOT NULL UNIQUE REFERENCES jobs,
  created_at timestamptz NOT NULL,
  expires_at timestamptz NOT NULL,
  revoked_at timestamptz
);

CREATE TABLE feedback (
  job_id uuid PRIMARY KEY REFERENCES jobs,
  stars integer NOT NULL CHECK (stars BETWEEN 1 AND 5),
  words text NOT NULL DEFAULT '',
  given_at timestamptz NOT NULL
);

-- What was written stays; only an invoice's voiding is set, once.
CREATE FUNCTION refuse_invoice_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'UPDATE' AND OLD.voided_at IS NULL AND to_jsonb(NEW) - 'voided_at' = to_jsonb(OLD) - 'voided_at' THEN
    RETURN NEW;
  END IF;
  RAISE EXCEPTION 'an invoice stays as it was issued';
END $$;
CREATE TRIGGER invoices_stay BEFORE UPDATE OR DELETE ON invoices FOR EACH ROW EXECUTE FUNCTION refuse_invoice_change();
CREATE TRIGGER invoice_lines_append_only BEFORE UPDATE OR DELETE ON invoice_lines FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER invoice_taxes_append_only BEFORE UPDATE OR DELETE ON invoice_taxes FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER payments_append_only BEFORE UPDATE OR DELETE ON payments FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER credit_notes_append_only BEFORE UPDATE OR DELETE ON credit_notes FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER credit_note_lines_append_only BEFORE UPDATE OR DELETE ON credit_note_lines FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER credit_note_taxes_append_only BEFORE UPDATE OR DELETE ON credit_note_taxes FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER cash_counts_append_only BEFORE UPDATE OR DELETE ON cash_counts FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER cash_count_payments_append_only BEFORE UPDATE OR DELETE ON cash_count_payments FOR EACH ROW EXECUTE FUNCTION refuse_change();
`,
  down: `
DROP TABLE feedback, customer_links, cash_count_payments, cash_counts, payment_events, refunds, credit_note_taxes, credit_note_lines,
  credit_notes;
DROP FUNCTION refuse_refund_past_payment;
ALTER TABLE jobs_paid ALTER COLUMN recorded_by SET NOT NULL;
ALTER TABLE tips DROP COLUMN payment_id, ALTER COLUMN user_id SET NOT NULL;
DROP TABLE payments, card_attempts, invoice_taxes, invoice_lines, invoices;
DROP FUNCTION refuse_invoice_change;
DROP TABLE document_counters, tax_rates;
ALTER TABLE company_settings DROP COLUMN bills_from, DROP COLUMN invoice_due_days;
ALTER TABLE services DROP COLUMN tax_class;
`,
};
