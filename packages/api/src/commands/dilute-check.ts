import { readFileSync } from 'node:fs';
import { checkKit } from '@driprail/shared/domain/kit/check/dilute-check';

/** `npm run --silent dilute:check -- FILE.json`: a file of kit scenarios in, their results as JSON on standard output. */
function main(file: string | undefined): number {
  const scenarios = readScenarios(file);
  if (typeof scenarios === 'string') {
    process.stderr.write(`${scenarios}\n`);
    return 1;
  }
  process.stdout.write(`${JSON.stringify(checkKit(scenarios), null, 2)}\n`);
  return 0;
}

/** The file's scenarios, or a sentence that says why there are none. */
function readScenarios(file: string | undefined): unknown[] | string {
  if (file === undefined) return 'Name the file of kit scenarios: npm run --silent dilute:check -- FILE.json';
  try {
    const content: unknown = JSON.parse(readFileSync(file, 'utf8').replace(/^\uFEFF/, ''));
    return Array.isArray(content) ? content : `The file ${file} does not hold a JSON array of {id, section, inputs}.`;
  } catch (error) {
    if (error instanceof SyntaxError) return `The file ${file} is not valid JSON (${error.message}).`;
    return `The file ${file} could not be read; check the path and that it may be opened.`;
  }
}

process.exitCode = main(process.argv[2]);
