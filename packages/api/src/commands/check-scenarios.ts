import { readFileSync } from 'node:fs';

export interface ScenarioCommand {
  /** The npm script's name, for the sentence that says how to call it. */
  script: string;
  /** What a scenario holds, for the sentence that says what the file lacks. */
  fields: string;
  check: (scenarios: unknown[]) => unknown;
}

/** Prints the results of a file of scenarios as JSON; or says on standard error why there are none. Gives the exit code. */
export function checkScenarios(file: string | undefined, { script, fields, check }: ScenarioCommand): number {
  if (file === undefined) return refuse(`Name the file of scenarios: npm run --silent ${script} -- FILE.json`);
  let content: unknown;
  try {
    // Spreadsheets and editors may put a byte-order mark first.
    content = JSON.parse(readFileSync(file, 'utf8').replace(/^\uFEFF/, ''));
  } catch (error) {
    if (error instanceof SyntaxError) return refuse(`The file ${file} is not valid JSON (${error.message}).`);
    return refuse(`The file ${file} could not be read; check the path and that it may be opened.`);
  }
  if (!Array.isArray(content)) return refuse(`The file ${file} does not hold a JSON array of {${fields}}.`);
  process.stdout.write(`${JSON.stringify(check(content), null, 2)}\n`);
  return 0;
}

function refuse(sentence: string): number {
  process.stderr.write(`${sentence}\n`);
  return 1;
}
