import { QueryTypes, Sequelize } from 'sequelize';
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
    // Two starts on one database take turns.
    await sequelize.query(`SELECT pg_advisory_lock(${MIGRATION_LOCK})`);
    await umzugFor(sequelize).up();
    if (!(await isCurrentRole(sequelize, appRole))) await grantRows(sequelize, appRole);
  } finally {
    await sequelize.close();
  }
}

/** Takes everything out of the schema, for a backup to be brought in. Only for a database without a company. */
export async function emptySchema(ownerUrl: string): Promise<void> {
  const sequelize = new Sequelize(ownerUrl, { logging: false, pool: { max: 1 } });
  try {
    await umzugFor(sequelize).down({ to: 0 });
    await sequelize.query('DROP TABLE schema_migrations; DROP EXTENSION btree_gist;');
  } finally {
    await sequelize.close();
  }
}

/** Fresh statistics after many rows came at once: without them the planner guesses badly. */
export async function analyze(ownerUrl: string): Promise<void> {
  const sequelize = new Sequelize(ownerUrl, { logging: false, pool: { max: 1 } });
  try {
    await sequelize.query('ANALYZE');
  } finally {
    await sequelize.close();
  }
}

/** Any number that nothing else in this database locks. */
const MIGRATION_LOCK = 460_001;

async function isCurrentRole(sequelize: Sequelize, role: string): Promise<boolean> {
  const [row] = await sequelize.query<{ isSame: boolean }>('SELECT current_user = $role AS "isSame"', {
    bind: { role },
    type: QueryTypes.SELECT,
  });
  return row?.isSame ?? false;
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
     REVOKE UPDATE, DELETE ON pay_plans, pay_places, pay_place_wages, person_places FROM ${role};
     REVOKE UPDATE, DELETE ON time_off_rules, time_off_adjustments, show_up_rules FROM ${role};
     REVOKE UPDATE, DELETE ON service_checklists, work_events FROM ${role};
     REVOKE ALL ON schema_migrations FROM ${role};`,
  );
}
