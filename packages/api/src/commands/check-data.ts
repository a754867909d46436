import { readConfig } from '../config.ts';
import { migrate } from '../db/migrate.ts';
import { connect, disconnect } from '../db/sequelize.ts';
import { checkData } from '../features/records/index.ts';
import { checkPhotoFiles } from '../features/walk-round/index.ts';
import { storeFor } from '../integrations/storage/index.ts';

async function main(): Promise<number> {
  const config = readConfig(process.env);
  await migrate(config.migrationUrl, decodeURIComponent(new URL(config.databaseUrl).username));
  connect(config.databaseUrl, 2);
  try {
    const findings = [...(await checkData()), await checkPhotoFiles(storeFor(config))];
    for (const { what, count } of findings)
      process.stdout.write(`${count === 0 ? 'holds ' : 'BROKEN'}  ${what}${count === 0 ? '' : `: ${count}`}\n`);
    return findings.every(({ count }) => count === 0) ? 0 : 1;
  } finally {
    await disconnect();
  }
}

main().then(
  (code) => process.exit(code),
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  },
);
