// npm run --silent pay:check -- FILE.json: pay scenarios in, their results on standard output and nothing else.
import { checkCommand } from './lib/check-command.mjs';

await checkCommand('packages/api/src/commands/pay-check.ts');
