import type { EventInput } from '@fullcalendar/core';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import { isMovable } from '@driprail/shared/domain/board/progress';
import { addMinutes, isBefore, minutesBetween, overlaps } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import type { Move } from '@driprail/shared/domain/board/plan';
import type { PlacedVisit } from './board-model.ts';
import { gapsOf, isPlacedVisit, lateOf, matchesFilter } from './board-model.ts';

export interface Held extends Move {
  vanId: string;
  from: string;
  to: string;
}

const classes = {
  unplaced: 'is-placed',
  placed: 'is-placed',
  on_the_way: 'is-way',
  on_site: 'is-site',
  working: 'is-work',
  part_done: 'is-done',
  done: 'is-done',
  called_off: 'is-off',
} as const;

/** The day as calendar events: tickets, travel slots, time over the plan, and the hours a van is shut. */
export function calendarEvents(
  board: BoardDto,
  now: string,
  filter: string,
  openId: string | null,
  held: Held | null,
): EventInput[] {
  const tickets = board.visits
    .filter(isPlacedVisit)
    .filter((visit) => !isReplaced(visit, board))
    .map((visit): EventInput => {
      const isHeld = held?.visitId === visit.id;
      return {
        id: visit.id,
        resourceId: isHeld ? held.vanId : visit.vanId,
        start: isHeld ? held.from : visit.from,
        end: isHeld ? held.to : visit.to,
        editable: isMovable(visit.progress) && !board.isLocked,
        classNames: [
          'tk',
          isHeld ? 'is-held' : classes[visit.progress],
          lateOf(visit, now) > 0 ? 'is-late' : '',
          visit.id === openId ? 'is-open' : '',
          matchesFilter(visit, filter) ? '' : 'is-dim',
        ].filter(Boolean),
        extendedProps: { kind: 'visit' },
      };
    });
  const placing = held && !board.visits.some((visit) => visit.id === held.visitId) ? held : null;
  const ghost: EventInput[] = placing
    ? [
        {
          id: placing.visitId,
          resourceId: placing.vanId,
          start: placing.from,
          end: placing.to,
          classNames: ['tk', 'is-held'],
          extendedProps: { kind: 'visit' },
        },
      ]
    : [];
  return [...tickets, ...ghost, ...gapEvents(board), ...overEvents(board, now), ...shutEvents(board)];
}

function gapEvents(board: BoardDto): EventInput[] {
  return gapsOf(board).map((gap) => ({
    id: `gap:${gap.key}`,
    resourceId: gap.vanId,
    start: gap.from,
    end: gap.to,
    display: 'background',
    classNames: [
      'gap',
      gap.isShort ? 'is-short' : '',
      gap.isLive ? 'is-live' : '',
      isSmall(gap.from, gap.to) ? 'is-small' : '',
    ].filter(Boolean),
    extendedProps: { kind: 'gap', gap },
  }));
}

/** A called-off visit whose time another has taken would only halve that one's width. */
function isReplaced(visit: PlacedVisit, board: BoardDto): boolean {
  if (visit.progress !== 'called_off') return false;
  return board.visits
    .filter(isPlacedVisit)
    .some((other) => other.progress !== 'called_off' && other.vanId === visit.vanId && overlaps(other, visit));
}

/** Too low for a line of words; the drive stands in the ticket's sheet and list. */
function isSmall(from: string, to: string): boolean {
  return minutesBetween(from, to) < 14;
}

function overEvents(board: BoardDto, now: string): EventInput[] {
  return board.visits.filter(isPlacedVisit).flatMap((visit) => {
    const isOver = (visit.progress === 'working' || visit.progress === 'on_site') && isBefore(visit.to, now);
    if (!isOver) return [];
    return [
      {
        id: `over:${visit.id}`,
        resourceId: visit.vanId,
        start: visit.to,
        end: addMinutes(now, 1),
        display: 'background',
        classNames: ['over'],
        extendedProps: { kind: 'over' },
      },
    ];
  });
}

function shutEvents(board: BoardDto): EventInput[] {
  const opens = instantOf(board.day, board.dayStartsAt, board.zone);
  const shuts = instantOf(board.day, board.dayEndsAt, board.zone);
  return board.vans.flatMap((van) => {
    const starts = van.crew.map((person) => person.from).sort((a, b) => Date.parse(a) - Date.parse(b))[0] ?? shuts;
    const ends = van.crew.map((person) => person.to).sort((a, b) => Date.parse(b) - Date.parse(a))[0] ?? shuts;
    const spans =
      van.crew.length === 0
        ? [[opens, shuts]]
        : [
            [opens, starts],
            [ends, shuts],
          ];
    return spans
      .filter(([from = '', to = '']) => isBefore(from, to))
      .map(([from = '', to = ''], index) => ({
        id: `shut:${van.id}:${index}`,
        resourceId: van.id,
        start: from,
        end: to,
        display: 'background',
        classNames: ['shut'],
        extendedProps: { kind: 'shut', words: van.crew.length === 0 ? 'No crew' : '' },
      }));
  });
}
