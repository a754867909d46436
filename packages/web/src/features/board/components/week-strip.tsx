import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { BoardVanDto } from '@driprail/shared/contracts/board.contract';
import { formatDay, formatMinutes } from '@driprail/shared/domain/time/format';
import { paths } from '../../../app/paths.ts';
import { boardWeekQuery } from '../api/board.queries.ts';

/** The week's load: a short bar per van hangs from each day; longer is fuller. */
export function WeekStrip({ day, vans }: { day: string; vans: BoardVanDto[] }) {
  const week = useQuery(boardWeekQuery(day));
  if (!week.data) return <nav className="week" aria-label="Week" />;
  const { days, capacityMinutes } = week.data;
  return (
    <nav className="week" aria-label="Week, planned work per van">
      {days.map((column) => {
        const total = column.vans.reduce((sum, van) => sum + van.minutes, 0);
        const visits = column.vans.reduce((sum, van) => sum + van.visits, 0);
        return (
          <Link
            key={column.day}
            to={paths.boardDay(column.day)}
            aria-current={column.day === day ? 'date' : undefined}
            title={`${formatDay(column.day)}: ${visits} visits, ${formatMinutes(total)}`}
          >
            <span className="bars" aria-hidden>
              {vans.map((van) => {
                const minutes = column.vans.find((v) => v.vanId === van.id)?.minutes ?? 0;
                return <i key={van.id} style={{ height: `${Math.min(100, (minutes / capacityMinutes) * 100)}%` }} />;
              })}
            </span>
            <span className="d">
              {formatDay(column.day)
                .split(' ')
                .filter((_, index) => index !== 1)
                .join(' ')}
            </span>
            <span className="sr">
              , {visits} visits, {formatMinutes(total)}
            </span>
          </Link>
        );
      })}
    </nav>
  );
}
