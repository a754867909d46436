import { beforeAll, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import type { CustomerDto, ListedCustomer } from '@driprail/shared/contracts/customers.contract';
import { useApp } from '../../testing/app.ts';
import { aCompany, aCustomer, first } from '../../testing/company.ts';
import type { TestCompany } from '../../testing/company.ts';

const app = useApp();
let company: TestCompany;
let dispatcher: TestAgent;
let technician: TestAgent;
beforeAll(async () => {
  company = await aCompany(app);
  [dispatcher, technician] = await Promise.all([company.dispatcher(), company.sefa()]);
});

const add = async (more: object): Promise<CustomerDto> =>
  (
    (
      await dispatcher
        .post('/api/customers')
        .send({ ...aCustomer('Somebody'), ...more })
        .expect(200)
    ).body as { customer: CustomerDto }
  ).customer;
const found = async (find: string, more = ''): Promise<string[]> => {
  const answer = await dispatcher.get(`/api/customers?find=${encodeURIComponent(find)}${more}`).expect(200);
  return (answer.body as { customers: ListedCustomer[] }).customers.map(({ name }) => name);
};
const refusal = ({ body }: { body: unknown }) =>
  (body as { error: { message: string; fields: Record<string, string> } }).error;

describe('one box finds a customer', () => {
  beforeAll(async () => {
    await add({
      ...{ name: "Máire O'Dell", phone: '+1 (555) 555-0181', email: 'maire@quay.example', tags: ['Fleet discount'] },
      addresses: [{ ...first(aCustomer('x').addresses), label: 'Boathouse', line: '9 Quay Éist', area: 'Old Slip' }],
      vehicles: [{ ...first(aCustomer('x').vehicles), plate: 'QX-77 b', vin: '1m8gdm9ax kp042788' }],
    });
    await add({ name: 'نُورا الحَدّاد', phone: '555-0182' });
    await add({ name: 'שרה לוי', phone: '555.0183' });
  });

  test.each([
    ['any part of the name', 'dell'],
    ['an apostrophe typed or left out', 'o’dell'],
    ['without the accent', 'maire'],
    ['words in any order', 'quay maire'],
    ['the phone as it is dialled', '5555550181'],
    ['the phone in another form', '1-555-555-0181'],
    ['a part of the phone', '555-0181'],
    ['the e-mail', 'quay.example'],
    ['the plate without its signs', 'qx77'],
    ['the plate with other signs', 'QX 77-B'],
    ['the VIN', '1M8GDM9AXKP042788'],
    ['the end of the VIN', '042788'],
    ['a tag', 'fleet'],
    ['the street without the accent', '9 quay eist'],
    ['what the address is called', 'boathouse'],
  ])('by %s: %s', async (_what, find) => {
    expect(await found(find)).toEqual(["Máire O'Dell"]);
  });

  test('in letters that run from right to left, with or without points', async () => {
    expect(await found('نورا')).toEqual(['نُورا الحَدّاد']);
    expect(await found('לוי')).toEqual(['שרה לוי']);
  });

  test('a percent sign and an underscore are letters, and nobody is nobody', async () => {
    for (const find of ['%', '_', 'nobody of that name']) expect(await found(find)).toEqual([]);
  });

  test('a changed plate is found, and a technician may not ask', async () => {
    const customer = await add({ name: 'Plate Changer' });
    const { id, version, ...fields } = customer;
    const vehicles = fields.vehicles.map((vehicle) => ({ ...vehicle, plate: 'ZZ 900' }));
    await dispatcher
      .put(`/api/customers/${id}`)
      .send({ ...fields, vehicles, version })
      .expect(200);
    expect(await found('zz900')).toEqual(['Plate Changer']);
    await technician.get('/api/customers?find=zz900').expect(403);
  });

  test('a long list comes in pages', async () => {
    for (const number of [1, 2, 3, 4, 5]) await add({ name: `Paged ${number}`, phone: '' });
    expect(await found('paged', '&limit=2')).toEqual(['Paged 1', 'Paged 2']);
    expect(await found('paged', '&limit=2&offset=2')).toEqual(['Paged 3', 'Paged 4']);
    expect(await found('paged', '&limit=2&offset=4')).toEqual(['Paged 5']);
  });
});

test('the list says what is next, and goes by the last visit when asked', async () => {
  await company.aJob();
  const answer = await dispatcher.get('/api/customers?find=Nakagawa&by=visit').expect(200);
  expect(first((answer.body as { customers: ListedCustomer[] }).customers).standing).toEqual({
    at: null,
    progress: 'unplaced',
  });
});

describe('the record', () => {
  test('keeps what is known of a place and a car', async () => {
    const place = { drain: 'storm', washWater: 'mat', permitNumber: 'TM-204', permitUntil: '2027-03-31' };
    const consent = { ownerConsentBy: 'Harbor Office', ownerConsentOn: '2026-05-01' };
    const car = {
      year: 2019,
      make: 'Handmade',
      model: 'hatchback',
      wheelFinish: 'polished',
      paint: 'Thin on the hood',
    };
    const customer = await add({
      name: 'Whole Record',
      addresses: [{ ...first(aCustomer('x').addresses), ...place, ...consent }],
      vehicles: [{ ...first(aCustomer('x').vehicles), ...car, vin: '1m8gdm9ax-kp042788', label: undefined }],
      preferredCrew: [company.people.idris.id, company.people.sefa.id],
      consents: [{ channel: 'text', isGiven: true, on: '2026-05-14', how: 'At the car' }],
    });
    expect(first(customer.addresses)).toMatchObject({ ...place, ...consent });
    expect(first(customer.vehicles)).toMatchObject({
      ...car,
      vin: '1M8GDM9AXKP042788',
      label: '2019 Handmade hatchback',
    });
    expect(customer.preferredCrew).toEqual([company.people.idris.id, company.people.sefa.id]);
    expect(customer.consents).toEqual([{ channel: 'text', isGiven: true, on: '2026-05-14', how: 'At the car' }]);
    expect(await company.dispatcher().then((agent) => agent.get('/api/customer-words/vehicles'))).toMatchObject({
      body: { makes: ['Handmade'], models: ['hatchback'] },
    });
  });

  test('a car named in one piece gets its year, and wheels nobody looked at are unsure', async () => {
    const customer = await add({ name: 'One Piece' });
    expect(first(customer.vehicles)).toMatchObject({ year: 2019, model: 'hatchback', wheelFinish: 'unsure' });
  });

  test.each([
    ['a note over 10,000 letters', { notes: 'x'.repeat(10_001) }, 'notes', '10,001'],
    ['an e-mail address without a name', { email: '@mail.example' }, 'email', 'name@company.example'],
    ['an open quotation mark', { email: '"a b@mail.example' }, 'email', 'name@company.example'],
    ['a latitude alone', { addresses: [{ ...first(aCustomer('x').addresses), lng: null }] }, 'addresses.0.lng', 'both'],
    [
      'a latitude of 95',
      { addresses: [{ ...first(aCustomer('x').addresses), lat: 95 }] },
      'addresses.0.lat',
      'from -90 to 90',
    ],
    [
      'a consent without its day',
      { addresses: [{ ...first(aCustomer('x').addresses), ownerConsentBy: 'Ada' }] },
      'addresses.0.ownerConsentOn',
      'which day',
    ],
    [
      'a permit until February 30',
      { addresses: [{ ...first(aCustomer('x').addresses), permitUntil: '2026-02-30' }] },
      'addresses.0.permitUntil',
      'Give a date',
    ],
    [
      'a vehicle without a word',
      { vehicles: [{ ...first(aCustomer('x').vehicles), label: ' ' }] },
      'vehicles.0.model',
      'which',
    ],
  ])('%s is refused at its field', async (_what, more, field, words) => {
    const answer = await dispatcher
      .post('/api/customers')
      .send({ ...aCustomer('Refused'), ...more })
      .expect(400);
    expect(refusal(answer).fields[field]).toContain(words);
    expect(await found('Refused')).toEqual([]);
  });

  test('a consent of tomorrow is refused at its field', async () => {
    const consents = [{ channel: 'text', isGiven: true, on: '2026-05-15', how: 'By phone' }];
    const answer = await dispatcher
      .post('/api/customers')
      .send({ ...aCustomer('Refused'), consents })
      .expect(422);
    expect(refusal(answer).fields['consents.0.on']).toContain('today at the latest');
  });

  test('10,000 letters of notes and an e-mail address with a quoted part are taken as they are', async () => {
    const customer = await add({ name: 'Long Winded', notes: 'x'.repeat(10_000), email: '"a b"@example.com' });
    expect(customer.notes).toHaveLength(10_000);
    expect(customer.email).toBe('"a b"@example.com');
  });
});

describe('the map', () => {
  const ask = (line: string) => dispatcher.post('/api/customer-places').send({ line, city: 'Ternmouth', postcode: '' });

  test('places an address within the town, the same each time', async () => {
    const answer = await ask('14 Saltpan Lane').expect(200);
    expect((await ask(' 14 SALTPAN LANE').expect(200)).body).toEqual(answer.body);
    const { lat, lng } = answer.body as { lat: number; lng: number };
    expect(Math.abs(lat - 40.62)).toBeLessThan(0.04);
    expect(Math.abs(lng + 70.35)).toBeLessThan(0.05);
  });

  test('says so when it does not know one', async () => {
    expect(refusal(await ask('somewhere').expect(422)).fields.line).toContain('Type latitude and longitude');
  });
});
