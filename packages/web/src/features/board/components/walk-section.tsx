import { Link } from 'react-router';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { photoSetNames } from '@driprail/shared/domain/walk-round/views';
import { paths } from '../../../app/paths.ts';

/** How far the walk-round of a visit is, and the way to its photos and marks. */
export function WalkSection({ visit }: { visit: VisitDto }) {
  const { photoSet, cars, made, isSecondLookDue, startReason } = visit.walkRound;
  const hasBegun = ['working', 'part_done', 'done'].includes(visit.progress);
  return (
    <section>
      <h3 className="sec">
        Walk-round <Link to={paths.walkRecord(visit.id)}>Photos and marks</Link>
      </h3>
      <p>
        {cars === 0
          ? photoSetNames[photoSet]
          : cars === made
            ? 'Made'
            : `${made} of ${cars} made. Asked for: ${photoSetNames[photoSet].toLowerCase()}`}
      </p>
      {hasBegun && made < cars ? (
        <p className="t-2">Work began without it{startReason ? `: ${startReason.toLowerCase()}` : ''}.</p>
      ) : null}
      {isSecondLookDue && !['done', 'part_done'].includes(visit.progress) ? (
        <p className="tape mt-2">
          <b>Second look to come.</b> The car was too dirty to see; nobody has looked again after the wash.
        </p>
      ) : null}
    </section>
  );
}
