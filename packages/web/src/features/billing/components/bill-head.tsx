import { Link } from 'react-router';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { money, useFormats } from '../../../lib/format.ts';
import { billStateNames, billTitle } from './bill-words.ts';

/** Whose bill it is, what state it is in, and what is owed. */
export function BillHead({ bill, isTitled }: { bill: BillDto; isTitled: boolean }) {
  const { zone } = useFormats();
  const { name, line, city, postcode } = bill.billTo;
  const town = [city, postcode].filter(Boolean).join(' ');
  return (
    <header className="bl-head">
      <div>
        {isTitled ? <h2 className="t-hang">{billTitle(bill)}</h2> : null}
        <p>
          <b dir="auto">{name}</b>
          <br />
          <span className="t-2">{[line, town].filter(Boolean).join(', ')}</span>
        </p>
        <p className="t-2">
          {bill.invoice
            ? `Issued ${formatDate(dayOf(bill.invoice.issuedAt, zone))}, due ${formatDate(bill.invoice.dueOn)}. `
            : bill.isDone
              ? 'The work is done and not billed yet. '
              : 'The work is not done yet: this is what it would cost as it stands. '}
          <Link to={`${paths.board}?job=${bill.jobId}`}>Job {bill.jobNumber}</Link>,{' '}
          <Link to={paths.customer(bill.customerId)}>customer’s record</Link>
        </p>
      </div>
      <dl className="bl-owed">
        <dt>{bill.owedCents < 0 ? 'Owed back' : 'Owed'}</dt>
        <dd>{money(Math.abs(bill.owedCents))}</dd>
        <dd className={`bl-state is-${bill.state}`}>{billStateNames[bill.state]}</dd>
      </dl>
    </header>
  );
}
