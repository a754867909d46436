import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { factsOf, plannedOf } from '@driprail/shared/domain/board/facts';
import { judgeMoves } from '@driprail/shared/domain/board/fit';
import type { Move } from '@driprail/shared/domain/board/plan';
import { addMinutes, dayOf, isBefore } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';

const STEP_MINUTES = 15;

/** A proposal for an unplaced visit: the earliest quarter hour and van with no refusal and the fewest warnings. */
export function firstFit(board: BoardDto, visit: VisitDto, now: string): Move {
  const facts = factsOf(board);
  const planned = new Map([[visit.id, plannedOf(visit)]]);
  const opens = instantOf(board.day, board.dayStartsAt, board.zone);
  const shuts = instantOf(board.day, board.dayEndsAt, board.zone);
  const promised = visit.windowFrom && dayOf(visit.windowFrom, board.zone) === board.day ? visit.windowFrom : opens;
  const soon = new Date(Math.ceil(Date.parse(now) / 900_000) * 900_000).toISOString();
  const earliest = [opens, promised, ...(isBefore(soon, shuts) ? [soon] : [])].reduce((a, b) =>
    isBefore(a, b) ? b : a,
  );
  let best: { move: Move; warnings: number } | null = null;
  for (let from = earliest; isBefore(from, shuts); from = addMinutes(from, STEP_MINUTES)) {
    for (const van of board.vans) {
      const move = { visitId: visit.id, vanId: van.id, from, to: addMinutes(from, visit.minutes) };
      const { refusals, warnings } = judgeMoves(facts, planned, [move]);
      if (refusals.length === 0 && (!best || warnings.length < best.warnings))
        best = { move, warnings: warnings.length };
      if (best?.warnings === 0) return best.move;
    }
  }
  return (
    best?.move ?? {
      visitId: visit.id,
      vanId: board.vans[0]?.id ?? null,
      from: earliest,
      to: addMinutes(earliest, visit.minutes),
    }
  );
}
