import type { BrowserContext } from 'playwright-core';

import type { Stage } from './stage.ts';

const PASSWORD = 'wash-top-down';

/**
 * Sets an empty server up through the API: one van, one service, one customer with a sedan.
 * @returns its owner's browser, signed in, and what books a job that waits on Unplaced
 */
export async function aSmallCompany(stage: Stage): Promise<{ owner: BrowserContext; bookJob: () => Promise<string> }> {
  const owner = await stage.visit();
  const post = async <T>(path: string, data: object): Promise<T> => {
    const answer = await owner.request.post(path, { data });
    if (!answer.ok()) throw new Error(`${path} answered ${answer.status()}: ${await answer.text()}`);
    return (await answer.json()) as T;
  };
  await post('/api/set-up', {
    ...{ companyName: 'Cinder Row Detailing', zone: 'America/New_York', ownerName: 'Ansel Brook' },
    ...{ email: 'owner@cinderrow.example', password: PASSWORD, code: setUpCodeOf(stage) },
  });
  await post('/api/vans', { name: 'Heron', plate: '', equipment: [], notes: '', position: 0, isActive: true });
  const { service } = await post<{ service: { id: string } }>('/api/services', {
    ...{ name: 'Hand wash', kind: 'package', description: '', skills: [], equipment: [], isActive: true, position: 0 },
    ...{ startsOn: '2026-01-01', prices: [{ sizeClass: 'sedan', priceCents: 9000, minutes: 60 }] },
  });
  const address = { line: '3 Kiln Yard', city: 'Ternmouth', postcode: '', area: '', lat: null, lng: null };
  const { customer } = await post<{
    customer: { id: string; addresses: { id: string }[]; vehicles: { id: string }[] };
  }>('/api/customers', {
    ...{ name: 'Orla Finch', isCompany: false, phone: '555-0148', email: '', notes: '' },
    addresses: [{ ...address, gateCode: '', accessNotes: '', hasWater: true, hasPower: true }],
    vehicles: [{ label: '2020 sedan', color: 'gray', plate: '', sizeClass: 'sedan', notes: '' }],
  });
  const bookJob = async () => {
    const { job } = await post<{ job: { visits: { id: string }[] } }>('/api/jobs', {
      ...{ customerId: customer.id, addressId: customer.addresses[0]?.id, windowFrom: null, windowTo: null },
      ...{ notes: '', discountCents: 0, discountReason: '' },
      lines: [{ serviceId: service.id, vehicleId: customer.vehicles[0]?.id, sizeClass: 'sedan' }],
    });
    return job.visits[0]?.id ?? '';
  };
  return { owner, bookJob };
}

/** The one-time code that the terminal shows. */
export function setUpCodeOf({ server }: Stage): string {
  const code = /one-time code: (\S+)/.exec(server.output())?.[1];
  if (!code) throw new Error(`No code in what the server printed:\n${server.output()}`);
  return code;
}
