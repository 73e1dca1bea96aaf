import type { Migration } from './migration';

/** Whether single keys act as shortcuts for a person (WCAG 2.2, 2.1.4). */
export const shortcuts: Migration = {
  name: '0005-shortcuts',
  up: ['ALTER TABLE people ADD COLUMN shortcuts TINYINT NOT NULL DEFAULT 1 CHECK (shortcuts IN (0, 1))'],
  down: ['ALTER TABLE people DROP COLUMN shortcuts'],
};
