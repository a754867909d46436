import { checkKit } from '@driprail/shared/domain/kit/check/dilute-check';
import { checkScenarios } from './check-scenarios.ts';

/** `npm run --silent dilute:check -- FILE.json`: a file of kit scenarios in, their results as JSON on standard output. */
process.exitCode = checkScenarios(process.argv[2], {
  script: 'dilute:check',
  fields: 'id, section, inputs',
  check: checkKit,
});
