import type { ReactNode } from 'react';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { paymentMethodNames } from '@driprail/shared/contracts/bill.dto';
import { taxClassNames } from '@driprail/shared/domain/billing/tax-rates';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { money, useFormats } from '../../../lib/format.ts';
import { refundKindNames, refundStateWords } from './bill-words.ts';

/** The bill as a ledger: what was done, tax, and every movement since, down to what is owed. */
export function BillLedger({ bill }: { bill: BillDto }) {
  return (
    <>
      <section aria-label="What was billed">
        <h3 className="sec">Work</h3>
        <table className="grid-t bl-t">
          <tbody>
            {bill.lines.map((line) => (
              <Row key={line.id} name={line.label} cents={line.priceCents}>
                {[
                  line.detail,
                  line.taxClass === 'standard' ? '' : taxClassNames[line.taxClass].toLowerCase(),
                  line.creditedCents > 0 ? `${money(line.creditedCents)} of it credited` : '',
                ]
                  .filter(Boolean)
                  .join(', ')}
              </Row>
            ))}
            {bill.discountCents > 0 ? (
              <Row name="Discount" cents={-bill.discountCents}>
                {bill.discountReason}
              </Row>
            ) : null}
            <Row name="Before tax" cents={bill.netCents} isSum />
            {bill.taxes.map((tax) => (
              <Row key={`${tax.name}/${tax.taxClass}`} name={`${tax.name}, ${tax.percent}%`} cents={tax.taxCents}>
                {`${tax.place || 'everywhere'}, on ${money(tax.baseCents)}`}
              </Row>
            ))}
          </tbody>
          <tfoot>
            <Row name="Total" cents={bill.totalCents} isSum />
          </tfoot>
        </table>
      </section>
      <Movements bill={bill} />
    </>
  );
}

function Movements({ bill }: { bill: BillDto }) {
  const { zone } = useFormats();
  const date = (instant: string) => formatDate(dayOf(instant, zone));
  const rows = [
    ...bill.payments.map((payment) => ({
      ...{ id: payment.id, at: payment.receivedAt, name: paymentMethodNames[payment.method], isOff: false },
      more: [payment.reference, payment.by ? `taken by ${payment.by}` : 'by the customer’s own link'],
      cents: -payment.amountCents,
    })),
    ...bill.creditNotes.map((note) => ({
      ...{ id: note.id, at: note.issuedAt, name: `Credit note ${note.number}`, isOff: false },
      ...{ more: [note.note], cents: -note.totalCents },
    })),
    ...bill.refunds.map((refund) => ({
      ...{ id: refund.id, at: refund.madeAt, name: refundKindNames[refund.kind], isOff: refund.state === 'failed' },
      more: [refundStateWords(refund), refund.note],
      cents: refund.amountCents,
    })),
  ].sort((a, b) => a.at.localeCompare(b.at));
  return (
    <section aria-label="What was received, credited and given back">
      <h3 className="sec">Since then</h3>
      {rows.length === 0 ? <p className="t-2 py-2">Nothing was received or credited yet.</p> : null}
      <table className="grid-t bl-t">
        <tbody>
          {rows.map(({ id, at, name, more, cents, isOff }) => (
            <Row key={id} name={name} cents={cents} isOff={isOff}>
              {[date(at), ...more].filter(Boolean).join(', ')}
            </Row>
          ))}
        </tbody>
        <tfoot>
          <Row
            name={bill.owedCents < 0 ? 'Owed back to the customer' : 'Owed'}
            cents={Math.abs(bill.owedCents)}
            isSum
          />
        </tfoot>
      </table>
    </section>
  );
}

function Row({
  name,
  cents,
  isSum = false,
  isOff = false,
  children,
}: {
  name: string;
  cents: number;
  isSum?: boolean;
  /** It did not happen: shown, and not counted. */
  isOff?: boolean;
  children?: ReactNode;
}) {
  return (
    <tr className={isOff ? 'is-off' : ''}>
      <th scope="row">
        {isSum ? <b>{name}</b> : name}
        {children ? <small>{children}</small> : null}
      </th>
      <td className="r">{isSum ? <b>{money(cents)}</b> : money(cents)}</td>
    </tr>
  );
}
