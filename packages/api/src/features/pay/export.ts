import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { lineColumns, namesOf } from './handover/columns.ts';
import { csvText, fourPlaces, harmless, plainCents } from '../../paper/csv.ts';

/** Weeks for a payroll processor: a row per person and line (RFC 4180), amounts as plain decimals. */
export function linesCsv(weeks: readonly Pick<PayWeekDto, 'week' | 'people'>[]): string {
  const rows = weeks.flatMap(({ week, people }) =>
    people.flatMap((person) =>
      person.lines.map((line) => [
        week.startsOn,
        week.endsOn,
        week.state,
        harmless(person.name),
        line.kind,
        harmless(line.label),
        line.workedOn ?? '',
        line.jobNumber ?? '',
        fourPlaces(line.hours),
        fourPlaces(line.rate),
        plainCents(line.amountCents),
        line.isPayable ? 'yes' : 'no',
        harmless(line.rule),
      ]),
    ),
  );
  return csvText(namesOf(lineColumns), rows);
}
