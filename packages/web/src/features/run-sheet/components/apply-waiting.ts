import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockEntryDto, ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { isAccessOpen } from '@driprail/shared/domain/board/access-notes';
import type { Progress, ProgressAction } from '@driprail/shared/domain/board/progress';
import { progressActions, takeStep } from '@driprail/shared/domain/board/progress';
import type { KeptPress } from '../../../lib/outbox/store.ts';

const timeOf = {
  set_off: 'setOffAt',
  arrive: 'arrivedAt',
  start_work: 'startedAt',
  part_done: 'endedAt',
  finish: 'endedAt',
  call_off: 'endedAt',
} as const;

/** Where a visit goes back to when its last mark is taken back. */
function before(visit: RunVisitDto, action: ProgressAction): Progress {
  if (action === 'arrive') return visit.times.setOffAt ? 'on_the_way' : 'placed';
  const froms = {
    set_off: 'placed',
    start_work: 'on_site',
    part_done: 'working',
    finish: 'working',
    call_off: 'placed',
  } as const;
  return froms[action];
}

/** The run sheet as it will be once what waits on this phone has been sent; the server judges it again then. */
export function applyWaiting(sheet: RunSheetDto, waiting: KeptPress[], now: string): RunSheetDto {
  const visits = sheet.visits.map((visit) =>
    hideClosedNotes(
      waiting
        .filter((press) => press.targetId === visit.id)
        .reduce(
          (shown, press) => (press.path === 'visit' ? applyToVisit(shown, press) : applyToWalk(shown, press)),
          visit,
        ),
      now,
      sheet.zone,
    ),
  );
  const clock = sheet.clock && applyToClocks(sheet.clock, waiting);
  return { ...sheet, visits, clock };
}

/**
 * A walk-round that waits counts as made for its car, be it made anew or not; the server judges it again.
 * `due` may be missing where the phone kept the visit before there was such a list.
 */
function applyToWalk(visit: RunVisitDto, { path, body }: KeptPress): RunVisitDto {
  const { walkRound } = visit;
  if (path === 'walk') {
    const { due: stillDue = [] } = walkRound;
    const due = stillDue.filter((vehicleId) => vehicleId !== body['vehicleId']);
    return { ...visit, walkRound: { ...walkRound, due, made: walkRound.cars - due.length } };
  }
  if (path === 'walk_addition' && body['kind'] === 'second_look')
    return { ...visit, walkRound: { ...walkRound, isSecondLookDue: false } };
  return visit;
}

function applyToVisit(visit: RunVisitDto, { body }: KeptPress): RunVisitDto {
  const kind = body['kind'] as string;
  const at = body['deviceAt'] as string;
  if (kind === 'undo' && visit.undoable) {
    return { ...visit, progress: before(visit, visit.undoable.action), since: at, undoable: null };
  }
  const action = progressActions.find((known) => known === kind);
  const step = action ? takeStep(visit.progress, action) : null;
  if (!action || !step?.ok) return visit;
  return {
    ...visit,
    progress: step.to,
    since: at,
    reason: typeof body['reason'] === 'string' ? body['reason'] : '',
    times: { ...visit.times, [timeOf[action]]: at },
    undoable: null,
  };
}

/** What a copy lacks that the phone kept before the clock held it. */
const kept: Pick<ClockStateDto, 'crew' | 'breaks'> = {
  crew: [],
  breaks: { mealAfterMinutes: null, restAfterMinutes: null },
};

/** The clock, and those of who rides along, with what waits on this phone. */
export function applyToClocks(clock: ClockStateDto, waiting: KeptPress[]): ClockStateDto {
  return waiting
    .filter((press) => press.path === 'clock')
    .reduce((shown, press) => (press.body['forPersonId'] ? applyToMate : applyToClock)(shown, press), {
      ...kept,
      ...clock,
    });
}

function applyToMate(clock: ClockStateDto, { body }: KeptPress): ClockStateDto {
  const isIn = body['action'] === 'start';
  const pressed = {
    kind: isIn ? ((body['kind'] as ClockKindName | undefined) ?? 'shop') : null,
    since: isIn ? (body['deviceAt'] as string) : null,
  };
  return {
    ...clock,
    crew: clock.crew.map((mate) => (mate.personId === body['forPersonId'] ? { ...mate, ...pressed } : mate)),
  };
}

function applyToClock(clock: ClockStateDto, { key, body }: KeptPress): ClockStateDto {
  const at = body['deviceAt'] as string;
  const ended = clock.today.map((entry) => (entry.endedAt === null ? { ...entry, endedAt: at } : entry));
  if (body['action'] === 'stop') return { ...clock, open: null, inSince: null, today: ended };
  const open: ClockEntryDto = {
    id: key,
    personId: clock.personId,
    personName: clock.open?.personName ?? '',
    kind: (body['kind'] as ClockKindName | undefined) ?? 'shop',
    visitId: null,
    jobNumber: null,
    startedAt: at,
    endedAt: null,
    isInterrupted: false,
    isForgotten: false,
    note: '',
    version: 0,
  };
  return { ...clock, open, inSince: clock.inSince ?? at, today: [...ended, open] };
}

/** A copy on the phone keeps to the same hours as the server: gate code and number leave at the day's end. */
function hideClosedNotes(visit: RunVisitDto, now: string, zone: string): RunVisitDto {
  const arrivesFrom = visit.windowFrom ?? visit.from;
  if (arrivesFrom !== null && isAccessOpen(arrivesFrom, now, zone)) return visit;
  return { ...visit, phone: null, gateCode: null, accessNotes: null };
}
