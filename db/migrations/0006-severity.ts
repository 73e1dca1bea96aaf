import type { Migration } from './migration';

/** How grave a change is and why, `{level, because}`. Null for a text saved before it was weighed so: its critical reasons then tell. */
export const severity: Migration = {
  name: '0006-severity',
  up: ['ALTER TABLE revisions ADD COLUMN severity JSON CHECK (severity IS NULL OR json_valid(severity))'],
  down: ['ALTER TABLE revisions DROP COLUMN severity'],
};
