import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { missingCents } from '@driprail/shared/domain/pay/late-difference';
import { money } from '../../../lib/format.ts';

export type LateDifference = PayWeekDto['lateDifferences'][number];

/** On a locked week: what came in later would pay something else, and the way to make it up. */
export function LateTape({ late, onCorrect }: { late: LateDifference[]; onCorrect: (item: LateDifference) => void }) {
  if (late.length === 0) return null;
  return (
    <div className="tape pay-tape" role="status">
      {late.map((item) => {
        const missing = missingCents(item);
        return (
          <p key={item.personId}>
            <span>
              <b>{item.name}</b> was locked at {money(item.lockedCents)}
              {item.correctedCents === 0 ? '' : ` and corrected by ${money(item.correctedCents)}`}; today’s records come
              to {money(item.nowCents)}, {money(Math.abs(missing))} {missing > 0 ? 'more' : 'less'}.
            </span>{' '}
            <button type="button" className="link" onClick={() => onCorrect(item)}>
              Correct by {money(missing)}
            </button>
          </p>
        );
      })}
    </div>
  );
}
