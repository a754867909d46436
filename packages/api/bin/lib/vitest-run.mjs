import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { root } from './paths.mjs';
import { run } from './run.mjs';
import { tallyOf } from './tally.mjs';

/**
 * Runs one project of vitest.config.ts.
 * @param {string} project
 * @param {string[]} filters parts of file names; none means all
 * @param {NodeJS.ProcessEnv} env added to this process's
 * @returns {Promise<import('./tally.mjs').Tally>}
 */
export async function runVitest(project, filters, env) {
  const folder = mkdtempSync(join(tmpdir(), 'driprail-report-'));
  const report = join(folder, 'report.json');
  const args = [
    ...['node_modules/vitest/vitest.mjs', 'run', '--project', project, '--allowOnly=false'],
    ...['--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
    ...(filters.length ? ['--passWithNoTests', ...filters] : []),
  ];
  try {
    const colour = process.stdout.isTTY ? { FORCE_COLOR: '1' } : { NO_COLOR: '1' };
    const childEnv = { ...process.env, ...colour, ...env };
    // Tests have databases of their own, whatever server the person uses.
    delete childEnv.DATABASE_URL;
    delete childEnv.DATABASE_MIGRATION_URL;
    const { code } = await run(process.execPath, args, { cwd: root, env: childEnv, to: process.stdout });
    return tallyOf(read(report), code);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function read(report) {
  try {
    return JSON.parse(readFileSync(report, 'utf8'));
  } catch {
    return undefined; // Vitest ended before it could write one.
  }
}
