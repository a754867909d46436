import { readConfig } from '../config.ts';
import { migrate } from '../db/migrate.ts';
import { connect, disconnect } from '../db/sequelize.ts';
import { verifyWeeks } from '../features/pay/index.ts';

/** `npm run pay:verify`: works every locked week out again from its snapshot; ends with 1 when anything differs. */
async function main(): Promise<number> {
  const config = readConfig(process.env);
  await migrate(config.migrationUrl, decodeURIComponent(new URL(config.databaseUrl).username));
  connect(config.databaseUrl, 2);
  try {
    const { verified, complaints } = await verifyWeeks();
    for (const complaint of complaints) process.stderr.write(`${complaint}\n`);
    process.stdout.write(`${verified} ${verified === 1 ? 'week' : 'weeks'} verified\n`);
    return complaints.length === 0 ? 0 : 1;
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
