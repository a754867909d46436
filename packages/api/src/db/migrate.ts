import { Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { migrations } from './migrations/index.ts';

/**
 * Brings the schema up to date as its owner and gives the application's role the right to rows only.
 * Each migration runs in a transaction of its own. With one role for both, only triggers protect what is append-only.
 * @param ownerUrl a PostgreSQL URL of the role that owns the schema
 * @param appRole the role that the application signs in with
 */
export async function migrate(ownerUrl: string, appRole: string): Promise<void> {
  const sequelize = new Sequelize(ownerUrl, { logging: false, pool: { max: 1 } });
  try {
    await umzugFor(sequelize).up();
    await grantRows(sequelize, appRole);
  } finally {
    await sequelize.close();
  }
}

export function umzugFor(sequelize: Sequelize) {
  const run = (sql: string) => sequelize.transaction((transaction) => sequelize.query(sql, { transaction }));
  return new Umzug({
    migrations: migrations.map(({ name, up, down }) => ({ name, up: () => run(up), down: () => run(down) })),
    storage: new SequelizeStorage({ sequelize, tableName: 'schema_migrations' }),
    logger: undefined,
  });
}

async function grantRows(sequelize: Sequelize, appRole: string): Promise<void> {
  const role = sequelize.getQueryInterface().quoteIdentifier(appRole);
  await sequelize.query(
    `GRANT USAGE ON SCHEMA public TO ${role};
     GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA public TO ${role};
     GRANT USAGE, SELECT ON ALL SEQUENCES IN SCHEMA public TO ${role};
     REVOKE UPDATE, DELETE ON audit_entries, clock_corrections, pay_rates, pay_rules FROM ${role};
     REVOKE ALL ON schema_migrations FROM ${role};`,
  );
}
