import { useCallback, useEffect, useMemo, useState } from 'react';
import type { KeyboardEvent } from 'react';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { isMovable } from '@driprail/shared/domain/board/progress';
import { formatClock, formatSpan } from '@driprail/shared/domain/time/format';
import { addMinutes, dayOf, isBefore } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import { isPlacedVisit, preview } from './board-model.ts';
import type { Held } from './calendar-events.ts';
import type { BoardMoves } from './use-board-moves.ts';

const STEP = 15;
const FINE_STEP = 5;

interface HeldOptions {
  board: BoardDto | undefined;
  now: string;
  moves: BoardMoves;
  onOpen: (visitId: string) => void;
}

/** The board by keyboard: arrows walk, Space picks up, arrows then carry, Enter sets down, Esc puts back, U unplaces. */
export function useHeld({ board, now, moves, onOpen }: HeldOptions) {
  const [held, setHeld] = useState<Held | null>(null);
  const visit = board && held ? findVisit(board, held.visitId) : undefined;

  const words = useMemo(() => (board && held && visit ? describe(board, visit, held) : null), [board, held, visit]);
  const setDown = useCallback(async () => {
    if (!board || !held || !visit) return;
    const vanName = board.vans.find((van) => van.id === held.vanId)?.name ?? '';
    await moves.save(
      [held],
      `${visit.customerName} is on ${vanName} at ${formatClock(held.from, board.zone, board.clock)}.`,
    );
    setHeld(null);
    focusTicket(held.visitId);
  }, [board, held, visit, moves]);

  const onKeyDown = useCallback(
    (event: KeyboardEvent) => {
      if (!board || event.ctrlKey || event.metaKey || event.altKey) return;
      const target = event.target as HTMLElement;
      const id =
        held?.visitId ??
        target.closest<HTMLElement>('[data-event-id], [data-unplaced-id]')?.dataset['eventId'] ??
        target.dataset['unplacedId'];
      const focused = id ? findVisit(board, id) : undefined;
      if (!focused) return;
      if (held) carry(event, board, held, setHeld, setDown);
      else if (event.key === ' ' && isMovable(focused.progress)) setHeld(pickUp(board, focused, now));
      else if (event.key.toLowerCase() === 'u' && isMovable(focused.progress) && focused.vanId) {
        const off = { visitId: focused.id, vanId: null, from: null, to: null };
        void moves.save([off], `${focused.customerName} is back on Unplaced.`).then(() => focusTicket(focused.id));
      } else if (event.key === 'Enter') onOpen(focused.id);
      else if (event.key.startsWith('Arrow')) focusTicket(neighbour(board, focused, event.key));
      else return;
      event.preventDefault();
      event.stopPropagation();
    },
    [board, held, now, moves, onOpen, setDown],
  );
  // A held ticket is drawn anew in each lane that it enters and loses the focus on the way: what is pressed
  // before it has the focus again belongs to it too.
  useEffect(() => {
    if (!board || !held) return undefined;
    focusTicket(held.visitId);
    const press = (event: globalThis.KeyboardEvent) => {
      if (event.target !== document.body || event.ctrlKey || event.metaKey || event.altKey) return;
      carry(event, board, held, setHeld, setDown);
      event.preventDefault();
    };
    document.addEventListener('keydown', press);
    return () => document.removeEventListener('keydown', press);
  }, [board, held, setDown]);
  return { held, heldName: visit?.customerName ?? null, words, onKeyDown };
}

function carry(
  event: { key: string; shiftKey: boolean },
  board: BoardDto,
  held: Held,
  setHeld: (next: Held | null) => void,
  setDown: () => Promise<void>,
): void {
  const step = event.shiftKey ? FINE_STEP : STEP;
  const byTime = (minutes: number) =>
    setHeld({ ...held, from: addMinutes(held.from, minutes), to: addMinutes(held.to, minutes) });
  const byVan = (by: number) => {
    const at = board.vans.findIndex((van) => van.id === held.vanId);
    const van = board.vans[Math.min(Math.max(at + by, 0), board.vans.length - 1)];
    if (van) setHeld({ ...held, vanId: van.id });
  };
  if (event.key === 'ArrowUp') byTime(-step);
  else if (event.key === 'ArrowDown') byTime(step);
  else if (event.key === 'ArrowLeft') byVan(-1);
  else if (event.key === 'ArrowRight') byVan(1);
  else if (event.key === 'Enter' || event.key === ' ') void setDown();
  else if (event.key === 'Escape') {
    setHeld(null);
    focusTicket(held.visitId);
  }
}

/** An unplaced visit is held over the first van at the next quarter hour, or at its window's start. */
function pickUp(board: BoardDto, visit: VisitDto, now: string): Held | null {
  if (isPlacedVisit(visit)) return { visitId: visit.id, vanId: visit.vanId, from: visit.from, to: visit.to };
  const van = board.vans[0];
  if (!van) return null;
  const opens = instantOf(board.day, board.dayStartsAt, board.zone);
  const soon = new Date(Math.ceil(Date.parse(now) / 900_000) * 900_000).toISOString();
  const earliest =
    isBefore(opens, soon) && isBefore(soon, instantOf(board.day, board.dayEndsAt, board.zone)) ? soon : opens;
  const from =
    visit.windowFrom && isBefore(earliest, visit.windowFrom) && dayOf(visit.windowFrom, board.zone) === board.day
      ? visit.windowFrom
      : earliest;
  return { visitId: visit.id, vanId: van.id, from, to: addMinutes(from, visit.minutes) };
}

function describe(board: BoardDto, visit: VisitDto, held: Held): string {
  const van = board.vans.find((v) => v.id === held.vanId)?.name ?? '';
  const { refusals, warnings } = preview(board, held);
  const fit = refusals[0]?.message ?? (warnings.length > 0 ? warnings.map((w) => w.message).join(' ') : 'Fits.');
  return `${visit.customerName}, ${van} ${formatSpan(held.from, held.to, board.zone, board.clock)}. ${fit}`;
}

/** Up and down in a van by time; left and right to the nearest time in the next van; the roof is a row of its own. */
function neighbour(board: BoardDto, visit: VisitDto, key: string): string | null {
  const placed = board.visits.filter(isPlacedVisit).sort((a, b) => Date.parse(a.from) - Date.parse(b.from));
  if (!isPlacedVisit(visit)) {
    const at = board.unplaced.findIndex((v) => v.id === visit.id);
    if (key === 'ArrowDown') return placed[0]?.id ?? null;
    return board.unplaced[at + (key === 'ArrowRight' ? 1 : -1)]?.id ?? null;
  }
  const lane = placed.filter((v) => v.vanId === visit.vanId);
  if (key === 'ArrowUp' || key === 'ArrowDown') {
    const next = lane[lane.findIndex((v) => v.id === visit.id) + (key === 'ArrowDown' ? 1 : -1)];
    return next?.id ?? (key === 'ArrowUp' ? (board.unplaced[0]?.id ?? null) : null);
  }
  const vanAt = board.vans.findIndex((van) => van.id === visit.vanId) + (key === 'ArrowRight' ? 1 : -1);
  const distance = (v: { from: string }) => Math.abs(Date.parse(v.from) - Date.parse(visit.from));
  return (
    placed.filter((v) => v.vanId === board.vans[vanAt]?.id).sort((a, b) => distance(a) - distance(b))[0]?.id ?? null
  );
}

function findVisit(board: BoardDto, id: string): VisitDto | undefined {
  return [...board.visits, ...board.unplaced].find((visit) => visit.id === id);
}

/** Focus follows the visit, also after the lanes were drawn anew. */
function focusTicket(id: string | null): void {
  if (!id) return;
  requestAnimationFrame(() =>
    document
      .querySelector<HTMLElement>(`[data-event-id="${id}"]:not(.fc-event-mirror), [data-unplaced-id="${id}"]`)
      ?.focus(),
  );
}
