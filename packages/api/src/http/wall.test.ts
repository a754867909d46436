import { beforeAll, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import type { Role } from '@driprail/shared/authz/actor';
import { useApp } from '../testing/app.ts';
import { aCompany } from '../testing/company.ts';
import type { TestCompany } from '../testing/company.ts';

const app = useApp();
let company: TestCompany;
let agents: Record<Role, TestAgent>;
beforeAll(async () => {
  company = await aCompany(app);
  agents = { owner: await company.owner(), dispatcher: await company.dispatcher(), technician: await company.sefa() };
});

const asked = (agent: TestAgent, method: string, path: string) => {
  const filled = path.replace(/:day|:startsOn/g, '2026-05-14').replace(/:\w+/g, '00000000-0000-7000-8000-000000000000');
  return agent[method as 'get'](filled);
};

describe('every endpoint', () => {
  test('answers 401 to nobody in particular, unless it is public', async () => {
    for (const { method, path, roles } of app.app.table.endpoints) {
      if (roles === 'public') continue;
      const answer = await asked(app.anonymous(), method, path);
      expect(`${method} ${path} ${answer.status}`).toBe(`${method} ${path} 401`);
    }
  });

  test('answers 403 to a role that may not ask, before it looks at the body', async () => {
    for (const { method, path, roles } of app.app.table.endpoints) {
      if (roles === 'public') continue;
      for (const role of ['dispatcher', 'technician', 'owner'] as const) {
        if (roles.includes(role)) continue;
        const answer = await asked(agents[role], method, path);
        expect(`${role} ${method} ${path} ${answer.status}`).toBe(`${role} ${method} ${path} 403`);
      }
    }
  });

  test('refuses a write that another site’s page sends', async () => {
    const { owner } = agents;
    await owner.delete('/api/session').set('origin', 'https://elsewhere.example').expect(403);
    await owner.delete('/api/session').set('sec-fetch-site', 'cross-site').expect(403);
    await owner.get('/api/session').expect(200);
  });
});

/** Keys under which a rate, a commission or an amount of pay would travel; the menu and discounts have percents of their own. */
const payWords = /rate|commission|hourly|gross|premium|(?<!deposit|price|minutes|discount)percent|"value"|wage/i;

test('a dispatcher’s answers hold no rate, commission or pay, nor a key for one', async () => {
  await agents.owner
    .post('/api/pay/rates')
    .send({
      kind: 'hourly',
      personId: company.people.sefa.id,
      serviceId: null,
      clockKind: null,
      value: '19.5',
      startsOn: '2026-01-01',
    })
    .expect(200);
  const { job } = await company.aJob();
  const paths = [
    '/api/board/2026-05-14',
    '/api/board/2026-05-14/week',
    `/api/jobs/${job.id}`,
    '/api/jobs?find=Naka',
    '/api/people',
    '/api/vans',
    '/api/customers',
    `/api/customers/${company.customer.id}`,
    '/api/services',
    '/api/settings',
    '/api/clock',
    '/api/clock/entries?from=2026-05-14&to=2026-05-14',
    '/api/pay/statements',
  ];
  for (const path of paths) {
    const answer = await agents.dispatcher.get(path).expect(200);
    expect(`${path} ${payWords.exec(answer.text)?.[0] ?? 'clean'}`).toBe(`${path} clean`);
  }
  for (const path of [
    '/api/pay/rates',
    '/api/pay/weeks',
    '/api/pay/weeks/2026-05-11',
    '/api/pay/weeks/2026-05-11/export.csv',
    '/api/pay/rules',
    '/api/pay/paydays',
    '/api/pay/weeks/2026-05-11/kinds.csv',
    '/api/pay/weeks/2026-05-11/export.zip',
    `/api/pay/people/${company.people.sefa.id}/export.zip`,
  ]) {
    await agents.dispatcher.get(path).expect(403);
  }
  await agents.dispatcher.get(`/api/pay/statements/2026-05-11/${company.people.sefa.id}`).expect(403);
  await agents.technician.get(`/api/pay/statements/2026-05-11/${company.people.idris.id}`).expect(403);
});
