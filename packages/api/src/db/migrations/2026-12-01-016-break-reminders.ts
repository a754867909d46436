import type { Migration } from '../migration.ts';

/** The house's own rule for reminding of breaks; null: no reminder. What the law asks differs by place. */
export const breakReminders: Migration = {
  name: '2026-12-01-016-break-reminders',
  up: `
ALTER TABLE company_settings
  ADD COLUMN meal_reminder_minutes integer CHECK (meal_reminder_minutes BETWEEN 60 AND 720),
  ADD COLUMN rest_reminder_minutes integer CHECK (rest_reminder_minutes BETWEEN 30 AND 720);
`,
  down: `
ALTER TABLE company_settings DROP COLUMN meal_reminder_minutes, DROP COLUMN rest_reminder_minutes;
`,
};
