import { buildApi, buildWeb } from './build.mjs';
import { root } from './paths.mjs';
import { run } from './run.mjs';
import { PlainError } from './words.mjs';

const tool = (path, ...args) => [`node_modules/${path}`, ...args];
const tsc = (project) => tool('typescript/bin/tsc', '--noEmit', '-p', project);

/** Each counts as one in the last line. A check is a list of Node programs, or a function that throws. */
const checks = {
  boundaries: [
    tool('dependency-cruiser/bin/dependency-cruise.mjs', 'packages', 'seed', '--config', '.dependency-cruiser.cjs'),
  ],
  build: async () => {
    await buildWeb();
    await buildApi();
  },
  lint: [tool('eslint/bin/eslint.js', '.', '--max-warnings', '0')],
  types: ['packages/shared', 'packages/api', 'packages/web', 'seed', '.'].map(tsc),
  format: [tool('prettier/bin/prettier.cjs', '--check', '.')],
};

/**
 * Runs all checks, two at a time, and tells each one's outcome as it comes; what a check printed
 * follows when it failed.
 * @returns {Promise<import('./tally.mjs').Tally>}
 */
export async function runChecks() {
  const tally = { passed: 0, failed: 0 };
  const waiting = Object.entries(checks);
  const worker = async () => {
    for (let next = waiting.shift(); next; next = waiting.shift()) {
      const [name, check] = next;
      const started = Date.now();
      const problem = await (typeof check === 'function' ? outcomeOf(check) : firstProblem(check));
      const seconds = ((Date.now() - started) / 1000).toFixed(1);
      tally[problem === undefined ? 'passed' : 'failed'] += 1;
      process.stdout.write(`${problem === undefined ? 'passed' : 'FAILED'}  ${name} (${seconds} s)\n${problem ?? ''}`);
    }
  };
  await Promise.all([worker(), worker()]);
  return tally;
}

async function firstProblem(programs) {
  const problems = [];
  for (const program of programs) {
    const { code, output } = await run(process.execPath, program, { cwd: root, show: 'nothing' });
    if (code !== 0) problems.push(output.endsWith('\n') ? output : `${output}\n`);
  }
  return problems.length ? problems.join('') : undefined;
}

async function outcomeOf(check) {
  try {
    await check();
    return undefined;
  } catch (error) {
    if (error instanceof PlainError) return `${error.message}\n`;
    throw error;
  }
}
