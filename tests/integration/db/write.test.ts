import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { fileURLToPath } from 'node:url';
import { join } from 'node:path';
import sqlite3 from 'sqlite3';
import { describe, expect, test, vi } from 'vitest';
import { openDatabase } from '@db/connect';
import { StorageBusy, StorageFull } from '@db/storageErrors';
import { openTestBook } from '../../setup/database';

describe('write', () => {
  test('lets fifty writers in at once, one after the other, with no error', async () => {
    const { db } = await openTestBook();
    const { Setting } = db.models;
    await Setting.create({ key: 'count', value: '0' });
    await Promise.all(
      Array.from({ length: 50 }, () =>
        db.write(async () => {
          const count = await Setting.findByPk('count');
          await count?.update({ value: String(Number(count.value) + 1) });
        }),
      ),
    );
    // A lost update would leave less.
    expect((await Setting.findByPk('count'))?.value).toBe('50');
  });

  test('stores nothing of a write that fails, and the next one goes on', async () => {
    const { db } = await openTestBook();
    const { Shop } = db.models;
    const failing = db.write(async () => {
      await Shop.create({ name: 'half written' });
      await db.write(() => Shop.create({ name: 'half written inside' }));
      throw new Error('the second half failed');
    });
    await expect(failing).rejects.toThrow('the second half failed');
    expect(await Shop.count()).toBe(0);
    await db.write(() => Shop.create({ name: 'after' }));
    expect(await Shop.count()).toBe(1);
  });

  test('inside a write joins it, and reads there see what it wrote', async () => {
    const { db } = await openTestBook();
    await db.write(async (outer) => {
      await db.models.Shop.create({ name: 'seen inside' });
      await db.write(async (inner) => expect(inner).toBe(outer));
      expect(await db.read('SELECT name FROM shops')).toEqual([{ name: 'seen inside' }]);
    });
  });

  test('work that was started inside and not awaited waits for its own turn', async () => {
    const { db } = await openTestBook();
    let late: Promise<unknown> = Promise.resolve();
    await db.write(async () => {
      late = new Promise((resolve) => setTimeout(resolve, 20)).then(() =>
        db.write(() => db.models.Shop.create({ name: 'late' })),
      );
    });
    await late;
    expect(await db.models.Shop.count()).toBe(1);
  });

  test('says that the book is busy when another process holds it, and writes again when it lets go', async () => {
    const { db, config } = await openTestBook();
    const other = new sqlite3.Database(join(config.dataDir, 'matchmark.sqlite'));
    const run = (sql: string) =>
      new Promise<void>((resolve, reject) => other.exec(sql, (e) => (e ? reject(e) : resolve())));
    await run('BEGIN IMMEDIATE');
    vi.spyOn(console, 'warn').mockReturnValue();
    await expect(db.write(() => db.models.Shop.create({ name: 'too early' }))).rejects.toThrow(StorageBusy);
    await run('COMMIT');
    await db.write(() => db.models.Shop.create({ name: 'in time' }));
    expect(await db.read('SELECT name FROM shops')).toEqual([{ name: 'in time' }]);
    await new Promise<void>((resolve) => other.close(() => resolve()));
  });

  test('says that the disk is full, with nothing half written', async () => {
    const { db } = await openTestBook();
    const filling = db.write(async () => {
      const [pages] = await db.read<{ page_count: number }>('PRAGMA page_count');
      await db.sequelize.query(`PRAGMA max_page_count = ${(pages?.page_count ?? 0) + 5}`);
      for (let i = 0; ; i++) await db.models.Setting.create({ key: `k${i}`, value: 'x'.repeat(4000) });
    });
    await expect(filling).rejects.toThrow(StorageFull);
    expect(await db.models.Setting.count()).toBe(0);
    await db.write(() => db.models.Setting.create({ key: 'space again', value: '' }));
  });

  test('loses no acknowledged write when the process is killed in the middle of them', async () => {
    const { db, config } = await openTestBook();
    const file = join(config.dataDir, 'matchmark.sqlite');
    await db.close();
    const writer = spawn(
      process.execPath,
      ['--import', 'tsx', fileURLToPath(new URL('../../fixtures/processes/writer.ts', import.meta.url)), file],
      { stdio: ['ignore', 'pipe', 'inherit'] },
    );
    let said = '';
    writer.stdout.on('data', (chunk: Buffer) => {
      said += chunk;
      if (said.split('\n').length > 60) writer.kill('SIGKILL');
    });
    await once(writer, 'close');
    const acknowledged = said.split('\n').slice(0, -1);
    expect(acknowledged.length).toBeGreaterThan(50);

    const reopened = await openDatabase(file);
    const shops = await reopened.read<{ name: string }>('SELECT name FROM shops');
    const settings = await reopened.read<{ key: string }>('SELECT key FROM settings');
    await reopened.close();
    const stored = new Set(shops.map(({ name }) => name));
    expect(acknowledged.filter((name) => !stored.has(name))).toEqual([]);
    expect(settings.map(({ key }) => key).sort()).toEqual([...stored].sort());
  });
});
