import { expect, test } from 'vitest';
import * as billing from './billing.contract.ts';
import * as clock from './clock.contract.ts';
import * as hours from './hours.contract.ts';
import * as jobWork from './job-work.contract.ts';
import * as jobs from './jobs.contract.ts';
import * as openWorkAddresses from './open-work-addresses.ts';
import * as addresses from './phone-addresses.ts';
import * as push from './push.contract.ts';
import * as runSheet from './run-sheet.contract.ts';
import * as session from './session.contract.ts';
import * as walkAddresses from './walk-round-addresses.ts';
import * as walkRound from './walk-round.contract.ts';

const contracts: Record<string, unknown> = {
  ...{ ...billing, ...clock, ...hours, ...jobs, ...jobWork, ...push },
  ...{ ...runSheet, ...session, ...walkRound },
};

test.each(Object.entries({ ...addresses, ...openWorkAddresses, ...walkAddresses }))(
  '%s is where its contract says',
  (name, { method, path }) => {
    expect(contracts[name.replace(/At$/, '')]).toMatchObject({ method, path });
  },
);
