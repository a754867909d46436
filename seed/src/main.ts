import { parseArgs } from 'node:util';
import { readConfig } from '@driprail/api/config';
import { migrate } from '@driprail/api/db/migrate';
import { connect, disconnect } from '@driprail/api/db/sequelize';
import { calendarOf } from './calendar.ts';
import { DEMO_PASSWORD, seedDemo } from './seed-demo.ts';

const HINT = 'Give a day like --as-of 2026-05-14, or an instant like --as-of 2026-05-14T15:00:00Z.';

async function main(): Promise<void> {
  const now = asOfFrom(process.argv.slice(2));
  const { databaseUrl, migrationUrl } = readConfig(process.env);
  await migrate(migrationUrl, decodeURIComponent(new URL(databaseUrl).username));
  connect(databaseUrl);
  try {
    const isMade = await seedDemo({ now });
    say(
      isMade
        ? `The demo company is there as of ${calendarOf(now).today}, 11:00 am. Sign in as owner@ternandtide.example with ${DEMO_PASSWORD}.`
        : 'This database has a company already; it was left alone.',
    );
  } finally {
    await disconnect();
  }
}

/** A date stands for its own 11:00 company time. @throws when it is neither a date nor an instant */
function asOfFrom(args: string[]): Date {
  const { values } = parseArgs({ args, options: { 'as-of': { type: 'string' } } });
  const asOf = values['as-of'];
  if (asOf === undefined) return new Date();
  const isDay = /^\d{4}-\d{2}-\d{2}$/.test(asOf);
  const now = new Date(isDay ? `${asOf}T16:00:00Z` : asOf);
  if (Number.isNaN(now.getTime())) throw new Error(HINT);
  return now;
}

function say(sentence: string): void {
  process.stdout.write(`${sentence}\n`);
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
});
