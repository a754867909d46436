import { tag } from '@driprail/shared/authz/ability';
import { withOffset } from '@driprail/shared/domain/time/zone-instants';
import { authorize } from '../../../authz/authorize.ts';
import { companyOf } from '../../../db/company.ts';
import { Person } from '../../../db/models/index.ts';
import type { Ctx } from '../../../http/context.ts';
import { notFound } from '../../../http/errors.ts';
import { linesCsv } from '../export.ts';
import { clockColumns, namesOf, tipColumns, EXPORT_SCHEMA_VERSION } from './columns.ts';
import { csvText, harmless, plainCents } from '../../../paper/csv.ts';
import { statementFiles } from './handover-zip.ts';
import { hoursCsv } from './hours-csv.ts';
import { kindsCsv, tipMethodOf } from './kinds-csv.ts';
import { hoursBefore, jobNumbersOf, weeksOfPerson, type LockedWeek } from './locked-weeks.queries.ts';
import { ownPart, workingOf } from './own-lines.ts';
import { auditOf, clockRecords, termsOf, wordsOf, type ClockRecord } from './person-records.queries.ts';
import { personReadme } from './readme.ts';
import { zipOf, type ZipFiles } from './zip.ts';

/**
 * Everything kept about one person's pay in one archive: no customers, nobody else's shares.
 * @throws 403 for another's, except to the owner; 404 when there is no such person
 */
export async function personZip(ctx: Ctx, personId: string): Promise<Buffer> {
  authorize(ctx.ability, 'read', tag('PayRecord', { personId }));
  const person = await Person.findByPk(personId);
  if (!person) throw notFound('That person');
  const { name, zone } = await companyOf();
  const weeks = await weeksOfPerson(personId);
  const own = weeks.map(({ people, ...rest }) => ({
    ...rest,
    people: people.map((one) => ({ ...one, lines: one.lines.map(ownPart) })),
  }));
  const entries = await clockRecords(personId);
  const { rates, plans, places, rules, agreements, timeOff } = await termsOf(personId);
  const { hours, requests } = await wordsOf(personId);
  const files: ZipFiles = {
    'README.txt': personReadme(name, person.name),
    'kinds.csv': kindsCsv(weeks, await hoursBefore(weeks)),
    'lines.csv': linesCsv(weeks),
    'hours.csv': hoursCsv(weeks, await jobNumbersOf(weeks)),
    'clock-entries.csv': clockCsv(entries, zone),
    'tips.csv': tipsCsv(weeks),
    'workings.json': json(weeks.map(({ week, people }) => workings(week.startsOn, people))),
    'clock-corrections.json': json(entries.filter((entry) => entry.corrections.length > 0)),
    'rates.json': json(rates),
    'plans.json': json(plans),
    'places.json': json(places),
    'rules.json': json(rules),
    'agreements.json': json(agreements),
    'time-off.json': json(timeOff),
    'hours-words.json': json({ said: hours, requests }),
    'audit.json': json(await auditOf(personId)),
    ...(await statementFiles(ctx, own)),
  };
  return zipOf(files, ctx.now());
}

function workings(startsOn: string, people: LockedWeek['people']) {
  return { weekStartsOn: startsOn, lines: people.flatMap((person) => person.lines.map(workingOf)) };
}

/** Entries as they stand, beside what was recorded first. */
function clockCsv(entries: readonly ClockRecord[], zone: string): string {
  const time = (instant: string | null | undefined) => (instant ? withOffset(instant, zone) : '');
  const rows = entries.map(({ id, kind, jobNumber, startedAt, endedAt, corrections }) => {
    const [first] = corrections;
    const original = first ? first.before : { kind, startedAt, endedAt };
    return [
      EXPORT_SCHEMA_VERSION,
      id,
      kind,
      jobNumber ?? '',
      time(startedAt),
      time(endedAt),
      original?.kind ?? '',
      time(original?.startedAt),
      time(original?.endedAt),
      corrections.length,
      harmless(corrections.at(-1)?.reason ?? ''),
    ];
  });
  return csvText(namesOf(clockColumns), rows);
}

/** The own share of each tip in the locked weeks; what the whole tip was would tell the others' shares. */
function tipsCsv(weeks: readonly LockedWeek[]): string {
  const rows = weeks.flatMap(({ week, people, input }) =>
    people.flatMap((person) =>
      person.lines
        .filter((line) => line.kind === 'tip' || line.kind === 'tip_already_received')
        .map((line) => [
          EXPORT_SCHEMA_VERSION,
          week.startsOn,
          line.workedOn ?? '',
          line.jobNumber ?? '',
          tipMethodOf(input, line),
          plainCents(line.amountCents),
          line.isPayable ? 'yes' : 'no',
        ]),
    ),
  );
  return csvText(namesOf(tipColumns), rows);
}

function json(value: unknown): string {
  return `${JSON.stringify(value, null, 2)}\n`;
}
