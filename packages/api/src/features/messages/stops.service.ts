import { messageGroupNames } from '@driprail/shared/domain/messages/kinds';
import { companyOf } from '../../db/company.ts';
import { Customer } from '../../db/models/index.ts';
import { inTransaction, run, select } from '../../db/sequelize.ts';
import { notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import type { StopTokens } from './stop-tokens.ts';

type Change = 'stop' | 'go_on' | null;

/** Whose link it is leads to the record that took a merged one in. @throws 404 for a link not signed here */
export function followStopLink(stops: StopTokens, token: string, change: Change, now: Date) {
  return inTransaction(async (tx) => {
    const said = stops.read(token);
    const found = said && (await Customer.findByPk(said.customerId, { transaction: tx }));
    if (!said || !found || found.erasedAt) throw notFound('That page');
    const values = { customerId: found.mergedInto ?? found.id, what: said.group, now };
    if (change === 'stop')
      await run(
        `INSERT INTO message_stops (customer_id, what, at) VALUES (:customerId, :what, :now) ON CONFLICT DO NOTHING`,
        values,
        tx,
      );
    if (change === 'go_on')
      await run(`DELETE FROM message_stops WHERE customer_id = :customerId AND what = :what`, values, tx);
    if (change) hintAfterCommit(tx, ['desk'], 'message', values.customerId);
    const rows = await select(
      'SELECT 1 FROM message_stops WHERE customer_id = :customerId AND what = :what',
      values,
      tx,
    );
    const { name, phone } = await companyOf(tx);
    return {
      ...{ companyName: name, companyPhone: phone, what: messageGroupNames[said.group] },
      isStopped: rows.length > 0,
    };
  });
}
