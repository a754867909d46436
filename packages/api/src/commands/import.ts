import { readFile } from 'node:fs/promises';
import { resolve } from 'node:path';
import { readConfig } from '../config.ts';
import { migrate } from '../db/migrate.ts';
import { connect, disconnect } from '../db/sequelize.ts';
import { importCsv } from '../features/records/index.ts';
import type { ImportKind } from '../features/records/index.ts';

const usage = 'npm run import -- customers FILE.csv [--dry-run], then npm run import -- jobs FILE.csv [--dry-run]';

async function main(): Promise<number> {
  const words = process.argv.slice(2);
  const isDry = words.includes('--dry-run');
  const [kind, file] = words.filter((word) => !word.startsWith('--'));
  if ((kind !== 'customers' && kind !== 'jobs') || !file) throw new Error(`Use it so: ${usage}`);
  const text = await readFile(resolve(process.env['INIT_CWD'] ?? '.', file), 'utf8').catch(() => {
    throw new Error(`${file} can’t be read. Check the path.`);
  });
  const config = readConfig(process.env);
  await migrate(config.migrationUrl, decodeURIComponent(new URL(config.databaseUrl).username));
  connect(config.databaseUrl, 2);
  try {
    return report(kind, isDry, await importCsv(kind, text, { isDry, now: () => new Date() }));
  } finally {
    await disconnect();
  }
}

function report(
  kind: ImportKind,
  isDry: boolean,
  { rows, made, complaints }: Awaited<ReturnType<typeof importCsv>>,
): number {
  for (const { line, reason } of complaints) process.stdout.write(`line ${line}: ${reason}\n`);
  if (complaints.length > 0) {
    process.stdout.write(`Nothing was loaded: ${complaints.length} to mend.\n`);
    return 1;
  }
  process.stdout.write(
    isDry ? `A dry run: ${rows} rows would make ${made} ${kind}.\n` : `Loaded ${made} ${kind} from ${rows} rows.\n`,
  );
  return 0;
}

main().then(
  (code) => process.exit(code),
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  },
);
