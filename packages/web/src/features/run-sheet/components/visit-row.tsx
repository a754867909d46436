import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { isEnded, progressNames } from '@driprail/shared/domain/board/progress';
import { StatusMark } from '../../../components/status-mark.tsx';
import { useFormats } from '../../../lib/format.ts';

/** A visit that is over, or one still to come: one line on the leg of the rail. Press it to see more. */
export function VisitRow({ visit, onOpen }: { visit: RunVisitDto; onOpen: () => void }) {
  const format = useFormats();
  const isOver = isEnded(visit.progress);
  const services = [...new Set(visit.lines.map((line) => line.serviceName))].join(', ');
  return (
    <button type="button" className={isOver ? 'visit-row is-over' : 'visit-row'} onClick={onOpen}>
      <span className="l">
        <span>{visit.from ? format.clock(visit.from) : ''}</span>
        <b>{visit.customerName}</b>
        {isOver ? (
          <StatusMark status={visit.progress}>
            {progressNames[visit.progress]}
            {visit.since ? ` ${format.clock(visit.since)}` : ''}
          </StatusMark>
        ) : null}
      </span>
      {isOver ? null : (
        <span className="t-2">
          {services}
          {visit.area ? `, ${visit.area}` : ''}
        </span>
      )}
    </button>
  );
}
