import type { Coordinates } from '@driprail/shared/domain/board/travel';
import type { SizeClass } from '@driprail/shared/contracts/fields';
import { businesses, colors, firstNames, lastNames, wayIn, vehicleKinds } from './customer-words.ts';
import { areas, placeIn } from './places.ts';
import type { Area } from './places.ts';
import { at, randomFor } from './random.ts';
import type { Random } from './random.ts';
import type { DemoRows } from './rows.ts';

const CUSTOMERS = 180;
/** 555-0100 to 555-0199 are set aside for fiction in every area code; the first sixteen belong to the company. */
const FIRST_PHONE = 16;
/** No area code is 555, so these reach nobody either; whoever comes after has no phone and writes. */
const AREAS = ['', '(555) '] as const;

export interface DemoVehicle {
  id: string;
  sizeClass: SizeClass;
}

export interface DemoCustomer {
  id: string;
  name: string;
  isCompany: boolean;
  addressId: string;
  place: Coordinates;
  vehicles: DemoVehicle[];
}

/** Companies first, then households. */
export function writeCustomers(rows: DemoRows, ids: () => string): DemoCustomer[] {
  const random = randomFor('customers');
  return Array.from({ length: CUSTOMERS }, (_, index) => {
    const business = businesses[index];
    const number = index - businesses.length;
    return business
      ? writeCustomer(rows, ids, random, { ...business, index, isCompany: true })
      : writeCustomer(rows, ids, random, { name: householdName(number), index, isCompany: false });
  });
}

/** Each last name once with each of the first names that its turn comes to, so that no name is there twice. */
function householdName(number: number): string {
  const round = Math.floor(number / lastNames.length);
  const last = at(lastNames, number % lastNames.length);
  return `${at(firstNames, (number * 7 + round * 11) % firstNames.length)} ${last}`;
}

interface Spec {
  name: string;
  isCompany: boolean;
  index: number;
  area?: string;
  vehicles?: number;
}

function writeCustomer(rows: DemoRows, ids: () => string, random: Random, spec: Spec): DemoCustomer {
  const id = ids();
  const { name, isCompany, index } = spec;
  const slug = name.toLowerCase().replace(/[^a-z]+/g, isCompany ? '' : '.');
  const phone = phoneOf(index);
  rows.customers.push({
    id,
    name,
    isCompany,
    phone,
    email: isCompany ? `desk@${slug}.example` : random.chance(0.85) || phone === '' ? `${slug}@mail.example` : '',
    notes: isCompany ? 'Invoice at the end of the month.' : random.chance(0.12) ? random.pick(wayIn.wishes) : '',
  });
  const area = areas.find((one) => one.name === spec.area) ?? random.pick(areas);
  const address = writeAddress(rows, ids, random, id, area, isCompany);
  const count = spec.vehicles ?? (random.chance(0.38) ? 2 : 1);
  const vehicles = Array.from({ length: count }, (_, position) =>
    writeVehicle(rows, ids, random, { customerId: id, position, isCompany, number: rows.vehicles.length }),
  );
  return { id, name, isCompany, ...address, vehicles };
}

/** One for each customer, so that no two look like one. */
function phoneOf(index: number): string {
  const numbers = 100 - FIRST_PHONE;
  const area = AREAS[Math.floor(index / numbers)];
  return area === undefined ? '' : `${area}555-01${String(FIRST_PHONE + (index % numbers))}`;
}

function writeAddress(
  rows: DemoRows,
  ids: () => string,
  random: Random,
  customerId: string,
  area: Area,
  isCompany: boolean,
): { addressId: string; place: Coordinates } {
  const addressId = ids();
  const place = placeIn(area, random);
  rows.addresses.push({
    id: addressId,
    customerId,
    line: `${random.int(1, 96)} ${random.pick(area.streets)}`,
    city: 'Ternmouth',
    area: area.name,
    ...place,
    gateCode: random.chance(isCompany ? 0.5 : 0.22) ? String(random.int(1000, 9899)) : '',
    accessNotes: isCompany ? random.pick(wayIn.companies) : random.chance(0.45) ? random.pick(wayIn.households) : '',
    hasWater: random.chance(0.72),
    hasPower: random.chance(0.58),
  });
  return { addressId, place };
}

function writeVehicle(
  rows: DemoRows,
  ids: () => string,
  random: Random,
  {
    customerId,
    position,
    isCompany,
    number,
  }: { customerId: string; position: number; isCompany: boolean; number: number },
): DemoVehicle {
  const id = ids();
  const kind = random.pick(isCompany ? vehicleKinds.fleet : vehicleKinds.household);
  rows.vehicles.push({
    id,
    customerId,
    label: `${random.int(2012, 2025)} ${kind.label}`,
    color: random.pick(isCompany ? colors.fleet : colors.household),
    plate: `TM ${String(100 + ((number * 37) % 900))} ${String.fromCharCode(65 + (number % 23))}`,
    sizeClass: kind.sizeClass,
    notes: random.chance(0.07) ? random.pick(wayIn.vehicles) : '',
    position,
  });
  return { id, sizeClass: kind.sizeClass };
}
