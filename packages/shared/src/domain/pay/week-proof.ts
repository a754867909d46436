import { payEngine } from './pay-engines.ts';
import type { PayLine, PayWeekInput, PersonWeek } from './pay-week.types.ts';
import { stableJson } from './stable-json.ts';

/** A locked week as it lies in the database: what went in, by which engine, and what was stored. */
export interface LockedWeek {
  engineVersion: string;
  snapshot: PayWeekInput;
  people: { personId: string; grossCents: number; summary: Omit<PersonWeek, 'lines'>; lines: StoredLine[] }[];
}

export interface StoredLine {
  position: number;
  key: string;
  amountCents: number;
  isPayable: boolean;
  line: PayLine;
}

export interface Difference {
  personId: string;
  /** The line's key, or `summary` for hours, rate, totals and warnings; `engine` when the week can't be worked out. */
  key: string;
  stored: string;
  recomputed: string;
}

const NOTHING = 'nothing';

/**
 * Works a locked week out again from its snapshot with the engine that locked it and compares every line and summary
 * byte for byte as stable JSON.
 * @returns no differences when the stored week is proved
 */
export function weekDifferences({ engineVersion, snapshot, people }: LockedWeek): Difference[] {
  const engine = payEngine(engineVersion);
  if (engine === null) {
    return [{ personId: '', key: 'engine', stored: `version ${engineVersion}`, recomputed: 'no such engine here' }];
  }
  const stored = new Map(people.flatMap(storedParts));
  const again = new Map(engine(snapshot).people.flatMap(computedParts));
  return [...new Set([...stored.keys(), ...again.keys()])].flatMap((place) => {
    const [was, is] = [stored.get(place) ?? NOTHING, again.get(place) ?? NOTHING];
    const [personId = '', ...key] = place.split(' ');
    return was === is ? [] : [{ personId, key: key.join(' '), stored: was, recomputed: is }];
  });
}

type Part = [place: string, json: string];

function storedParts({ personId, grossCents, summary, lines }: LockedWeek['people'][number]): Part[] {
  return [
    [`${personId} summary`, stableJson({ grossCents, summary })],
    ...lines.map(({ position, key, amountCents, isPayable, line }): Part => [
      `${personId} ${key}`,
      stableJson({ position, amountCents, isPayable, line }),
    ]),
  ];
}

function computedParts({ lines, ...summary }: PersonWeek): Part[] {
  return storedParts({
    personId: summary.personId,
    grossCents: summary.totals.gross,
    summary,
    lines: lines.map((line, position) => ({ position, key: line.key, ...amountOf(line), line })),
  });
}

function amountOf({ amountCents, isPayable }: PayLine): Pick<StoredLine, 'amountCents' | 'isPayable'> {
  return { amountCents, isPayable };
}
