import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { useNow } from '../../../lib/now.ts';
import { useSession } from '../../../lib/session.tsx';
import { dueQuery } from '../api/jobs.queries.ts';
import { DueTable } from '../components/due-table.tsx';

/** Cars whose service comes again by the menu, and that nothing is booked for. */
export function DuePage() {
  const { zone } = useSession().company;
  const today = dayOf(useNow(), zone);
  const query = useQuery(dueQuery);
  const over = query.data?.due.filter((one) => one.dueOn < today).length;
  return (
    <>
      <PageHead
        title="Due again"
        above="By the intervals on the service menu"
        sums={[
          { label: 'Services', value: query.data?.due.length ?? '–' },
          { label: 'Of them overdue', value: over ?? '–' },
        ]}
        actions={
          <Link className="btn" to={paths.customers}>
            To the customers
          </Link>
        }
      />
      <RailPage>
        <Loaded query={query} what="what is due">
          {({ due }) =>
            due.length === 0 ? (
              <Empty>Nothing is due in the next two weeks. Intervals stand on the service menu.</Empty>
            ) : (
              <DueTable due={due} today={today} />
            )
          }
        </Loaded>
      </RailPage>
    </>
  );
}
