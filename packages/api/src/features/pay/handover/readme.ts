import { hourColumns, kindColumns, lineColumns, peopleColumns } from './columns.ts';

const files = [
  ['kinds.csv', 'A row per person and workweek, a column per kind of pay.', kindColumns],
  ['people.csv', 'The same, a row per person over all the weeks in this folder.', peopleColumns],
  ['lines.csv', 'A row per person and line, with the rule that made it.', lineColumns],
  ['hours.csv', 'The clock entries that were paid, cut by day.', hourColumns],
] as const;

/** What every hand-over says first. */
export const careWords =
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
    ...columnWords(files.map(([name]) => name)),
  ]);
}

/** The files with their columns, for those named. */
export function columnWords(names: readonly string[]): string[] {
  return files
    .filter(([name]) => names.includes(name))
    .flatMap(([name, what, columns]) => [
      '',
      `${name}   ${what}`,
      ...columns.map(([column, meaning]) => `  ${column.padEnd(24)}${meaning}`),
    ]);
}

export function lines(all: readonly string[]): string {
  return `${all.join('\r\n')}\r\n`;
}
