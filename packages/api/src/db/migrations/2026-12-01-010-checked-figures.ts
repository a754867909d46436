import type { Migration } from '../migration.ts';

/** Each person's totals as they were when a week was last checked: what a later draft is compared with. */
export const checkedFigures: Migration = {
  name: '2026-12-01-010-checked-figures',
  up: `ALTER TABLE pay_weeks ADD COLUMN last_checked jsonb;`,
  down: `ALTER TABLE pay_weeks DROP COLUMN last_checked;`,
};
