import type { Progress, ProgressAction } from '@driprail/shared/domain/board/progress';
import { takeStep } from '@driprail/shared/domain/board/progress';
import { instant } from './calendar.ts';
import type { Book, LineRow, VisitRow } from './job-rows.ts';
import type { DemoPerson } from './people.ts';
import { at } from './random.ts';

/** When a crew pressed what, in minutes from midnight. */
export interface VisitTimes {
  setOff: number;
  arrive: number;
  start: number;
  end: number;
}

interface Told {
  day: string;
  visit: VisitRow;
  /** What this visit is to do. */
  lines: readonly LineRow[];
  crew: readonly DemoPerson[];
  times: VisitTimes;
  /** Lines that are left for another visit, and why. */
  left?: { lineIds: readonly string[]; reason: string } | undefined;
}

/** Writes what happened at a visit as far as it has happened; the last step is its progress. */
export function tellVisit(book: Book, { day, visit, lines, crew, times, left }: Told): void {
  const steps: [ProgressAction, number][] = [
    ['set_off', times.setOff],
    ['arrive', times.arrive],
    ['start_work', times.start],
    [left ? 'part_done' : 'finish', times.end],
  ];
  for (const [action, minute] of steps) {
    const when = instant(day, minute);
    if (when > book.calendar.asOf) return;
    const isLast = action === 'part_done' || action === 'finish';
    press(book, visit, action, when, at(crew, 0), isLast ? (left?.reason ?? '') : '');
    if (action === 'arrive') writeCrew(book, visit, crew);
    if (isLast) finishLines(visit, lines, when, left?.lineIds ?? []);
  }
}

/** One press of a person, or of somebody at the desk. @throws when the step can't follow */
export function press(
  { rows, ids }: Book,
  visit: VisitRow,
  action: ProgressAction,
  when: Date,
  by: Pick<DemoPerson, 'id' | 'userId'>,
  reason = '',
): void {
  const before: Progress = visit.progress ?? 'unplaced';
  const step = takeStep(before, action);
  if (!step.ok) throw new Error(step.message);
  rows.visitEvents.push({
    ...{ id: ids(), visitId: visit.id, kind: action, fromProgress: before, toProgress: step.to },
    ...{ userId: by.userId, personId: by.id, deviceAt: when, receivedAt: when, occurredAt: when },
    ...{ trouble: null, reason },
  });
  visit.progress = step.to;
  visit.progressSince = when;
  visit.reason = reason;
  visit.version = (visit.version ?? 0) + 1;
}

function writeCrew({ rows }: Book, visit: VisitRow, crew: readonly DemoPerson[]): void {
  for (const [position, { id: personId, isTrainee }] of crew.entries()) {
    rows.visitCrew.push({ visitId: visit.id, personId, position, weight: 1, isTrainee });
  }
}

function finishLines(visit: VisitRow, lines: readonly LineRow[], when: Date, leftIds: readonly string[]): void {
  for (const line of lines) {
    if (leftIds.includes(line.id)) continue;
    line.finishedVisitId = visit.id;
    line.finishedAt = when;
  }
}
