import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { isEnded } from '@driprail/shared/domain/board/progress';
import { estimateTravel } from '@driprail/shared/domain/board/travel';
import { useFormats } from '../../../lib/format.ts';

/** The drive between two stops, as a hatched slot. */
export function Drive({ from, to }: { from: RunVisitDto | undefined; to: RunVisitDto }) {
  const format = useFormats();
  if (!from || isEnded(to.progress) || from.stopId === to.stopId) return null;
  const point = (visit: RunVisitDto) =>
    visit.lat === null || visit.lng === null ? null : { lat: visit.lat, lng: visit.lng };
  const travel = estimateTravel(point(from), point(to));
  return (
    <p className="drive">
      <span>
        About {travel.minutes} min{travel.kilometers === null ? '' : `, ${format.distance(travel.kilometers)}`}
      </span>
    </p>
  );
}
