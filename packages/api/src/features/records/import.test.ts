import { readFileSync } from 'node:fs';
import { beforeAll, describe, expect, test } from 'vitest';
import { Customer, Job } from '../../db/models/index.ts';
import { createService } from '../service-menu/index.ts';
import { useApp } from '../../testing/app.ts';
import { aCompany } from '../../testing/company.ts';
import { importCsv } from './import.service.ts';

const app = useApp();
const now = () => new Date(app.time.now);
const sample = (name: string) =>
  readFileSync(new URL(`../../../../../docs/samples/${name}.csv`, import.meta.url), 'utf8');
beforeAll(async () => {
  const { ctx } = await aCompany(app);
  for (const name of ['Pet hair', 'Maintenance wash']) {
    const prices = (['sedan', 'van'] as const).map((sizeClass) => ({ sizeClass, priceCents: 3000, minutes: 30 }));
    await createService(ctx, {
      name,
      kind: 'add_on',
      description: '',
      skills: [],
      equipment: [],
      isActive: true,
      position: 9,
      startsOn: '2026-01-01',
      prices,
    });
  }
});

describe('a list of customers', () => {
  test('is tried dry, then loaded whole', async () => {
    const before = await Customer.count();
    expect(await importCsv('customers', sample('customers'), { isDry: true, now })).toEqual({
      rows: 3,
      made: 2,
      complaints: [],
    });
    expect(await Customer.count()).toBe(before);
    await importCsv('customers', sample('customers'), { isDry: false, now });
    expect(await Customer.count()).toBe(before + 2);
  });

  test('is refused whole, with every bad row’s line and reason', async () => {
    const before = await Customer.count();
    // A byte-order mark, mixed line ends, an apostrophe and right-to-left letters are right handling; the rest is wrong.
    const text =
      '\uFEFFname,phone,street,spigot,vehicle,size_class,lat\r\n' +
      "Máire O'Dell,555-0181,1 Quay,yes,2019 van,van,41.2\n" +
      'نورا,555-0182,2 Quay,,,,\r' +
      ',555-0183,3 Quay,maybe,,,\r\n' +
      'Ada,5x,,no,2019 van,boat,200\n' +
      'Wren Calloway,555-0171,3 Capstan Court,no,,,\n';
    const { complaints, made } = await importCsv('customers', text, { isDry: false, now });
    expect(made).toBe(0);
    expect(complaints.map((c) => c.line)).toEqual([4, 4, 5, 5, 5, 6]);
    expect(complaints.map((c) => c.reason).join(' ')).toMatch(
      /name: .*spigot: .*street: .*lat: .*size_class: .*on record already/,
    );
    expect(await Customer.count()).toBe(before);
  });

  test('with a column nobody knows, or no CSV at all, says so', async () => {
    const { complaints } = await importCsv('customers', 'name,street,shoe size\nAda,1 Quay,40\n', {
      isDry: false,
      now,
    });
    expect(complaints).toEqual([{ line: 2, reason: 'There is no column shoe size.' }]);
    await expect(importCsv('customers', 'name,street\n"Ada,1 Quay\n', { isDry: false, now })).rejects.toThrow(
      /can’t be read as CSV/,
    );
  });
});

test('a list of jobs lands on Unplaced, or nothing of it does', async () => {
  expect(await importCsv('jobs', sample('jobs'), { isDry: false, now })).toEqual({ rows: 3, made: 2, complaints: [] });
  const before = await Job.count();
  const text = [
    'ref,customer,street,service,plate,size_class,price,date,from,to,notes',
    'B1,Wren Calloway,,Wash and wax,TT 118 A,,,,,,',
    'B2,Nobody,,Wash and wax,,,,,,,',
    'B3,Wren Calloway,,Wheel polish,TT 118 A,,,2027-01-02,11:00,10:00,',
    'B4,Wren Calloway,,Wash and wax,TT 118 A,coupe,,,,,',
  ].join('\n');
  const { complaints } = await importCsv('jobs', text, { isDry: false, now });
  expect(complaints).toEqual([
    { line: 3, reason: 'No customer is called Nobody.' },
    { line: 3, reason: 'Give a size class: no vehicle says it.' },
    { line: 4, reason: 'The window must end after it starts.' },
    { line: 4, reason: 'Wheel polish is not on the service menu.' },
    { line: 5, reason: expect.stringContaining('not on the menu for coupe') as string },
  ]);
  expect(await Job.count()).toBe(before);
});
