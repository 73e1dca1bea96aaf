import { Umzug } from 'umzug';
import { QueryTypes } from 'sequelize';
import type { Database } from '../database';
import { tables } from './0001-tables';
import { rules } from './0002-rules';
import { shopRules } from './0003-shop-rules';
import { takesBack } from './0004-takes-back';
import { shortcuts } from './0005-shortcuts';
import { severity } from './0006-severity';
import { clampOverrides } from './0007-clamp-overrides';
import { threads } from './0008-threads';
import { bulletins } from './0009-bulletins';
import { flags } from './0010-flags';
import { draftVersions } from './0011-draft-versions';
import { photos } from './0012-photos';
import { origins } from './0013-origins';
import { history } from './0014-history';
import { feedKeys } from './0015-feed-keys';
import type { Migration } from './migration';

// A list, not a folder read at run time: it is bundled with the server and runs from scripts alike.
const MIGRATIONS: readonly Migration[] = [
  tables,
  rules,
  shopRules,
  takesBack,
  shortcuts,
  severity,
  clampOverrides,
  threads,
  bulletins,
  flags,
  draftVersions,
  photos,
  origins,
  history,
  feedKeys,
];

type Handle = Pick<Database, 'sequelize' | 'write'>;

function migrator({ sequelize }: Handle) {
  const run = async (statements: readonly string[]) => {
    for (const statement of statements) await sequelize.query(statement);
  };
  return new Umzug({
    migrations: MIGRATIONS.map(({ name, up, down }) => ({ name, up: () => run(up), down: () => run(down) })),
    logger: undefined,
    storage: {
      async executed() {
        await sequelize.query('CREATE TABLE IF NOT EXISTS migrations (name TEXT PRIMARY KEY, at TEXT NOT NULL)');
        const rows = await sequelize.query<{ name: string }>('SELECT name FROM migrations ORDER BY name', {
          type: QueryTypes.SELECT,
        });
        return rows.map((row) => row.name);
      },
      async logMigration({ name }) {
        await sequelize.query('INSERT INTO migrations (name, at) VALUES (:name, :at)', {
          replacements: { name, at: new Date().toISOString() },
        });
      },
      async unlogMigration({ name }) {
        await sequelize.query('DELETE FROM migrations WHERE name = :name', { replacements: { name } });
      },
    },
  });
}

/** Brings the tables up to date: all missing steps, or none if one fails. */
export async function migrate(db: Handle): Promise<void> {
  await db.write(async () => {
    await migrator(db).up();
  });
}

/** Whether every step has been made; only reads. */
export async function isMigrated(db: Pick<Database, 'read'>): Promise<boolean> {
  const rows = await db.read<{ name: string }>('SELECT name FROM migrations');
  const made = new Set(rows.map((row) => row.name));
  return MIGRATIONS.every(({ name }) => made.has(name));
}

/** Takes the tables back to before `name`; data of later steps is lost. */
export async function migrateDownTo(db: Handle, name: string): Promise<void> {
  await db.write(async () => {
    await migrator(db).down({ to: name });
  });
}
