import type { Migration } from './migration';

/** What of earlier revisions a text sets back, kept beside the reasons why it is critical: `[{revision, what}]`. */
export const takesBack: Migration = {
  name: '0004-takes-back',
  up: [`ALTER TABLE revisions ADD COLUMN takesBack JSON NOT NULL DEFAULT '[]' CHECK (json_valid(takesBack))`],
  down: ['ALTER TABLE revisions DROP COLUMN takesBack'],
};
