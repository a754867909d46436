import { Link } from 'react-router';
import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';

/** Work is not to start before every car that asks for it has its walk-round. */
export function isWalkDue({ walkRound: { made, cars } }: RunVisitDto): boolean {
  return made < cars;
}

/** How far the walk-round is, and the way to it; a second look that waits is a warning. */
export function WalkLine({ visit }: { visit: RunVisitDto }) {
  const { isSecondLookDue } = visit.walkRound;
  const hasBegun = ['working', 'part_done', 'done'].includes(visit.progress);
  return (
    <>
      {hasBegun && isSecondLookDue ? (
        <p className="tape my-2">
          <b>Second look.</b> The car was too dirty to see. Look after the wash, before any machine.
        </p>
      ) : null}
      <Link className="btn w-full my-2" to={paths.walkRound(visit.id)}>
        <Icon name="camera" /> {wordsOf(visit, hasBegun)}
      </Link>
    </>
  );
}

function wordsOf(visit: RunVisitDto, hasBegun: boolean): string {
  const { made, cars } = visit.walkRound;
  if (hasBegun) return visit.walkRound.isSecondLookDue ? 'Second look' : 'Photos and walk-round';
  if (cars === 0) return 'Photos and walk-round';
  if (made >= cars) return 'Walk-round made';
  return made === 0 ? 'Walk-round' : `Walk-round, ${made} of ${cars} cars made`;
}
