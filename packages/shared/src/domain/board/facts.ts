import type { BoardDto } from '../../contracts/board.contract.ts';
import type { VisitDto } from '../../contracts/visit.dto.ts';
import type { BoardFacts, PlannedVisit } from './plan.ts';

/** What the fit rules need to know of a visit that a screen or the API holds. */
export function plannedOf(visit: VisitDto): PlannedVisit {
  const { id, jobId, jobNumber, stopId, addressId, vanId, from, to, minutes, progress, customerName } = visit;
  const { lat, lng, windowFrom, windowTo, skills, equipment } = visit;
  const bringsWater = visit.needsWater && !visit.hasWater;
  const bringsPower = visit.needsPower && !visit.hasPower;
  const place = lat === null || lng === null ? null : { lat, lng };
  return {
    id,
    jobId,
    jobNumber,
    stopId,
    addressId,
    vanId,
    from,
    to,
    minutes,
    progress,
    customerName,
    place,
    windowFrom,
    windowTo,
    skills,
    equipment,
    bringsWater,
    bringsPower,
  };
}

/** A day's board as the facts that moves are judged on. */
export function factsOf(board: BoardDto): BoardFacts {
  const { day, zone, clock, dayStartsAt, dayEndsAt, isLocked, overtimeAfterMinutes } = board;
  return {
    day,
    zone,
    clock,
    dayStartsAt,
    dayEndsAt,
    isLocked,
    overtimeAfterMinutes,
    vans: board.vans,
    visits: board.visits.map(plannedOf),
  };
}
