import { useEffect, useRef } from 'react';
import { Draggable } from '@fullcalendar/interaction';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { formatDay, formatMinutes } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Mark } from '../../../components/icon.tsx';
import { useFormats } from '../../../lib/format.ts';
import { matchesFilter, servicesOf } from './board-model.ts';

interface RoofProps {
  board: BoardDto;
  filter: string;
  heldId: string | null;
  isDraggable: boolean;
  onOpen: (visitId: string) => void;
}

/** What has not run down to a van yet lies on the roof; drag it down, or take a ticket back up. */
export function Roof({ board, filter, heldId, isDraggable, onOpen }: RoofProps) {
  const list = useRef<HTMLOListElement>(null);
  useEffect(() => {
    if (!list.current || !isDraggable) return undefined;
    const draggable = new Draggable(list.current, {
      itemSelector: '[data-unplaced-id]',
      minDistance: 5,
      longPressDelay: 300,
      eventData: (element) => ({
        duration: { minutes: Number(element.dataset['minutes'] ?? 60) },
        extendedProps: { kind: 'visit', visitId: element.dataset['unplacedId'] },
        classNames: ['tk', 'is-held'],
      }),
    });
    return () => draggable.destroy();
  }, [isDraggable]);
  const visits = board.unplaced.filter((visit) => matchesFilter(visit, filter));
  const minutes = board.unplaced.reduce((sum, visit) => sum + visit.minutes, 0);
  return (
    <section className="loose" data-roof aria-label="Unplaced">
      <h2>
        <Mark name="m-unplaced" />
        Unplaced {board.unplaced.length} {minutes > 0 ? <span>{formatMinutes(minutes)} of work</span> : null}
      </h2>
      {board.unplaced.length === 0 ? <p className="t-2">Nothing unplaced. New bookings land here.</p> : null}
      <ol ref={list} className={visits.length > 4 ? 'is-many' : ''}>
        {visits.map((visit) => (
          <li key={visit.id}>
            <button
              type="button"
              className={visit.id === heldId ? 'tag is-held' : 'tag'}
              data-unplaced-id={visit.id}
              data-minutes={visit.minutes}
              onClick={() => onOpen(visit.id)}
            >
              <span className="n">
                <b>{visit.customerName}</b>
                <em>{formatMinutes(visit.minutes)}</em>
              </span>
              <span className="p">{servicesOf(visit)}</span>
              <WindowWords visit={visit} day={board.day} />
            </button>
          </li>
        ))}
      </ol>
    </section>
  );
}

function WindowWords({ visit, day }: { visit: VisitDto; day: string }) {
  const { zone, span } = useFormats();
  const place = visit.area || visit.address;
  if (!visit.windowFrom || !visit.windowTo) return <span className="p w">Any day, {place}</span>;
  const on = dayOf(visit.windowFrom, zone);
  return (
    <span className="p w">
      {on === day ? '' : `${formatDay(on)}, `}
      {span(visit.windowFrom, visit.windowTo)}, {place}
    </span>
  );
}
