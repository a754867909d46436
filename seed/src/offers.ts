import type { DemoCustomer, DemoVehicle } from './customers.ts';
import type { Menu, ServiceName } from './menu.ts';
import { isPaintWork, onMenu } from './menu.ts';
import type { Random } from './random.ts';
import type { VanDay } from './vans.ts';

export interface PlannedItem {
  vehicle: DemoVehicle;
  service: ServiceName;
}

/** What is asked for together and how often, by weight; invented. Paint work is asked for more often than it can be done. */
const bundles: { services: ServiceName[]; weight: number }[] = [
  { services: ['Maintenance wash'], weight: 24 },
  { services: ['Wash and wax'], weight: 19 },
  { services: ['Inside and out'], weight: 15 },
  { services: ['Inside and out', 'Pet hair'], weight: 5 },
  { services: ['Full interior'], weight: 10 },
  { services: ['Full interior', 'Leather care'], weight: 4 },
  { services: ['Full interior', 'Odor treatment'], weight: 3 },
  { services: ['Wash and wax', 'Clay lube decontamination'], weight: 5 },
  { services: ['Wash and wax', 'Engine bay'], weight: 3 },
  { services: ['Maintenance wash', 'Headlight restoration'], weight: 3 },
  { services: ['Wheels-off detail'], weight: 2 },
  { services: ['One-step polish'], weight: 16 },
  { services: ['Two-step polish'], weight: 11 },
  { services: ['Ceramic coating, one layer'], weight: 12 },
];

/** A customer's order that this crew and van can do; null when the draw was one they can't. */
export function offers(
  customer: DemoCustomer,
  { van, crew }: VanDay,
  menu: Menu,
  random: Random,
  isPolished: (vehicle: DemoVehicle) => boolean,
): PlannedItem[] | null {
  const skills = new Set(crew.filter((person) => !person.isTrainee).flatMap((person) => person.skills));
  if (customer.isCompany) {
    return customer.vehicles.slice(0, random.int(2, 3)).map((vehicle) => ({ vehicle, service: 'Maintenance wash' }));
  }
  const vehicle = random.pick(customer.vehicles);
  const services = drawn(random);
  const isPossible = services.every((name) => {
    const { skills: needed, equipment, prices } = onMenu(menu, name);
    const isSold = prices[vehicle.sizeClass] !== undefined;
    const isTwice = isPaintWork(menu, name) && isPolished(vehicle);
    const canDo = needed.every((skill) => skills.has(skill)) && equipment.every((tool) => van.equipment.includes(tool));
    return isSold && !isTwice && canDo;
  });
  return isPossible ? services.map((service) => ({ vehicle, service })) : null;
}

function drawn(random: Random): ServiceName[] {
  let left = random.next() * bundles.reduce((sum, { weight }) => sum + weight, 0);
  const bundle = bundles.find(({ weight }) => (left -= weight) < 0);
  return bundle?.services ?? ['Maintenance wash'];
}
