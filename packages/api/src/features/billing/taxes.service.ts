import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import type { addTaxRate as contract, TaxRateDto } from '@driprail/shared/contracts/taxes.contract';
import { audit } from '../../db/audit.ts';
import { TaxRateRow } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { unprocessable } from '../../http/errors.ts';

type TaxFields = z.infer<(typeof contract)['body']>;

/** Every tax rate entered, by name and place, the newest first. */
export function listTaxRates(): Promise<TaxRateDto[]> {
  return select<TaxRateDto>(
    `SELECT t.id, t.name, t.tax_class AS "taxClass", t.place, trim_scale(t.percent)::text AS percent, t.starts_on::text AS "startsOn",
            coalesce(u.name, '') AS "setBy", to_json(t.set_at) #>> '{}' AS "setAt"
       FROM tax_rates t LEFT JOIN users u ON u.id = t.set_by ORDER BY lower(t.name), lower(t.place), t.tax_class, t.starts_on DESC`,
  );
}

/** A tax from a day on; what was billed keeps its own. @throws 422 when that day has one already */
export function addTaxRate({ actor, now }: Ctx, fields: TaxFields): Promise<void> {
  return inTransaction(async (tx) => {
    const [same] = await select(
      `SELECT 1 FROM tax_rates WHERE lower(name) = lower(:name) AND tax_class = :taxClass AND lower(place) = lower(:place) AND starts_on = :startsOn`,
      fields,
      tx,
    );
    const message = 'This tax has a rate from that day on already. Choose another day.';
    if (same) throw unprocessable('same_day', message, { fields: { startsOn: message } });
    const id = uuid();
    await TaxRateRow.create({ id, ...fields, setBy: actor.userId, setAt: now() }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'tax_rate', id, 'set', { ...fields });
  });
}
