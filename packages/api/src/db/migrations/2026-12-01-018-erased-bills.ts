import type { Migration } from '../migration.ts';

const refuseChange = (exception: string) => `
CREATE OR REPLACE FUNCTION refuse_invoice_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'UPDATE' AND OLD.voided_at IS NULL AND to_jsonb(NEW) - 'voided_at' = to_jsonb(OLD) - 'voided_at' THEN
    RETURN NEW;
  END IF;
  ${exception}
  RAISE EXCEPTION 'an invoice stays as it was issued';
END $$;
`;

/** An invoice's name and street go on request; its number, date, town and amounts stay. */
export const erasedBills: Migration = {
  name: '2026-12-01-018-erased-bills',
  up: refuseChange(`IF TG_OP = 'UPDATE' AND to_jsonb(NEW) - 'bill_to' = to_jsonb(OLD) - 'bill_to' AND NEW.bill_to ->> 'line' = ''
     AND NEW.bill_to ->> 'name' LIKE 'Customer erased %' AND NEW.bill_to - ARRAY['name', 'line'] = OLD.bill_to - ARRAY['name', 'line'] THEN
    RETURN NEW;
  END IF;`),
  down: refuseChange(''),
};
