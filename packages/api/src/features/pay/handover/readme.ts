import { clockColumns, hourColumns, kindColumns, lineColumns, peopleColumns, tipColumns } from './columns.ts';

const files = [
  ['kinds.csv', 'A row per person and workweek, a column per kind of pay.', kindColumns],
  ['people.csv', 'The same, a row per person over all the weeks in this folder.', peopleColumns],
  ['lines.csv', 'A row per person and line, with the rule that made it.', lineColumns],
  ['hours.csv', 'The clock entries that were paid, cut by day.', hourColumns],
  ['clock-entries.csv', 'Every clock entry as it stands, beside what was recorded first.', clockColumns],
  ['tips.csv', 'The own share of each tip.', tipColumns],
] as const;

/** What every hand-over says first. */
const careWords =
  'Gross pay only. Tax withholding is left to a licensed payroll processor. This is not legal or tax advice.';

/** What lies in a hand-over, every column by its name. */
export function handoverReadme(companyName: string, span: string): string {
  return lines([
    `${companyName}: pay, ${span}`,
    '',
    careWords,
    'Each workweek was worked out alone and is locked; a later correction is a line in a later week.',
    'Amounts are dollars with two places. Customers are named by job number only.',
    '',
    'statements/   One PDF per person and workweek.',
    ...columnWords(['kinds.csv', 'people.csv', 'lines.csv', 'hours.csv']),
  ]);
}

/** What lies in a person's own export. */
export function personReadme(companyName: string, personName: string): string {
  return lines([
    `${companyName}: everything kept about the pay of ${personName}`,
    '',
    careWords,
    'Locked weeks only, but for clock entries. Amounts in CSV files are dollars, in JSON files integer cents.',
    'Customers are named by job number only. What others of a crew were paid is left out: shared work shows the own share.',
    'Who did something is named by role: the person, owner, dispatcher.',
    '',
    'statements/             One PDF per workweek.',
    'workings.json           How each line was worked out.',
    'clock-corrections.json  Each correction of a clock entry: before, after, when, why.',
    'rates.json              Dated rates, the own and the company’s.',
    'plans.json, places.json Dated plans of pay and places of work.',
    'rules.json              The company’s dated rules of pay.',
    'agreements.json         What was agreed to in writing.',
    'time-off.json           Days off, the rules of hours off, and changes of their balance.',
    'hours-words.json        What was said of the hours, and changes asked for.',
    'audit.json              Who changed what about this pay, and when.',
    ...columnWords(['kinds.csv', 'lines.csv', 'hours.csv', 'clock-entries.csv', 'tips.csv']),
  ]);
}

/** The files with their columns, for those named. */
function columnWords(names: readonly string[]): string[] {
  return files
    .filter(([name]) => names.includes(name))
    .flatMap(([name, what, columns]) => [
      '',
      `${name}   ${what}`,
      ...columns.map(([column, meaning]) => `  ${column.padEnd(24)}${meaning}`),
    ]);
}

function lines(all: readonly string[]): string {
  return `${all.join('\r\n')}\r\n`;
}
