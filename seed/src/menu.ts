import type { Equipment, SizeClass, Skill } from '@driprail/shared/contracts/fields';
import { sizeClasses } from '@driprail/shared/contracts/fields';
import { usualPhotoSet } from '@driprail/shared/domain/walk-round/views';
import type { DemoRows } from './rows.ts';

export interface MenuEntry {
  id: string;
  name: ServiceName;
  skills: readonly Skill[];
  equipment: readonly Equipment[];
  prices: Partial<Record<SizeClass, { priceCents: number; minutes: number }>>;
}

export type Menu = ReadonlyMap<ServiceName, MenuEntry>;
export type ServiceName = (typeof entries)[number]['name'];

/** Prices in dollars and minutes of one person, for coupe, sedan, small SUV, large SUV or truck, van; invented. */
const entries = [
  {
    name: 'Maintenance wash',
    kind: 'package',
    description: 'Outside by hand, wheels and glass. For cars we see every four weeks.',
    dollars: [62, 68, 74, 86, 92],
    minutes: [50, 55, 60, 70, 75],
  },
  {
    name: 'Wash and wax',
    kind: 'package',
    description: 'Hand wash, wheels, dry, a coat of wax.',
    dollars: [115, 129, 139, 159, 165],
    minutes: [80, 90, 95, 110, 115],
  },
  {
    name: 'Inside and out',
    kind: 'package',
    description: 'Maintenance wash, vacuum, dash, doors and glass inside.',
    dollars: [139, 149, 165, 189, 199],
    minutes: [95, 105, 115, 130, 140],
  },
  {
    name: 'Full interior',
    kind: 'package',
    description: 'Seats and carpets extracted, every surface wiped, glass.',
    skills: ['interior'],
    equipment: ['extractor'],
    dollars: [149, 159, 169, 185, 199],
    minutes: [110, 120, 130, 150, 165],
  },
  {
    name: 'Clay lube decontamination',
    kind: 'single',
    description: 'Iron and tar off, then clay with lube until the paint is smooth.',
    dollars: [95, 105, 115, 130, 140],
    minutes: [60, 65, 70, 80, 85],
  },
  {
    name: 'One-step polish',
    kind: 'single',
    description: 'Light swirls out and gloss up in one pass. Shade or a garage.',
    skills: ['correction'],
    equipment: ['polisher'],
    dollars: [265, 280, 295, 330],
    minutes: [150, 165, 175, 200],
  },
  {
    name: 'Two-step polish',
    kind: 'single',
    description: 'Cut, then finish. Paint is measured first. Shade or a garage.',
    skills: ['correction'],
    equipment: ['polisher'],
    dollars: [420, 460, 495, 560],
    minutes: [270, 300, 315, 350],
  },
  {
    name: 'Ceramic coating, one layer',
    kind: 'single',
    description: 'Decontaminated, wiped down, one layer. Stays dry for twelve hours after.',
    skills: ['coating'],
    equipment: ['polisher'],
    dollars: [520, 560, 595, 660, 690],
    minutes: [330, 370, 390, 430, 460],
  },
  {
    name: 'Wheels-off detail',
    kind: 'single',
    description: 'Wheels off, barrels and wells cleaned, sealed.',
    equipment: ['water_tank'],
    dollars: [160, 170, 180, 200, 210],
    minutes: [90, 95, 100, 110, 115],
  },
  {
    name: 'Headlight restoration',
    kind: 'add_on',
    description: 'A pair, sanded, polished and sealed.',
    equipment: ['polisher'],
    dollars: [48, 48, 48, 48, 48],
    minutes: [40, 40, 40, 40, 40],
  },
  {
    name: 'Leather care',
    kind: 'add_on',
    description: 'Seats cleaned and fed.',
    skills: ['interior'],
    dollars: [40, 45, 52, 65, 70],
    minutes: [25, 30, 35, 45, 50],
  },
  {
    name: 'Pet hair',
    kind: 'add_on',
    description: 'Lifted from seats and carpets.',
    dollars: [30, 35, 40, 45, 45],
    minutes: [20, 25, 30, 35, 35],
  },
  {
    name: 'Odor treatment',
    kind: 'add_on',
    description: 'Source cleaned with steam, then treated. Car stays empty for 45 minutes after.',
    skills: ['interior'],
    equipment: ['steamer'],
    dollars: [90, 95, 105, 115, 125],
    minutes: [60, 65, 70, 80, 80],
  },
  {
    name: 'Engine bay',
    kind: 'add_on',
    description: 'Cold engine only. Covered, degreased, dressed.',
    dollars: [55, 55, 60, 65, 70],
    minutes: [30, 30, 35, 40, 40],
  },
] as const;

interface Needs {
  skills?: readonly Skill[];
  equipment?: readonly Equipment[];
}

/** What some ask of the weather and what comes after; 50 and 90 °F. Invented house rules, the label of a product comes first. */
const facts: Partial<Record<ServiceName, Partial<DemoRows['services'][number]>>> = {
  'Maintenance wash': { intervalDays: 28 },
  'Wash and wax': { coldestTenths: 44, intervalDays: 90 },
  'Two-step polish': { needsDry: true, depositPercent: 20 },
  'Ceramic coating, one layer': {
    ...{ needsDry: true, coldestTenths: 100, hottestTenths: 322, cureHours: 12, intervalDays: 365, depositPercent: 25 },
  },
  'Full interior': { intervalDays: 180 },
};

/** Writes the service menu and gives it back by name. */
export function writeMenu(rows: DemoRows, ids: () => string, startsOn: string): Menu {
  const menu = new Map<ServiceName, MenuEntry>();
  for (const [position, entry] of entries.entries()) {
    const { skills = [], equipment = [] } = entry as Needs;
    const id = ids();
    const { name, kind, description } = entry;
    rows.services.push({
      ...{ id, name, kind, description, position, photoSet: usualPhotoSet(kind) },
      ...{ skills: [...skills], equipment: [...equipment] },
      // Rows are written together: what one names, all name.
      ...{ needsDry: false, cureHours: 0, depositPercent: 0, ...facts[name] },
    });
    const prices: MenuEntry['prices'] = {};
    for (const [index, sizeClass] of sizeClasses.entries()) {
      const [dollars, minutes] = [entry.dollars[index], entry.minutes[index]];
      if (dollars === undefined || minutes === undefined) continue; // Not sold for that size.
      prices[sizeClass] = { priceCents: dollars * 100, minutes };
      rows.servicePrices.push({ serviceId: id, sizeClass, startsOn, priceCents: dollars * 100, minutes });
    }
    menu.set(name, { id, name, skills, equipment, prices });
  }
  return menu;
}

/** @throws when the menu has no such service */
export function onMenu(menu: Menu, name: ServiceName): MenuEntry {
  const entry = menu.get(name);
  if (!entry) throw new RangeError(`${name} is not on the menu`);
  return entry;
}

/** Correction and coating. */
export function isPaintWork(menu: Menu, service: ServiceName): boolean {
  return onMenu(menu, service).skills.some((skill) => skill === 'correction' || skill === 'coating');
}
