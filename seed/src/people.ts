import type { Skill } from '@driprail/shared/contracts/fields';
import type { Role } from '@driprail/shared/authz/actor';
import { at } from './random.ts';
import type { DemoRows } from './rows.ts';

export interface DemoPerson {
  id: string;
  userId: string;
  name: string;
  skills: readonly Skill[];
  isTrainee: boolean;
  /** ISO weekday. */
  dayOff: number;
  /** Dollars an hour at the start of the history. */
  hourly: string;
}

export interface DemoPeople {
  ownerUserId: string;
  dispatchers: DemoPerson[];
  technicians: DemoPerson[];
}

type Spec = Pick<DemoPerson, 'name' | 'skills' | 'dayOff' | 'hourly'>;

const dispatchers: Spec[] = [
  { name: 'Maren Holt', skills: [], dayOff: 6, hourly: '22.50' },
  { name: 'Ottilie Frame', skills: [], dayOff: 1, hourly: '20.75' },
];

/** Two by two as they usually ride; days off differ within a pair, so that a van seldom stands still. */
const technicians: Spec[] = [
  { name: 'Idris Vale', skills: ['lead', 'correction', 'coating', 'interior'], dayOff: 4, hourly: '24.00' },
  { name: 'Juno Marsh', skills: ['interior'], dayOff: 1, hourly: '19.20' },
  { name: 'Sefa Lund', skills: ['lead', 'correction', 'coating'], dayOff: 3, hourly: '22.75' },
  { name: 'Petra Hale', skills: ['interior'], dayOff: 6, hourly: '18.40' },
  { name: 'Tomas Reyes', skills: ['lead', 'interior'], dayOff: 6, hourly: '22.20' },
  { name: 'Wyn Abara', skills: ['interior', 'correction'], dayOff: 2, hourly: '18.80' },
  { name: 'Cal Webb', skills: ['interior'], dayOff: 4, hourly: '18.80' },
  { name: 'Priya Noor', skills: ['lead', 'correction', 'interior'], dayOff: 1, hourly: '22.50' },
  { name: 'Mara Quist', skills: ['lead', 'correction', 'coating'], dayOff: 2, hourly: '24.25' },
  { name: 'Lio Fenn', skills: [], dayOff: 2, hourly: '16.50' },
  { name: 'Beau Okoro', skills: ['interior'], dayOff: 5, hourly: '19.00' },
  { name: 'Ede Stroud', skills: ['interior', 'correction'], dayOff: 3, hourly: '18.60' },
];

const TRAINEE = 'Lio Fenn';

/** The password hash is added when the rows are stored. */
export function writePeople(rows: DemoRows, ids: () => string, rulesFrom: string): DemoPeople {
  const ownerUserId = writeLogin(rows, ids, 'owner', 'Rowan Tern', 'owner', null);
  const person = (role: 'dispatcher' | 'technician', login: string, phone: number, spec: Spec): DemoPerson => {
    const id = ids();
    const isTrainee = spec.name === TRAINEE;
    rows.people.push({
      id,
      name: spec.name,
      phone: `555-01${String(phone).padStart(2, '0')}`,
      skills: [...spec.skills],
      isTrainee,
    });
    // Those who direct others' work take no share of tips (29 USC 203(m)(2)(B)).
    rows.tipStandings.push({ personId: id, startsOn: rulesFrom, sharesTips: role === 'technician' });
    return { id, userId: writeLogin(rows, ids, login, spec.name, role, id), isTrainee, ...spec };
  };
  return {
    ownerUserId,
    dispatchers: dispatchers.map((spec, index) =>
      person('dispatcher', index === 0 ? 'dispatch' : `dispatch${index + 1}`, index + 2, spec),
    ),
    technicians: technicians.map((spec, index) => person('technician', `tech${index + 1}`, index + 11, spec)),
  };
}

/** @throws when nobody has that name */
export function named(people: readonly DemoPerson[], name: string): DemoPerson {
  return at(
    people,
    people.findIndex((person) => person.name === name),
  );
}

function writeLogin(
  rows: DemoRows,
  ids: () => string,
  login: string,
  name: string,
  role: Role,
  personId: string | null,
): string {
  const id = ids();
  rows.users.push({ id, name, email: `${login}@ternandtide.example`, role, personId });
  return id;
}
