import { stringify } from 'csv-stringify/sync';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import { centsText, decimalText } from '@driprail/shared/domain/money/rounding';

const columns = [
  'week_start',
  'week_end',
  'state',
  'person',
  'kind',
  'description',
  'date',
  'job',
  'hours',
  'rate',
  'amount',
  'paid_out',
  'rule',
];

/** The week for a payroll processor: a row per person and line (RFC 4180), amounts as plain decimals. */
export function payWeekCsv({ week, people }: PayWeekDto): string {
  const rows = people.flatMap((person) =>
    person.lines.map((line) => [
      week.startsOn,
      week.endsOn,
      week.state,
      harmless(person.name),
      line.kind,
      harmless(line.label),
      line.workedOn ?? '',
      line.jobNumber ?? '',
      line.hours ? decimalText(exact(line.hours), 4) : '',
      line.rate ? decimalText(exact(line.rate), 4) : '',
      centsText(line.amountCents).replace(/,/g, ''),
      line.isPayable ? 'yes' : 'no',
      harmless(line.rule),
    ]),
  );
  return stringify([columns, ...rows], { record_delimiter: 'windows' });
}

/** A spreadsheet must not take a name for a formula. */
function harmless(text: string): string {
  return /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
}
