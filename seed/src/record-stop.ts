import { addDays } from '@driprail/shared/domain/time/zone';
import { instant } from './calendar.ts';
import type { Book, LineRow, OrderedJob, VisitRow } from './job-rows.ts';
import { goOut, orderJob, windowAround } from './job-rows.ts';
import type { PlannedStop } from './plan-day.ts';
import type { Random } from './random.ts';
import type { DemoVan } from './vans.ts';

export interface RecordedStop {
  ordered: OrderedJob;
  visit: VisitRow;
  /** What the visit is to do. */
  lines: LineRow[];
}

/** Writes a planned stop as a job booked two to twelve days before, or as the next visit of the job it continues. */
export function recordStop(book: Book, day: string, van: DemoVan, stop: PlannedStop, random: Random): RecordedStop {
  const { customer, items, from, to, continues } = stop;
  const ordered =
    continues?.job ??
    orderJob(book, {
      ...{ customer, items, random, window: windowAround(day, from) },
      createdAt: bookedAt(book, day, random),
    });
  const lines = continues?.lines ?? ordered.lines;
  const visit = goOut(book, ordered, { lines, minutes: to - from, placing: { day, van, from, to } });
  return { ordered, visit, lines };
}

/** Office hours of an earlier day; what lies ahead was booked by yesterday. */
function bookedAt({ calendar }: Book, day: string, random: Random): Date {
  const earlier = addDays(day, -random.int(2, 12));
  const latest = addDays(calendar.today, -1);
  return instant(earlier < latest ? earlier : latest, random.int(8 * 60, 17 * 60));
}
