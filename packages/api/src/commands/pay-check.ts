import { readFileSync } from 'node:fs';
import { checkPay } from '@driprail/shared/domain/pay/check/pay-check';

/** `npm run --silent pay:check -- FILE.json`: a file of pay scenarios in, their results as JSON on standard output. */
function main(file: string | undefined): number {
  const scenarios = readScenarios(file);
  if (typeof scenarios === 'string') {
    process.stderr.write(`${scenarios}\n`);
    return 1;
  }
  process.stdout.write(`${JSON.stringify(checkPay(scenarios), null, 2)}\n`);
  return 0;
}

/** The file's scenarios, or a sentence that says why there are none. */
function readScenarios(file: string | undefined): unknown[] | string {
  if (file === undefined) return 'Name the file of pay scenarios: npm run --silent pay:check -- FILE.json';
  try {
    const content: unknown = JSON.parse(readFileSync(file, 'utf8'));
    return Array.isArray(content) ? content : `The file ${file} does not hold a JSON array of {id, kind, inputs}.`;
  } catch (error) {
    if (error instanceof SyntaxError) return `The file ${file} is not valid JSON (${error.message}).`;
    return `The file ${file} could not be read; check the path and that it may be opened.`;
  }
}

process.exitCode = main(process.argv[2]);
