import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { useSession } from '../../../lib/session.tsx';
import { walkSheetQuery } from '../api/walk-round.queries.ts';
import { Compare } from '../components/compare.tsx';
import { withWaiting } from '../components/shown-walk.ts';
import { WalkRecord } from '../components/walk-record.tsx';
import './walk-round.css';

/** A visit's walk-rounds at the desk: to read, with before and after side by side. */
export function WalkRecordPage() {
  const { visitId = '' } = useParams();
  const { user } = useSession();
  const query = useQuery(walkSheetQuery(user.id, visitId));
  return (
    <RailPage>
      <PageHead
        above={query.data ? `Walk-round, job ${query.data.jobNumber}` : 'Walk-round'}
        title={query.data?.customerName ?? 'Walk-round'}
      />
      <p className="my-2 ml-4">
        <Link to={paths.board}>
          <Icon name="left" /> Board
        </Link>
      </p>
      <Loaded query={query} what="the walk-round">
        {(data) => {
          const sheet = withWaiting(data, [], user.name);
          if (sheet.cars.length === 0) return <Empty>No car is on this visit.</Empty>;
          return sheet.cars.map((car) => (
            <section key={car.vehicleId ?? 'none'} className="wr-desk" aria-label={car.vehicle || 'Car'}>
              <div>
                <h2 className="sec">{car.vehicle || 'Car'}</h2>
                <WalkRecord car={car} startReason={sheet.startReason} />
              </div>
              <div>
                <h2 className="sec">Photos</h2>
                <Compare photos={car.photos} />
              </div>
            </section>
          ));
        }}
      </Loaded>
    </RailPage>
  );
}
