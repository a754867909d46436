import { useQuery } from '@tanstack/react-query';
import type { TimeOffBalanceDto } from '@driprail/shared/contracts/time-off.contract';
import type { TimeOffMoveKind } from '@driprail/shared/domain/pay/time-off/time-off-ledger';
import { timeOffKindNames } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { formatDate } from '@driprail/shared/domain/time/format';
import { Empty, Loaded } from '../../../../components/states.tsx';
import { hoursMinutes } from '../../../../lib/format.ts';
import { balancesQuery } from '../../api/time-off.queries.ts';
import './time-off.css';

const moveWords: Record<TimeOffMoveKind, string> = {
  earned: 'Earned',
  given: 'Given',
  adjusted: 'Changed by the owner',
  taken: 'Taken',
  carry_lost: 'Left behind at the new year',
  cap_lost: 'Over the cap, not kept',
};

/** One person's hours by kind, each with the ledger that they come from. */
export function TimeOffBalances({ personId, title }: { personId: string; title: string }) {
  const query = useQuery(balancesQuery(personId));
  return (
    <Loaded query={query} what="the hours of paid time off">
      {({ balances }) => (
        <section className="to-balances" aria-label={title}>
          <h2 className="sec">{title}</h2>
          {balances.length === 0 ? <Empty>No rule of paid time off is in force.</Empty> : null}
          {balances.map((balance) => (
            <Balance key={balance.kind} balance={balance} />
          ))}
        </section>
      )}
    </Loaded>
  );
}

function Balance({ balance: { kind, balance, expected, ruleWords, weeks } }: { balance: TimeOffBalanceDto }) {
  const moves = weeks.flatMap((week) => week.moves.map((move) => ({ ...move, isLocked: week.isLocked }))).reverse();
  return (
    <details className="to-balance">
      <summary>
        <b>{timeOffKindNames[kind]}</b>
        <span className="e">{hoursMinutes(balance)} h</span>
        <small>
          {ruleWords ?? 'No rule is in force now'}.
          {expected === balance ? '' : ` ${hoursMinutes(expected)} h once the open weeks are locked.`}
        </small>
      </summary>
      {moves.length === 0 ? (
        <p className="t-2">Nothing has moved yet. Locked weeks earn.</p>
      ) : (
        <table className="grid-t">
          <thead>
            <tr>
              <th scope="col">Day</th>
              <th scope="col">What</th>
              <th scope="col" className="r">
                Hours
              </th>
              <th scope="col" className="r">
                Balance
              </th>
            </tr>
          </thead>
          <tbody>
            {moves.map((move) => (
              <tr key={`${move.on} ${move.kind} ${move.balance}`}>
                <td>{formatDate(move.on)}</td>
                <td>
                  {moveWords[move.kind]}
                  <small>
                    {move.note}
                    {move.isLocked ? '' : ', week still open'}
                  </small>
                </td>
                <td className="r">{hoursMinutes(move.hours)}</td>
                <td className="r">{hoursMinutes(move.balance)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </details>
  );
}
