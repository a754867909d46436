import { Link } from 'react-router';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { photoSetNames } from '@driprail/shared/domain/walk-round/views';
import { paths } from '../../../app/paths.ts';

/** How far the walk-round of a visit is, and the way to its photos and marks. */
export function WalkSection({ visit }: { visit: VisitDto }) {
  const { isSecondLookDue } = visit.walkRound;
  const hasBegun = ['working', 'part_done', 'done'].includes(visit.progress);
  return (
    <section>
      <h3 className="sec">
        Walk-round <Link to={paths.walkRecord(visit.id)}>Photos and marks</Link>
      </h3>
      <p>{wordsOf(visit, hasBegun)}</p>
      {isSecondLookDue && !['done', 'part_done'].includes(visit.progress) ? (
        <p className="tape mt-2">
          <b>Second look to come.</b> The car was too dirty to see; nobody has looked again after the wash.
        </p>
      ) : null}
    </section>
  );
}

function wordsOf({ walkRound: { photoSet, cars, made, startReason } }: VisitDto, hasBegun: boolean): string {
  if (cars === 0) return photoSetNames[photoSet];
  if (made >= cars) return cars === 1 ? 'Made' : `Made for ${cars} cars`;
  const asked = `Asked for: ${photoSetNames[photoSet].toLowerCase()}.`;
  const so = made === 0 ? 'None made.' : `${made} of ${cars} made.`;
  if (!hasBegun) return `${made === 0 ? 'Not made yet.' : so} ${asked}`;
  return startReason ? `${so} Work began without it: ${startReason.toLowerCase()}.` : so;
}
