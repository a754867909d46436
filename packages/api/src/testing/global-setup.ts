import type { TestProject } from 'vitest/node';

import { openTestCluster } from '../../bin/lib/postgres.mjs';
import { dropLeftovers, ensureMigratedTemplate, newRun, type TestPostgres } from './database.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    testPostgres: TestPostgres;
  }
}

/**
 * Once per test run: a throw-away PostgreSQL (that of `npm test`, else one of its own) and in it the
 * migrated template each test file's database is copied from.
 * @returns what ends it again
 */
export async function setup(project: TestProject): Promise<() => Promise<void>> {
  const given = Number(process.env.DRIPRAIL_TEST_PG_PORT);
  const cluster = given ? { port: given, close: () => Promise.resolve() } : await openTestCluster();
  await dropLeftovers(cluster.port);
  await ensureMigratedTemplate(cluster.port);
  project.provide('testPostgres', { port: cluster.port, run: newRun() });
  return cluster.close;
}
