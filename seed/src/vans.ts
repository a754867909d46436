import type { Equipment } from '@driprail/shared/contracts/fields';
import { weekNumberOf, weekdayOf } from '@driprail/shared/domain/time/zone';
import type { DemoPerson } from './people.ts';
import { at } from './random.ts';
import { instant, minuteOf } from './calendar.ts';
import type { DemoRows } from './rows.ts';

export interface DemoVan {
  id: string;
  name: string;
  equipment: readonly Equipment[];
}

/** A van and who rides in it on a day, in crew order; nobody means that it stands at the shop. */
export interface VanDay {
  van: DemoVan;
  crew: DemoPerson[];
}

const vans: Omit<DemoVan, 'id'>[] = [
  { name: 'Plover', equipment: ['polisher', 'generator', 'water_tank', 'extractor'] },
  { name: 'Gannet', equipment: ['polisher', 'water_tank', 'steamer'] },
  { name: 'Knot', equipment: ['extractor', 'steamer', 'generator', 'water_tank'] },
  { name: 'Dunlin', equipment: ['polisher', 'extractor', 'water_tank'] },
  { name: 'Curlew', equipment: ['polisher', 'generator', 'water_tank'] },
  { name: 'Fulmar', equipment: ['extractor', 'water_tank'] },
];

export function writeVans(rows: DemoRows, ids: () => string): DemoVan[] {
  return vans.map((van, position) => {
    const id = ids();
    const plate = `TT-VAN${position + 1}`;
    rows.vans.push({ id, name: van.name, plate, equipment: [...van.equipment], notes: '', position });
    return { id, ...van };
  });
}

/** Who usually rides where on a weekday: the pairs without those who have their day off or are away. */
export function crewsOn(
  day: string,
  fleet: readonly DemoVan[],
  technicians: readonly DemoPerson[],
  isAway: (person: DemoPerson) => boolean,
): VanDay[] {
  const extra = extraDayOf(weekNumberOf(day), technicians);
  const works = (person: DemoPerson) => !isAway(person) && (person.dayOff !== weekdayOf(day) || extra.includes(person));
  return fleet.map((van, index) => {
    const crew = [at(technicians, index * 2), at(technicians, index * 2 + 1)].filter(works);
    // A trainee never rides alone.
    return { van, crew: crew.some((person) => !person.isTrainee) ? crew : [] };
  });
}

/** Two or three a week give up their day off: that is where the overtime comes from. */
function extraDayOf(week: number, technicians: readonly DemoPerson[]): DemoPerson[] {
  const able = technicians.filter((person) => !person.isTrainee);
  const count = week % 3 === 0 ? 3 : 2;
  return Array.from({ length: count }, (_, index) => at(able, (week * 2 + index * 5) % able.length));
}

/** The crew rides 7:30 to 17:30. */
export function writeCrews(rows: DemoRows, ids: () => string, day: string, vanDays: readonly VanDay[]): void {
  for (const { van, crew } of vanDays) {
    for (const [position, person] of crew.entries()) {
      rows.vanCrew.push({
        id: ids(),
        personId: person.id,
        vanId: van.id,
        span: [instant(day, minuteOf('07:30')), instant(day, minuteOf('17:30'))],
        position,
      });
    }
  }
}
