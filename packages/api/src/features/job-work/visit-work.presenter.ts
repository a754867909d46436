import type { VisitWorkDto } from '@driprail/shared/contracts/job-work.contract';
import { isAccessOpen } from '@driprail/shared/domain/board/access-notes';
import { estimateTravel } from '@driprail/shared/domain/board/travel';
import type { ChangeFacts } from '@driprail/shared/domain/job-work/judge-change';
import { mustKnowsOf } from '@driprail/shared/domain/job-work/must-knows';
import { dayOf } from '@driprail/shared/domain/time/zone';
import type { WorkRow } from './work-rows.queries.ts';

interface Seen {
  now: Date;
  zone: string;
  /** The desk sees where a key goes back at any time, a crew in its hours. */
  isDesk: boolean;
}

export function toVisitWork({ visit, extras }: WorkRow, seen: Seen): VisitWorkDto {
  const { mustKnow, crew, next } = extras;
  const keyGoesBack = isKeyShown(visit, seen) ? mustKnow.keyGoesBack : null;
  const mustKnows = mustKnowsOf({ ...mustKnow, keyGoesBack });
  return {
    visitId: visit.id,
    jobNumber: visit.jobNumber,
    customerName: visit.customerName,
    address: visit.address,
    progress: visit.progress,
    plannedFrom: visit.from,
    arrivedAt: extras.arrivedAt,
    startedAt: extras.startedAt,
    mustKnows,
    takesKey: mustKnow.takesKey,
    keyGoesBack: keyGoesBack ?? '',
    lines: visit.lines.map((line) => {
      const list = extras.checklists.find((one) => one.lineId === line.id);
      return { ...line, steps: list?.steps ?? [], asksNote: list?.asksNote ?? false };
    }),
    events: extras.events,
    changes: extras.changes,
    crewSize: crew.filter((person) => !person.isTrainee).length,
    // A trainee adds no skill.
    crewSkills: [...new Set(crew.filter((person) => !person.isTrainee).flatMap((person) => person.skills))].sort(),
    next: next && {
      customerName: next.customerName,
      windowTo: next.windowTo,
      driveMinutes: next.stopId === visit.stopId ? 0 : estimateTravel(placeOf(visit), placeOf(next)).minutes,
    },
  };
}

/** What a change at the car is judged on. */
export function changeFactsOf(
  work: VisitWorkDto,
  { offers, surcharges, zone, clock }: Pick<ChangeFacts, 'offers' | 'surcharges' | 'zone' | 'clock'>,
): ChangeFacts {
  const { startedAt, plannedFrom, crewSize, crewSkills, lines, next } = work;
  return { zone, clock, startedAt, plannedFrom, crewSize, crewSkills, lines, offers, surcharges, next };
}

function isKeyShown(visit: WorkRow['visit'], { now, zone, isDesk }: Seen): boolean {
  if (isDesk) return true;
  const windowIsToday =
    visit.windowFrom && dayOf(visit.windowFrom, zone) === dayOf(visit.from ?? visit.windowFrom, zone);
  const arrivesFrom = windowIsToday ? visit.windowFrom : visit.from;
  return arrivesFrom !== null && isAccessOpen(arrivesFrom, now.toISOString(), zone);
}

function placeOf({ lat, lng }: { lat: number | null; lng: number | null }) {
  return lat === null || lng === null ? null : { lat, lng };
}
