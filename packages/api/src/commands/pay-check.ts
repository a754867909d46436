import { checkPay } from '@driprail/shared/domain/pay/check/pay-check';
import { checkScenarios } from './check-scenarios.ts';

/** `npm run --silent pay:check -- FILE.json`: a file of pay scenarios in, their results as JSON on standard output. */
process.exitCode = checkScenarios(process.argv[2], {
  script: 'pay:check',
  fields: 'id, kind, inputs',
  check: checkPay,
});
