import type { Migration } from '../migration.ts';

/** A pay week's entries and a visit's minutes are found without walking through the years before. */
export const payIndexes: Migration = {
  name: '2026-12-01-014-pay-indexes',
  up: `
CREATE INDEX clock_entries_by_span ON clock_entries USING gist (tstzrange(started_at, ended_at));
CREATE INDEX clock_entries_by_visit ON clock_entries (visit_id) WHERE visit_id IS NOT NULL;
CREATE INDEX visits_called_off ON visits (progress_since) WHERE progress = 'called_off';
`,
  down: `DROP INDEX clock_entries_by_span, clock_entries_by_visit, visits_called_off;`,
};
