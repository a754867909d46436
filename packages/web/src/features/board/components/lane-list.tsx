import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import { isPlacedVisit, matchesFilter } from './board-model.ts';
import { Ticket } from './ticket.tsx';
import { VanHead } from './van-head.tsx';

/** The board on a narrow screen or at 200 %: a list per van, in the order of the day. */
export function LaneList({
  board,
  now,
  filter,
  onOpen,
  onCrew,
}: {
  board: BoardDto;
  now: string;
  filter: string;
  onOpen: (visitId: string) => void;
  onCrew: (vanId: string) => void;
}) {
  const troubled = new Set(board.troubles.map((trouble) => trouble.visitId));
  return (
    <div className="lanes">
      {board.vans.map((van) => (
        <section key={van.id} aria-label={van.name}>
          <VanHead board={board} vanId={van.id} now={now} onCrew={onCrew} />
          <ol>
            {board.visits
              .filter(isPlacedVisit)
              .filter((visit) => visit.vanId === van.id && matchesFilter(visit, filter))
              .sort((a, b) => Date.parse(a.from) - Date.parse(b.from))
              .map((visit) => (
                <li key={visit.id}>
                  <button
                    type="button"
                    className={`tk st-${visit.progress}`}
                    data-event-id={visit.id}
                    onClick={() => onOpen(visit.id)}
                  >
                    <Ticket visit={visit} now={now} hasTrouble={troubled.has(visit.id)} />
                  </button>
                </li>
              ))}
          </ol>
        </section>
      ))}
    </div>
  );
}
