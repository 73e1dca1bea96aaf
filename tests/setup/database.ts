import { copyFileSync, existsSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach } from 'vitest';
import { openDatabase } from '@db/connect';
import { now } from '@/server/clock';
import { useApp, type App } from '@/server/context';

// Migrated once for each worker, then copied: an empty book costs a file copy, not a migration.
const template = join(
  tmpdir(),
  `matchmark-template-${process.pid}-${process.env['VITEST_POOL_ID'] ?? '0'}`,
  'empty.sqlite',
);

async function migratedFile(): Promise<string> {
  if (!existsSync(template)) {
    mkdirSync(join(template, '..'), { recursive: true });
    const db = await openDatabase(template);
    await db.read('PRAGMA wal_checkpoint(TRUNCATE)');
    await db.close();
    process.once('exit', () => rmSync(join(template, '..'), { recursive: true, force: true }));
  }
  return template;
}

const open: (() => Promise<void>)[] = [];
afterEach(async () => {
  useApp(undefined);
  for (const close of open.splice(0)) await close();
});

export const TEST_SECRET = '0'.repeat(64);

/**
 * A book of its own on a real SQLite file, which `app()` then answers with until the test ends.
 * Call it in the test or in `beforeEach`.
 */
export async function openTestBook(config: Partial<App['config']> = {}): Promise<App> {
  const dataDir = mkdtempSync(join(tmpdir(), 'matchmark-test-'));
  copyFileSync(await migratedFile(), join(dataDir, 'matchmark.sqlite'));
  const db = await openDatabase(join(dataDir, 'matchmark.sqlite'), { now });
  const running: App = {
    db,
    secret: TEST_SECRET,
    config: {
      port: 0,
      host: '127.0.0.1',
      dataDir,
      contentDir: join(dataDir, 'content'),
      origin: null,
      demo: false,
      bucket: null,
      ...config,
    },
  };
  useApp(running);
  open.push(async () => {
    await db.close();
    rmSync(dataDir, { recursive: true, force: true });
  });
  return running;
}
