import { fractionText } from '@driprail/shared/domain/money/exact';
import { workedEntries } from '@driprail/shared/domain/pay/handover/worked-entries';
import { withOffset } from '@driprail/shared/domain/time/zone-instants';
import { EXPORT_SCHEMA_VERSION, hourColumns, namesOf } from './columns.ts';
import { csvText, fourPlaces, harmless } from '../../../paper/csv.ts';
import type { LockedWeek } from './locked-weeks.queries.ts';

/** The clock entries that the weeks were paid from, out of the snapshots, cut by day: a row per person, day and entry. */
export function hoursCsv(weeks: readonly LockedWeek[], jobNumbers: ReadonlyMap<string, number>): string {
  const rows = weeks.flatMap(({ week, people, input }) =>
    people.flatMap((person) =>
      workedEntries(input, person.personId).map((entry) => [
        EXPORT_SCHEMA_VERSION,
        week.startsOn,
        week.endsOn,
        person.personId,
        harmless(person.name),
        entry.date,
        entry.kind,
        entry.visitId === null ? '' : (jobNumbers.get(entry.visitId) ?? ''),
        withOffset(entry.startedAt, input.zone),
        withOffset(entry.endedAt, input.zone),
        fourPlaces(fractionText(entry.hours)),
        entry.isWorked ? 'yes' : 'no',
      ]),
    ),
  );
  return csvText(namesOf(hourColumns), rows);
}
