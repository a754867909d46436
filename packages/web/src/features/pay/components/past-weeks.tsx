import { Link } from 'react-router';
import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { listPayWeeks } from '@driprail/shared/contracts/pay.contract';
import { paths } from '../../../app/paths.ts';
import { shareOfSales } from './week-model.ts';

export type WeekFigures = OutputOf<typeof listPayWeeks>['weeks'][number];

interface Props {
  weeks: WeekFigures[];
  /** The week on the screen, with its figures as they stand. */
  here: { startsOn: string; share: string | null };
}

/** Bars hung from the rail: what part of each week's sales went to pay. Each opens its week. */
export function PastWeeks({ weeks, here }: Props) {
  const shown = [...weeks].sort((a, b) => a.startsOn.localeCompare(b.startsOn)).slice(-8);
  return (
    <section className="past" aria-label="Pay as a share of sales">
      <div>
        <h2>Pay as a share of sales</h2>
        <p>In percent. Tips are left out, since customers pay them.</p>
      </div>
      <div className="hang">
        <i className="rail-h" aria-hidden />
        <ol>
          {shown.map((week) => {
            const isHere = week.startsOn === here.startsOn;
            const share = isHere
              ? here.share
              : week.grossCents === null
                ? null
                : shareOfSales(week.grossCents, week.tipCents ?? 0, week.salesCents);
            return (
              <li
                key={week.startsOn}
                className={isHere ? 'is-here' : ''}
                style={{ '--v': Number(share ?? 0) } as React.CSSProperties}
              >
                <Link to={paths.payWeek(week.startsOn)} className="plain" aria-current={isHere ? 'true' : undefined}>
                  <i aria-hidden />
                  <b>{share ?? 'open'}</b>
                  <span>Week {week.number}</span>
                </Link>
              </li>
            );
          })}
        </ol>
      </div>
    </section>
  );
}
