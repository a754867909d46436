import { Link } from 'react-router';
import type { MoneyDayDto } from '@driprail/shared/contracts/money-day.contract';
import { paths } from '../../../app/paths.ts';
import { Empty } from '../../../components/states.tsx';
import { money, useFormats } from '../../../lib/format.ts';

/** Card pages that were begun and are neither paid nor over. */
export function DayOpen({ close }: { close: MoneyDayDto }) {
  const { clock } = useFormats();
  return (
    <section aria-label="Card pages still open">
      <h2 className="sec">Card pages still open</h2>
      {close.openPages.length === 0 ? <Empty>None: every card page begun is paid or over.</Empty> : null}
      <dl className="mo-dl">
        {close.openPages.map((page) => (
          <div key={page.id}>
            <dt>
              <Link to={`${paths.money}?state=all&job=${page.jobId}`}>Job {page.jobNumber}</Link>, {page.customerName}
              <small>
                begun {clock(page.openedAt)}
                {page.tipCents > 0 ? `, ${money(page.tipCents)} of it a tip` : ''}
              </small>
            </dt>
            <dd>{money(page.amountCents + page.tipCents)}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
