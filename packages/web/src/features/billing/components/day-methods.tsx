import type { MoneyDayDto } from '@driprail/shared/contracts/money-day.contract';
import { paymentMethodNames } from '@driprail/shared/contracts/bill.dto';
import { money } from '../../../lib/format.ts';

/** Received and given back by how it was paid; tips by card lie beside, they are the crew's. */
export function DayMethods({ close }: { close: MoneyDayDto }) {
  const { methods, cardTips } = close;
  const sum = (of: (one: MoneyDayDto['methods'][number]) => number) =>
    methods.reduce((total, one) => total + of(one), 0);
  const notes = methods.flatMap((one) => [
    ...(one.waitingCents > 0
      ? [`${money(one.waitingCents)} of what was given back by ${one.method} waits for the payments service.`]
      : []),
    ...(one.disputedCents > 0 ? [`${money(one.disputedCents)} is disputed and held by a bank.`] : []),
  ]);
  return (
    <section aria-label="Received and given back">
      <h2 className="sec">Received and given back</h2>
      <table className="grid-t">
        <thead>
          <tr>
            <th>How</th>
            <th className="r">Received</th>
            <th className="r">Given back</th>
            <th className="r">Left</th>
          </tr>
        </thead>
        <tbody>
          {methods.map(({ method, received, givenBack }) => (
            <tr key={method}>
              <th scope="row">
                {paymentMethodNames[method]}
                {received.count > 0 ? <span className="t-2">, {received.count}</span> : null}
              </th>
              <td className="r">{money(received.cents)}</td>
              <td className="r">{money(-givenBack.cents || 0)}</td>
              <td className="r">{money(received.cents - givenBack.cents)}</td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            <th scope="row">All</th>
            <td className="r">{money(sum((one) => one.received.cents))}</td>
            <td className="r">{money(-sum((one) => one.givenBack.cents) || 0)}</td>
            <td className="r">{money(close.netReceivedCents)}</td>
          </tr>
        </tfoot>
      </table>
      <p className="pt-2">
        Tips by card, beside these and the crew’s: <b>{money(cardTips.cents)}</b>
        {cardTips.count > 0 ? <span className="t-2">, {cardTips.count}</span> : null}. The payments service pays out
        card and tips together, less its own fee.
      </p>
      {notes.map((note) => (
        <p key={note} className="t-2">
          {note}
        </p>
      ))}
    </section>
  );
}
