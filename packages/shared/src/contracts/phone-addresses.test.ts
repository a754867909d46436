import { expect, test } from 'vitest';
import * as clock from './clock.contract.ts';
import * as hours from './hours.contract.ts';
import * as jobWork from './job-work.contract.ts';
import * as jobs from './jobs.contract.ts';
import * as addresses from './phone-addresses.ts';
import * as runSheet from './run-sheet.contract.ts';
import * as session from './session.contract.ts';

const contracts: Record<string, unknown> = { ...clock, ...hours, ...jobs, ...jobWork, ...runSheet, ...session };

test.each(Object.entries(addresses))('%s is where its contract says', (name, { method, path }) => {
  expect(contracts[name.replace(/At$/, '')]).toMatchObject({ method, path });
});
