import type { PersonWeek } from './pay-week.types.ts';

/** One person's sums of a week. */
export type PersonFigures = Pick<PersonWeek, 'personId' | 'name' | 'hoursWorked' | 'totals'>;
type Part = Exclude<keyof PersonWeek['totals'], 'gross'>;

export interface PersonDifference {
  personId: string;
  name: string;
  /** Null where the person was in only one of the two. */
  before: { hours: string; grossCents: number } | null;
  after: { hours: string; grossCents: number } | null;
  /** The groups that differ, cents. */
  parts: { part: Part; beforeCents: number; afterCents: number }[];
}

const PARTS: readonly Part[] = [
  'hourly',
  'flat',
  'commission',
  'overtimePremium',
  'makeUp',
  'tips',
  'tipsAlreadyReceived',
  'adjustments',
];

/** What differs between two sets of figures, the largest difference of gross first; people who are the same are left out. */
export function weekDifference(before: readonly PersonFigures[], after: readonly PersonFigures[]): PersonDifference[] {
  const names = new Map([...before, ...after].map((person) => [person.personId, person.name]));
  return [...names]
    .map(([personId, name]) => {
      const was = before.find((person) => person.personId === personId);
      const is = after.find((person) => person.personId === personId);
      const parts = PARTS.map((part) => ({
        part,
        beforeCents: was?.totals[part] ?? 0,
        afterCents: is?.totals[part] ?? 0,
      })).filter((item) => item.beforeCents !== item.afterCents);
      return { personId, name, before: figuresOf(was), after: figuresOf(is), parts };
    })
    .filter((person) => person.parts.length > 0 || person.before?.hours !== person.after?.hours)
    .sort((a, b) => size(b) - size(a) || a.name.localeCompare(b.name));
}

function figuresOf(person: PersonFigures | undefined): PersonDifference['before'] {
  return person ? { hours: person.hoursWorked, grossCents: person.totals.gross } : null;
}

function size({ before, after }: PersonDifference): number {
  return Math.abs((after?.grossCents ?? 0) - (before?.grossCents ?? 0));
}
