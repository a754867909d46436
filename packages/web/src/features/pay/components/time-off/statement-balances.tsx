import type { StatementTimeOff } from '@driprail/shared/domain/pay/time-off/statement-time-off';
import { exact } from '@driprail/shared/domain/money/exact';
import { timeOffKindNames } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { hoursMinutes } from '../../../../lib/format.ts';
import './time-off.css';

/** The week's paid time off by kind, as the statement shows it: earned, taken, and what is there at the week's end. */
export function StatementBalances({ rows, isExpected }: { rows: readonly StatementTimeOff[]; isExpected: boolean }) {
  if (rows.length === 0) return null;
  return (
    <table className="to-stmt">
      <caption>Paid time off{isExpected ? ', expected until the week is locked' : ''}</caption>
      <thead>
        <tr>
          <th scope="col">Kind</th>
          <th scope="col" className="r">
            Earned
          </th>
          <th scope="col" className="r">
            Taken
          </th>
          <th scope="col" className="r">
            Balance
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.kind}>
            <th scope="row">
              {timeOffKindNames[row.kind]}
              <OtherMoves row={row} />
            </th>
            <td className="r">{hoursMinutes(row.earned)}</td>
            <td className="r">{hoursMinutes(row.taken)}</td>
            <td className="r">{hoursMinutes(row.balance)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function OtherMoves({ row: { adjusted, lost } }: { row: StatementTimeOff }) {
  const words = [
    exact(adjusted).equals(0) ? '' : `changed by the owner ${hoursMinutes(adjusted)}`,
    exact(lost).equals(0) ? '' : `over the limit, not kept ${hoursMinutes(lost)}`,
  ].filter(Boolean);
  return words.length === 0 ? null : <small>{words.join(', ')}</small>;
}
