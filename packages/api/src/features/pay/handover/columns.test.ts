import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import {
  EXPORT_SCHEMA_VERSION,
  clockColumns,
  hourColumns,
  kindColumns,
  lineColumns,
  namesOf,
  peopleColumns,
  tipColumns,
} from './columns.ts';

const files = {
  'kinds.csv': namesOf(kindColumns),
  'people.csv': namesOf(peopleColumns),
  'hours.csv': namesOf(hourColumns),
  'clock-entries.csv': namesOf(clockColumns),
  'tips.csv': namesOf(tipColumns),
};

const kinds =
  'straight_pay flat commission bonus percentage_bonus discretionary_bonus flsa_premium state_only_premium plan_top_up minimum_wage_make_up tips_card tips_invoice tips_cash tips_already_received reimbursement paid_time_off show_up_pay deductions corrections gross';

/** What each version held. A version that was handed over is never edited: another order or name is a new version. */
const VERSIONS: Record<string, Record<keyof typeof files, string>> = {
  '1': {
    'kinds.csv': `schema_version week_start week_end person_id person hours_worked overtime_hours regular_rate ${kinds}`,
    'people.csv': `schema_version first_week_start last_week_end weeks person_id person hours_worked overtime_hours ${kinds}`,
    'hours.csv': 'schema_version week_start week_end person_id person date kind job started ended hours worked',
    'clock-entries.csv':
      'schema_version entry_id kind job started ended original_kind original_started original_ended corrections last_reason',
    'tips.csv': 'schema_version week_start date job method own_share paid_out',
  },
};

test('columns are those of their version', () => {
  const now = Object.fromEntries(Object.entries(files).map(([name, columns]) => [name, columns.join(' ')]));
  expect(now).toEqual(VERSIONS[EXPORT_SCHEMA_VERSION]);
});

test('the lines keep the shape that processors read already', () => {
  expect(namesOf(lineColumns).join(' ')).toBe(
    'week_start week_end state person kind description date job hours rate amount paid_out rule',
  );
});

test('docs/export.md names every column of every file, and the version', () => {
  const guide = readFileSync('docs/export.md', 'utf8');
  expect(guide).toContain(`Schema version: ${EXPORT_SCHEMA_VERSION}`);
  for (const [name, columns] of Object.entries({ ...files, 'lines.csv': namesOf(lineColumns) })) {
    const section = guide.split(/^## /m).find((part) => part.startsWith(name)) ?? '';
    expect(
      columns.filter((column) => !section.includes(`\`${column}\``)),
      name,
    ).toEqual([]);
  }
});
