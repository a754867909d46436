import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { factsOf, plannedOf } from '@driprail/shared/domain/board/facts';
import type { Finding, Findings } from '@driprail/shared/domain/board/findings';
import { judgeMoves, lateMinutes } from '@driprail/shared/domain/board/fit';
import type { Move } from '@driprail/shared/domain/board/plan';
import { isEnded, isMovable, isUnderWay } from '@driprail/shared/domain/board/progress';
import { estimateTravel } from '@driprail/shared/domain/board/travel';
import type { Travel } from '@driprail/shared/domain/board/travel';
import { minutesBetween } from '@driprail/shared/domain/time/zone';

export type PlacedVisit = VisitDto & { vanId: string; from: string; to: string };

export function isPlacedVisit(visit: VisitDto): visit is PlacedVisit {
  return visit.vanId !== null && visit.from !== null && visit.to !== null;
}

export interface Gap {
  key: string;
  vanId: string;
  from: string;
  to: string;
  travel: Travel;
  there: number;
  isShort: boolean;
  /** The crew drives it right now. */
  isLive: boolean;
}

/** Travel between a van's stops, in the order of the day; visits side by side at one stop have none. */
export function gapsOf(board: BoardDto): Gap[] {
  return board.vans.flatMap((van) => {
    const stops = board.visits
      .filter(isPlacedVisit)
      .filter((visit) => visit.vanId === van.id && visit.progress !== 'called_off')
      .sort((a, b) => Date.parse(a.from) - Date.parse(b.from));
    return stops.slice(1).flatMap((next, index) => {
      const previous = stops[index];
      if (!previous || previous.stopId === next.stopId) return [];
      const there = minutesBetween(previous.to, next.from);
      const travel = estimateTravel(plannedOf(previous).place, plannedOf(next).place);
      if (there <= 0) return [];
      const isLive = next.progress === 'on_the_way';
      const isShort = there < travel.minutes && !isEnded(previous.progress) && !isUnderWay(next.progress);
      const width = isShort || isLive ? there : Math.min(there, Math.max(travel.minutes, 10));
      const from = new Date(Date.parse(next.from) - width * 60_000).toISOString();
      return [{ key: `${previous.id}:${next.id}`, vanId: van.id, from, to: next.from, travel, there, isShort, isLive }];
    });
  });
}

/** What a move would meet, on this screen's copy of the board. */
export function preview(board: BoardDto, move: Move): Findings {
  const visit = [...board.visits, ...board.unplaced].find((v) => v.id === move.visitId);
  if (!visit) return { refusals: [], warnings: [] };
  return judgeMoves(factsOf(board), new Map([[visit.id, plannedOf(visit)]]), [move]);
}

/** Warnings of the plan as it stands, for visits that have not begun; accepted ones are not news. */
export function standingWarnings(board: BoardDto): Finding[] {
  const facts = factsOf(board);
  return board.visits
    .filter(isPlacedVisit)
    .filter((visit) => isMovable(visit.progress))
    .flatMap((visit) => {
      const move = { visitId: visit.id, vanId: visit.vanId, from: visit.from, to: visit.to };
      const { warnings } = judgeMoves(facts, new Map([[visit.id, plannedOf(visit)]]), [move]);
      return warnings.filter((w) => !visit.accepted.some((a) => a.key === w.key));
    });
}

export function lateOf(visit: VisitDto, now: string): number {
  return lateMinutes(visit, now);
}

/** Planned minutes of a van against those its crew is there. */
export function loadOf(board: BoardDto, vanId: string): { planned: number; there: number } {
  const planned = board.visits
    .filter(isPlacedVisit)
    .filter((visit) => visit.vanId === vanId && visit.progress !== 'called_off')
    .reduce((sum, visit) => sum + minutesBetween(visit.from, visit.to), 0);
  const van = board.vans.find((v) => v.id === vanId);
  const spans = van?.crew.map((person) => minutesBetween(person.from, person.to)) ?? [];
  return { planned, there: Math.max(0, ...spans) };
}

/** Any part of name, plate-like vehicle words, street, service or job number. */
export function matchesFilter(visit: VisitDto, filter: string): boolean {
  const wanted = filter.trim().toLowerCase();
  if (wanted === '') return true;
  const words = [
    visit.customerName,
    visit.address,
    visit.area,
    String(visit.jobNumber),
    ...visit.lines.flatMap((l) => [l.serviceName, l.vehicle]),
  ];
  return words.some((word) => word.toLowerCase().includes(wanted));
}

export function servicesOf(visit: VisitDto): string {
  return [...new Set(visit.lines.map((line) => line.serviceName))].join(', ');
}

export function vehiclesOf(visit: VisitDto): string {
  const names = [...new Set(visit.lines.map((line) => line.vehicle).filter(Boolean))];
  return names.length > 2 ? `${names.length} vehicles` : names.join(', ');
}
