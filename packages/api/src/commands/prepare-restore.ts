import { readConfig } from '../config.ts';
import { emptySchema, migrate } from '../db/migrate.ts';
import { connect, disconnect } from '../db/sequelize.ts';
import { isSetUpNeeded } from '../features/settings/index.ts';

/** Makes room for a backup: an empty schema, only where no company is. */
async function main(): Promise<number> {
  const config = readConfig(process.env);
  await migrate(config.migrationUrl, decodeURIComponent(new URL(config.databaseUrl).username));
  connect(config.databaseUrl, 1);
  const isEmpty = await isSetUpNeeded();
  await disconnect();
  if (!isEmpty) {
    process.stderr.write(
      'This database has a company. Restore into an empty one: set DRIPRAIL_DATA to a new folder.\n',
    );
    return 1;
  }
  await emptySchema(config.migrationUrl);
  return 0;
}

main().then(
  (code) => process.exit(code),
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  },
);
