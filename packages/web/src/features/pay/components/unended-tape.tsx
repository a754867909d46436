import { Link } from 'react-router';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { paths } from '../../../app/paths.ts';
import { FoldedTape } from './folded-tape.tsx';

/** Visits that nobody ended: said before the week is checked, since a lock would leave their work out. */
export function UnendedTape({ unended }: Pick<PayWeekDto, 'unended'>) {
  const items = unended.map(({ visitId, jobNumber, day, crewNames }) => ({
    key: visitId,
    children: (
      <>
        <span>
          <b>Job {jobNumber}</b> of {formatDay(day)} was never marked done, so it earns nothing here
          {crewNames.length > 0 ? ` for ${crewNames.join(', ')}` : ''}.
        </span>{' '}
        <Link to={`${paths.boardDay(day)}?visit=${visitId}`}>Open the visit</Link>
      </>
    ),
  }));
  return <FoldedTape items={items} />;
}
