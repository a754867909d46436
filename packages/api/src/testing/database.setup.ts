import { inject } from 'vitest';

import { cloneDatabase } from './database.ts';

// Runs before each test file is loaded, in the file's own process: every file has a database to itself,
// so tests commit for real and files run side by side.
const { appUrl, ownerUrl } = await cloneDatabase(inject('testPostgres'));
process.env.DATABASE_URL = appUrl;
process.env.DATABASE_MIGRATION_URL = ownerUrl;
