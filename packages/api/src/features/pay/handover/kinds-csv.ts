import { exact, sum } from '@driprail/shared/domain/money/exact';
import { addKinds, kindsOfPay, payKinds, type KindSums } from '@driprail/shared/domain/pay/handover/kinds-of-pay';
import type { PayLine, PayTip, PayWeekInput, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { EXPORT_SCHEMA_VERSION, kindColumns, namesOf, peopleColumns } from './columns.ts';
import { csvText, fourPlaces, harmless, plainCents } from '../../../paper/csv.ts';
import type { HoursBefore, LockedWeek } from './locked-weeks.queries.ts';

/** A row per person and week, a column per kind of pay. */
export function kindsCsv(weeks: readonly LockedWeek[], hours: HoursBefore): string {
  const rows = weeks.flatMap((locked) =>
    locked.people.map((person) => [
      EXPORT_SCHEMA_VERSION,
      locked.week.startsOn,
      locked.week.endsOn,
      person.personId,
      harmless(person.name),
      fourPlaces(person.hoursWorked),
      fourPlaces(person.overtimeHours),
      fourPlaces(person.regularRate),
      ...amounts(kindsOf(locked, person, hours), person.totals.gross),
    ]),
  );
  return csvText(namesOf(kindColumns), rows);
}

/** A row per person, over all the weeks. */
export function peopleCsv(weeks: readonly LockedWeek[], hours: HoursBefore): string {
  const ids = [...new Set(weeks.flatMap(({ people }) => people.map((person) => person.personId)))];
  const rows = ids.map((id) => {
    const own = weeks.flatMap((locked) =>
      locked.people.filter((person) => person.personId === id).map((person) => ({ locked, person })),
    );
    const total = (of: 'hoursWorked' | 'overtimeHours') => sum(own.map(({ person }) => exact(person[of]))).toFraction();
    return [
      EXPORT_SCHEMA_VERSION,
      own[0]?.locked.week.startsOn ?? '',
      own.at(-1)?.locked.week.endsOn ?? '',
      own.length,
      id,
      harmless(own.at(-1)?.person.name ?? ''),
      fourPlaces(total('hoursWorked')),
      fourPlaces(total('overtimeHours')),
      ...amounts(
        addKinds(own.map(({ locked, person }) => kindsOf(locked, person, hours))),
        own.reduce((cents, { person }) => cents + person.totals.gross, 0),
      ),
    ];
  });
  return csvText(namesOf(peopleColumns), rows);
}

function amounts(kinds: KindSums, grossCents: number): string[] {
  return [...payKinds.map((kind) => plainCents(kinds[kind])), plainCents(grossCents)];
}

function kindsOf({ input }: LockedWeek, person: PersonWeek, hours: HoursBefore): KindSums {
  const place = input.places.find((one) => one.personId === person.personId);
  const carried = input.carried.find((one) => one.personId === person.personId);
  return kindsOfPay(person, {
    isFederalOnly:
      input.rules.overtimeRuleSet === 'us_federal' && (place === undefined || place.ruleSet.key === 'us_federal'),
    settledHours: (key) => {
      const startsOn = key.split(':')[1];
      if (startsOn === undefined) return [...(carried?.weeks ?? []).map((week) => week.hours), person.hoursWorked];
      return [hours(person.personId, startsOn)].filter((known) => known !== undefined);
    },
    tipMethod: (line) => tipMethodOf(input, line),
  });
}

/** How the tip of a locked line came. */
export function tipMethodOf({ tips }: Pick<PayWeekInput, 'tips'>, { key }: Pick<PayLine, 'key'>): PayTip['method'] {
  const tip = tips.find((one) => key === `tip:${one.id}`);
  if (!tip) throw new Error(`the locked week keeps no record of ${key}`);
  return tip.method;
}
