import type { PayLine, PayWeekInput, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { weekDifferences } from '@driprail/shared/domain/pay/week-proof';
import type { LockedWeek } from '@driprail/shared/domain/pay/week-proof';
import { select } from '../../db/sequelize.ts';

export interface Verification {
  /** Locked weeks that came to the same bytes again. */
  verified: number;
  /** One sentence for each difference: week, person, line. */
  complaints: string[];
}

/** Works every locked week out again from its snapshot, one at a time, and compares it with what is stored. */
export async function verifyWeeks(): Promise<Verification> {
  const weeks = await select<{ id: string; startsOn: string }>(
    `SELECT id, starts_on AS "startsOn" FROM pay_weeks WHERE state = 'locked' ORDER BY starts_on`,
  );
  const result: Verification = { verified: 0, complaints: [] };
  for (const { id, startsOn } of weeks) {
    const differences = weekDifferences(await lockedWeek(id));
    if (differences.length === 0) result.verified += 1;
    for (const { personId, key, stored, recomputed } of differences) {
      const whose = personId === '' ? '' : `, person ${personId}`;
      result.complaints.push(`Week ${startsOn}${whose}, ${key}: stored ${stored}, worked out again ${recomputed}`);
    }
  }
  return result;
}

/** Everything stored of a locked week, lines in their places. */
async function lockedWeek(weekId: string): Promise<LockedWeek> {
  const [week] = await select<{ engineVersion: string | null; snapshot: PayWeekInput }>(
    'SELECT engine_version AS "engineVersion", snapshot FROM pay_weeks WHERE id = :weekId',
    { weekId },
  );
  if (!week) throw new Error('a locked week stays');
  const people = await select<{ personId: string; grossCents: number; summary: Omit<PersonWeek, 'lines'> }>(
    'SELECT person_id AS "personId", gross_cents AS "grossCents", summary FROM pay_statements WHERE pay_week_id = :weekId',
    { weekId },
  );
  const lines = await select<{
    personId: string;
    position: number;
    key: string;
    amountCents: number;
    isPayable: boolean;
    line: PayLine;
  }>(
    `SELECT person_id AS "personId", position, key, amount_cents AS "amountCents", is_payable AS "isPayable", line
       FROM pay_lines WHERE pay_week_id = :weekId`,
    { weekId },
  );
  return {
    engineVersion: week.engineVersion ?? '',
    snapshot: week.snapshot,
    people: people.map((person) => ({
      ...person,
      lines: lines.filter((line) => line.personId === person.personId),
    })),
  };
}
