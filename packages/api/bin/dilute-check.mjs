// npm run --silent dilute:check -- FILE.json: kit scenarios in, their results on standard output and nothing else.
import { checkCommand } from './lib/check-command.mjs';

await checkCommand('packages/api/src/commands/dilute-check.ts');
