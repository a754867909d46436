import type { CashCountDto } from '@driprail/shared/contracts/cash.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Empty } from '../../../components/states.tsx';
import { money, useFormats } from '../../../lib/format.ts';
import { overWords } from './count-form.tsx';

/** What was counted, newest first, over and short with what explains them. */
export function CashCounts({ counts }: { counts: readonly CashCountDto[] }) {
  const { zone, clock } = useFormats();
  return (
    <section aria-label="Earlier counts" className="mo-counts">
      <h2 className="sec">Counted</h2>
      {counts.length === 0 ? <Empty>Nothing was counted yet.</Empty> : null}
      <ul>
        {counts.map((count) => {
          const over = count.countedCents - count.expectedCents;
          return (
            <li key={count.id}>
              <span>
                <b>{count.personName}</b>
                <small>
                  {formatDay(dayOf(count.countedAt, zone))}, {clock(count.countedAt)} by {count.countedBy}
                </small>
                {count.note ? <small>{count.note}</small> : null}
              </span>
              <span className="r">
                {money(count.countedCents)}
                <small>{over === 0 ? 'right' : <b>{overWords(over)}</b>}</small>
              </span>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
