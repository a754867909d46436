import type TestAgent from 'supertest/lib/agent.js';
import { v7 as uuid } from 'uuid';
import type { Actor, Role } from '@driprail/shared/authz/actor';
import { abilityFor } from '@driprail/shared/authz/ability';
import { User } from '../db/models/index.ts';
import { hashPassword } from '../features/access/index.ts';
import { createJob } from '../features/booking/index.ts';
import { createCustomer } from '../features/customers/index.ts';
import { createPerson, createVan, setVanCrew } from '../features/people/index.ts';
import { createService } from '../features/service-menu/index.ts';
import { setUpCompany } from '../features/settings/index.ts';
import type { Ctx } from '../http/context.ts';
import type { TestApp } from './app.ts';

export const PASSWORD = 'wash-top-down';
const ZONE = 'America/New_York';

/** A small company in one database: an owner, a dispatcher, two technicians, two vans, one service, one customer. */
export async function aCompany(test: TestApp) {
  const now = () => new Date(test.time.now);
  const ownerUser = await setUpCompany(
    {
      companyName: 'Tern & Tide',
      zone: ZONE,
      ownerName: 'Rowan Tern',
      email: 'owner@ternandtide.example',
      password: PASSWORD,
    },
    now,
  );
  const ctx: Ctx = contextOf({ userId: ownerUser.id, personId: null, role: 'owner' }, 'Rowan Tern', now);
  const person = (name: string, skills: 'correction'[] = []) =>
    createPerson(ctx, { name, phone: '555-0101', skills, isTrainee: false, isActive: true, sharesTips: true });
  const maren = await person('Maren Holt');
  const sefa = await person('Sefa Lund');
  const idris = await person('Idris Vale', ['correction']);
  const van = (name: string, position: number) =>
    createVan(ctx, { name, plate: '', equipment: [], notes: '', position, isActive: true });
  const gannet = await van('Gannet', 0);
  const plover = await van('Plover', 1);
  const shift = { from: '2026-05-14T11:30:00.000Z', to: '2026-05-14T22:00:00.000Z' };
  await setVanCrew(ctx, gannet.id, '2026-05-14', [{ personId: sefa.id, ...shift }]);
  await setVanCrew(ctx, plover.id, '2026-05-14', [{ personId: idris.id, ...shift }]);
  const wash = await createService(ctx, {
    name: 'Wash and wax',
    kind: 'package',
    description: '',
    skills: [],
    equipment: [],
    // Most tests are about something else than the walk-round.
    photoSet: 'none',
    isActive: true,
    position: 0,
    startsOn: '2026-01-01',
    prices: [{ sizeClass: 'sedan', priceCents: 24_000, minutes: 90 }],
  });
  const customer = await createCustomer(ctx, aCustomer('Nakagawa'));
  await login('dispatch@ternandtide.example', 'Maren Holt', 'dispatcher', maren.id);
  await login('sefa@ternandtide.example', 'Sefa Lund', 'technician', sefa.id);
  await login('idris@ternandtide.example', 'Idris Vale', 'technician', idris.id);
  const signIn = async (email: string): Promise<TestAgent> => {
    const agent = test.anonymous();
    await agent.post('/api/session').send({ email, password: PASSWORD }).expect(200);
    return agent;
  };
  return {
    ctx,
    zone: ZONE,
    people: { maren, sefa, idris },
    vans: { gannet, plover },
    wash,
    customer,
    owner: () => signIn('owner@ternandtide.example'),
    dispatcher: () => signIn('dispatch@ternandtide.example'),
    sefa: () => signIn('sefa@ternandtide.example'),
    idris: () => signIn('idris@ternandtide.example'),
    /** A job of one line on the customer's car; its visit is unplaced. */
    aJob: async () => {
      const job = await createJob(ctx, {
        customerId: customer.id,
        addressId: first(customer.addresses).id,
        windowFrom: '2026-05-14T13:00:00.000Z',
        windowTo: '2026-05-14T17:00:00.000Z',
        notes: '',
        discountCents: 0,
        discountReason: '',
        lines: [{ serviceId: wash.id, vehicleId: first(customer.vehicles).id, sizeClass: 'sedan' }],
      });
      return { job, visit: first(job.visits) };
    },
  };
}
export type TestCompany = Awaited<ReturnType<typeof aCompany>>;

export function contextOf(actor: Actor, name: string, now: () => Date): Ctx {
  return { actor, name, ability: abilityFor(actor), now };
}

export function aCustomer(name: string) {
  return {
    name,
    isCompany: false,
    phone: '555-0142',
    email: '',
    notes: '',
    addresses: [
      {
        line: '14 Saltpan Lane',
        city: 'Ternmouth',
        postcode: '',
        area: 'Saltpan Lane',
        lat: 41.2,
        lng: -70.1,
        gateCode: '4471',
        accessNotes: 'Dog, shut the gate',
        hasWater: true,
        hasPower: false,
      },
    ],
    vehicles: [{ label: '2019 hatchback', color: 'grey', plate: 'TT 014', sizeClass: 'sedan' as const, notes: '' }],
  };
}

export function first<T>(list: readonly T[]): T {
  const [item] = list;
  if (item === undefined) throw new Error('the list is empty');
  return item;
}

async function login(email: string, name: string, role: Role, personId: string): Promise<void> {
  await User.create({ id: uuid(), name, email, passwordHash: await hashPassword(PASSWORD), role, personId });
}
