import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { paths } from '../../../app/paths.ts';
import { money } from '../../../lib/format.ts';
import { lateWeeksQuery } from '../api/pay.queries.ts';

/** On an open week: locked weeks for which something came in later, so that it is made up here rather than forgotten. */
export function LateWeeksTape() {
  const weeks = useQuery(lateWeeksQuery).data?.weeks ?? [];
  if (weeks.length === 0) return null;
  return (
    <div className="tape pay-tape" role="status">
      {weeks.map(({ startsOn, number, people }) => (
        <p key={startsOn}>
          <span>
            <b>Week {number}</b> is locked, and something came in later:{' '}
            {people.map(({ name, missingCents }) => `${name} ${sign(missingCents)}`).join(', ')}.
          </span>{' '}
          <Link to={paths.payWeek(startsOn)}>Correct it</Link>
        </p>
      ))}
    </div>
  );
}

function sign(cents: number): string {
  return `${cents > 0 ? '+' : '−'}${money(Math.abs(cents))}`;
}
