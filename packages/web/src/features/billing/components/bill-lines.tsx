import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { paymentMethodNames } from '@driprail/shared/contracts/bill.dto';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { money } from '../../../lib/format.ts';
import './bill-lines.css';

type Shown = Pick<
  BillDto,
  'lines' | 'discountCents' | 'discountReason' | 'taxes' | 'creditNotes' | 'owedCents' | 'totalCents'
> & { payments: Omit<BillDto['payments'][number], 'by' | 'reference'>[] };

/** A bill as a customer reads it: what was done, tax, what was paid, what is to pay. */
export function BillLines({ bill, zone, waitingCents = 0 }: { bill: Shown; zone: string; waitingCents?: number }) {
  const owed = bill.owedCents - waitingCents;
  return (
    <dl className="bill">
      {bill.lines.map((line) => (
        <Row key={line.id} name={line.label} more={line.detail} cents={line.priceCents} />
      ))}
      {bill.discountCents > 0 ? <Row name="Discount" more={bill.discountReason} cents={-bill.discountCents} /> : null}
      {bill.taxes.map((tax) => (
        <Row
          key={`${tax.name}/${tax.taxClass}`}
          name={`${tax.name} ${tax.percent}%`}
          more={tax.place}
          cents={tax.taxCents}
        />
      ))}
      {bill.creditNotes.map((note) => (
        <Row key={note.id} name={`Credit note ${note.number}`} more={note.note} cents={-note.totalCents} />
      ))}
      {bill.payments
        .filter((payment) => payment.amountCents > payment.refundedCents)
        .map((payment) => (
          <Row
            key={payment.id}
            name={`${paymentMethodNames[payment.method]}, ${formatDay(dayOf(payment.receivedAt, zone))}`}
            more={payment.refundedCents > 0 ? `${money(payment.refundedCents)} of it went back` : ''}
            cents={payment.refundedCents - payment.amountCents}
          />
        ))}
      {waitingCents > 0 ? <Row name="Taken here" more="waiting to send" cents={-waitingCents} /> : null}
      <div className="is-sum">
        <dt>{owed < 0 ? 'Paid too much' : owed === 0 && bill.totalCents > 0 ? 'Paid' : 'To pay'}</dt>
        <dd>{money(owed === 0 ? bill.totalCents : Math.abs(owed))}</dd>
      </div>
    </dl>
  );
}

function Row({ name, more, cents }: { name: string; more: string; cents: number }) {
  return (
    <div>
      <dt>
        {name}
        {more ? <small>{more}</small> : null}
      </dt>
      <dd>{money(cents)}</dd>
    </div>
  );
}
