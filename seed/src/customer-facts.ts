import type { Channel } from '@driprail/shared/domain/customer/consent';
import { addDays } from '@driprail/shared/domain/time/zone';
import { nameFromLabel } from '@driprail/shared/domain/vehicle/vehicle-name';
import { readVin } from '@driprail/shared/domain/vehicle/vin';
import { YEAR_CODES_NOT_USED } from '@driprail/shared/domain/vehicle/model-year';
import { instant, minuteOf } from './calendar.ts';
import { wayIn } from './customer-words.ts';
import type { Book } from './job-rows.ts';
import type { DemoPeople } from './people.ts';
import { at, randomFor } from './random.ts';
import type { Random } from './random.ts';
import type { DemoRows } from './rows.ts';

/** What a company comes to know of its customers over time; names, streets and cars stand already. */
export function writeCustomerFacts(book: Book, people: DemoPeople): void {
  const companies = new Set(book.rows.customers.filter(({ isCompany }) => isCompany).map(({ id }) => id));
  const places = randomFor('places');
  const cars = randomFor('cars');
  for (const address of book.rows.addresses)
    tellPlace(places, address, companies.has(address.customerId), book.calendar.today);
  for (const vehicle of book.rows.vehicles) tellVehicle(cars, vehicle);
  tellCustomers(book, people);
  repeatOne(book.rows);
}

function tellPlace(places: Random, address: DemoRows['addresses'][number], isCompany: boolean, today: string): void {
  address.label = isCompany ? 'Lot' : 'Home';
  const isStorm = address.accessNotes?.startsWith('Storm drain') ?? false;
  address.drain = isStorm ? 'storm' : places.pick(['unknown', 'unknown', 'sewer', 'sewer', 'soakaway'] as const);
  const waters = isCompany ? (['reclaim', 'mat', 'wash_bay'] as const) : (['mat', 'lawn', null] as const);
  address.washWater = isStorm ? 'lawn' : places.pick<'reclaim' | 'mat' | 'lawn' | 'wash_bay' | null>(waters);
  // Rows written together have the same columns.
  Object.assign(address, { permitNumber: '', permitUntil: null, ownerConsentBy: '', ownerConsentOn: null });
  if (!isCompany) return;
  address.ownerConsentBy = places.pick(['Facilities desk', 'Site manager', 'Front office']);
  address.ownerConsentOn = addDays(today, -places.int(40, 400));
  if (!places.chance(0.4)) return;
  address.permitNumber = `TM-${places.int(100, 899)}`;
  address.permitUntil = addDays(today, places.int(-20, 300));
}

function tellVehicle(cars: Random, vehicle: DemoRows['vehicles'][number]): void {
  const name = nameFromLabel(vehicle.label);
  Object.assign(vehicle, name, { vin: '', paint: '', interior: '' });
  vehicle.wheelFinish = cars.pick([
    'unsure',
    'unsure',
    'painted',
    'clear_coated',
    'powder_coated',
    'polished',
  ] as const);
  if (name.year !== null && cars.chance(0.5)) vehicle.vin = madeUpVin(cars, name.year);
  if (vehicle.notes === 'Thin paint on the hood edge.' || vehicle.notes === 'Soft clear coat.') {
    vehicle.paint = vehicle.notes;
    vehicle.notes = '';
  }
  if (vehicle.notes === 'Child seat stays in.') {
    vehicle.interior = vehicle.notes;
    vehicle.notes = '';
  }
}

/** A number that no maker has (none begins with 0, from memory of ISO 3780), with a right year code and check digit. */
function madeUpVin(cars: Random, year: number): string {
  const codes = [...'ABCDEFGHIJKLMNOPQRSTUVWXYZ'].filter(
    (code) => !(YEAR_CODES_NOT_USED as readonly string[]).includes(code),
  );
  const draft = `0TM${cars.int(100, 999)}A00${at(codes, year - 2010)}T${cars.int(100_000, 999_999)}`;
  const reading = readVin(draft);
  if (reading.kind !== 'checked') throw new Error(`${draft} can’t be read as a VIN`);
  return `${draft.slice(0, 8)}${reading.shouldBe}${draft.slice(9)}`;
}

const hows = ['On the web', 'At the car', 'By phone'] as const;

function tellCustomers({ rows, ids, calendar }: Book, people: DemoPeople): void {
  const random = randomFor('customer facts');
  const leads = people.technicians.filter(({ skills }) => skills.includes('lead'));
  for (const customer of rows.customers) {
    customer.tags = customer.isCompany
      ? ['Fleet', ...(random.chance(0.3) ? ['On account'] : [])]
      : random.chance(0.2)
        ? [random.pick(['Every month', 'Early bird', 'Weekends', 'Show car'])]
        : [];
    if (customer.notes === at(wayIn.wishes, 2))
      rows.customerCrew.push({ customerId: customer.id, personId: random.pick(leads).id, position: 0 });
    const answer = (channel: Channel, isGiven: boolean) => {
      const givenOn = addDays(calendar.today, -random.int(30, 500));
      rows.customerConsents.push({
        ...{ id: ids(), customerId: customer.id, channel, isGiven, givenOn, how: random.pick(hows) },
        recordedAt: instant(givenOn, minuteOf('15:00')),
      });
    };
    if (customer.email && random.chance(0.7)) answer('mail', true);
    if (customer.phone && random.chance(0.55)) answer('text', random.chance(0.85));
  }
}

/** The last household booked once more under an initial: a likely duplicate of another, for somebody to find. */
function repeatOne({ customers, addresses }: DemoRows): void {
  const last = customers.at(-1);
  const twin = customers.find(({ name }) => name.endsWith('Galloway'));
  const home = addresses.find(({ customerId }) => customerId === twin?.id);
  const copy = addresses.find(({ customerId }) => customerId === last?.id);
  if (!last || !twin || !home || !copy) throw new Error('the demo has no customer to repeat');
  last.name = `${twin.name.slice(0, 1)}. ${twin.name.split(' ').at(-1) ?? ''}`;
  last.phone = twin.phone ?? '';
  last.email = '';
  Object.assign(copy, { line: home.line, area: home.area, lat: home.lat, lng: home.lng });
}
