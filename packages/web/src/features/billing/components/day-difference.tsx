import type { MoneyDayDto } from '@driprail/shared/contracts/money-day.contract';
import { differenceNames } from '@driprail/shared/domain/billing/day-difference';
import { money } from '../../../lib/format.ts';

/** Why what was invoiced is not what was received: lines that add up to the cent. */
export function DayDifference({ close }: { close: MoneyDayDto }) {
  const { invoiced, netReceivedCents, difference } = close;
  const between = invoiced.totalCents - netReceivedCents;
  const lines = difference.filter(({ cents }) => cents !== 0);
  return (
    <section aria-label="Why the two differ">
      <h2 className="sec">
        From received to invoiced <span>{lines.length === 0 ? 'the same' : `${money(between)} between them`}</span>
      </h2>
      <dl className="mo-dl">
        <div>
          <dt>Received, less given back</dt>
          <dd>{money(netReceivedCents)}</dd>
        </div>
        {lines.map(({ kind, cents }) => (
          <div key={kind}>
            <dt>{kind === 'owed' && cents < 0 ? 'Paid too much on the day’s invoices' : differenceNames[kind]}</dt>
            <dd>{money(cents)}</dd>
          </div>
        ))}
        <div className="is-sum">
          <dt>Invoiced</dt>
          <dd>{money(invoiced.totalCents)}</dd>
        </div>
      </dl>
    </section>
  );
}
