import { expect, test } from 'vitest';
import { QueryTypes, Sequelize } from 'sequelize';
import { migrate, umzugFor } from './migrate.ts';

const ownerUrl = process.env['DATABASE_MIGRATION_URL'] ?? '';

test('the schema goes down to nothing and up again to the same', async () => {
  const sequelize = new Sequelize(ownerUrl, { logging: false, pool: { max: 1 } });
  const columns = () =>
    sequelize.query<{ t: string }>(
      `SELECT table_name || '.' || column_name || ' ' || data_type AS t FROM information_schema.columns WHERE table_schema = 'public' ORDER BY 1`,
      { type: QueryTypes.SELECT },
    );
  try {
    const before = await columns();
    expect(before.length).toBeGreaterThan(150);
    await umzugFor(sequelize).down({ to: 0 });
    expect((await columns()).map((c) => c.t)).toEqual(['schema_migrations.name character varying']);
    await migrate(ownerUrl, 'driprail_app');
    expect(await columns()).toEqual(before);
  } finally {
    await sequelize.close();
  }
});

test('two starts at once migrate once', async () => {
  await Promise.all([migrate(ownerUrl, 'driprail_app'), migrate(ownerUrl, 'driprail_app')]);
});

test('one role for both is let in again: it keeps its own rights', async () => {
  await migrate(ownerUrl, 'driprail_owner');
  await migrate(ownerUrl, 'driprail_owner');
});
