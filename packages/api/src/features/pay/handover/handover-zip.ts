import { formatDate } from '@driprail/shared/domain/time/format';
import { companyOf } from '../../../db/company.ts';
import type { Ctx } from '../../../http/context.ts';
import { linesCsv } from '../export.ts';
import { statementPdf } from '../statement-pdf.ts';
import { readStatement } from '../statements.queries.ts';
import { hoursCsv } from './hours-csv.ts';
import { kindsCsv, peopleCsv } from './kinds-csv.ts';
import { hoursBefore, jobNumbersOf, type LockedWeek } from './locked-weeks.queries.ts';
import { handoverReadme } from './readme.ts';
import { pathPart, zipOf, type ZipFiles } from './zip.ts';

/** Everything of the weeks for a payroll processor in one archive. */
export async function handoverZip(ctx: Ctx, weeks: readonly LockedWeek[]): Promise<Buffer> {
  const { name } = await companyOf();
  const hours = await hoursBefore(weeks);
  const [first, last] = [weeks[0]?.week.startsOn, weeks.at(-1)?.week.endsOn];
  const files: ZipFiles = {
    'README.txt': handoverReadme(name, first && last ? `${formatDate(first)} to ${formatDate(last)}` : 'no weeks'),
    'kinds.csv': kindsCsv(weeks, hours),
    'people.csv': peopleCsv(weeks, hours),
    'lines.csv': linesCsv(weeks),
    'hours.csv': hoursCsv(weeks, await jobNumbersOf(weeks)),
    ...(await statementFiles(ctx, weeks)),
  };
  return zipOf(files, ctx.now());
}

/** A PDF per person and week, of the lines given. Customers stay out: their names are nobody’s business outside the company. */
export async function statementFiles(ctx: Ctx, weeks: readonly LockedWeek[]): Promise<ZipFiles> {
  const { zone } = await companyOf();
  const files: ZipFiles = {};
  for (const { week, people } of weeks) {
    for (const person of people) {
      const { personId, name } = person;
      const statement = { ...(await readStatement(ctx, week.startsOn, personId)), person, customers: {} };
      const path = `statements/${week.startsOn}-${pathPart(name)}`;
      const free = `${path}.pdf` in files ? `${path}-${personId.slice(-6)}` : path;
      files[`${free}.pdf`] = await statementPdf(statement, zone);
    }
  }
  return files;
}
