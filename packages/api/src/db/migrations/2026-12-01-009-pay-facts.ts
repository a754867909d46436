import type { Migration } from '../migration.ts';

/** Product cost, miles and reviews as dated rates; agreements; refunds with their reasons; tips meant for a person. */
export const payFacts: Migration = {
  name: '2026-12-01-009-pay-facts',
  up: `
ALTER TABLE pay_rates DROP CONSTRAINT pay_rates_kind_check;
ALTER TABLE pay_rates ADD CONSTRAINT pay_rates_kind_check
  CHECK (kind IN ('hourly', 'commission_percent', 'flat_service', 'product_cost', 'mileage', 'per_review'));

ALTER TABLE pay_rules
  ADD COLUMN tips_go_to text NOT NULL DEFAULT 'crew' CHECK (tips_go_to IN ('crew', 'person')),
  ADD COLUMN tip_card_fee_percent numeric(14,6) NOT NULL DEFAULT 0 CHECK (tip_card_fee_percent BETWEEN 0 AND 10);
ALTER TABLE tips ADD COLUMN for_person_id uuid REFERENCES people;

-- What a person agreed to in writing, from the first day of a workweek on; an ending is a row of its own.
CREATE TABLE pay_agreements (
  id uuid PRIMARY KEY,
  person_id uuid NOT NULL REFERENCES people,
  kind text NOT NULL CHECK (kind IN ('refunds', 'rate_in_effect')),
  starts_on date NOT NULL,
  -- Null where the agreement ends on this day.
  signed_on date,
  note text NOT NULL DEFAULT '',
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL,
  UNIQUE (person_id, kind, starts_on)
);
CREATE TRIGGER pay_agreements_append_only BEFORE UPDATE OR DELETE ON pay_agreements FOR EACH ROW EXECUTE FUNCTION refuse_change();

-- Why money goes back to a customer, and whether that lowers commission; the latest row of a name that has started counts.
CREATE TABLE refund_reasons (
  id uuid PRIMARY KEY,
  name text NOT NULL CHECK (name <> ''),
  lowers_commission boolean NOT NULL,
  starts_on date NOT NULL,
  set_by uuid REFERENCES users,
  set_at timestamptz NOT NULL
);
CREATE UNIQUE INDEX refund_reasons_once ON refund_reasons (lower(name), starts_on);
CREATE TRIGGER refund_reasons_append_only BEFORE UPDATE OR DELETE ON refund_reasons FOR EACH ROW EXECUTE FUNCTION refuse_change();

ALTER TABLE pay_adjustments DROP CONSTRAINT pay_adjustments_kind_check;
ALTER TABLE pay_adjustments
  ADD CONSTRAINT pay_adjustments_kind_check
    CHECK (kind IN ('bonus', 'discretionary_bonus', 'reimbursement', 'paid_time_off', 'refund', 'deduction', 'correction')),
  ADD COLUMN counted jsonb CHECK (counted IS NULL OR kind IN ('bonus', 'reimbursement')),
  ADD COLUMN refund_reason_id uuid REFERENCES refund_reasons,
  ADD CONSTRAINT pay_adjustments_refund_check
    CHECK (kind <> 'refund' OR (amount_cents < 0 AND refund_reason_id IS NOT NULL));
`,
  down: `
ALTER TABLE pay_adjustments DROP COLUMN refund_reason_id, DROP COLUMN counted, DROP CONSTRAINT pay_adjustments_kind_check;
ALTER TABLE pay_adjustments ADD CONSTRAINT pay_adjustments_kind_check
  CHECK (kind IN ('bonus', 'discretionary_bonus', 'reimbursement', 'paid_time_off', 'deduction', 'correction'));
DROP TABLE refund_reasons, pay_agreements;
ALTER TABLE tips DROP COLUMN for_person_id;
ALTER TABLE pay_rules DROP COLUMN tips_go_to, DROP COLUMN tip_card_fee_percent;
ALTER TABLE pay_rates DROP CONSTRAINT pay_rates_kind_check;
ALTER TABLE pay_rates ADD CONSTRAINT pay_rates_kind_check CHECK (kind IN ('hourly', 'commission_percent', 'flat_service'));
`,
};
