import { join } from 'node:path';
import sqlite3 from 'sqlite3';
import { describe, expect, it, vi } from 'vitest';
import { verifyAudit } from '@/server/audit/verify';
import { app } from '@/server/context';
import { call } from './support/call';
import { waiting } from './support/review';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who } = useNetwork();

/** Every row that a proposal or its publication touches. */
async function everything() {
  const { db } = await app();
  const tables = ['procedures', 'revisions', 'agreements', 'remarks', 'auditEntries', 'searchDocuments', 'searchWords'];
  return Promise.all(tables.map((table) => db.read(`SELECT * FROM ${table}`)));
}

/** Another process that holds the write lock until it is let go. */
async function lock() {
  const { config } = await app();
  const other = new sqlite3.Database(join(config.dataDir, 'matchmark.sqlite'));
  const run = (sql: string) =>
    new Promise<void>((resolve, reject) => other.exec(sql, (error) => (error ? reject(error) : resolve())));
  await run('BEGIN IMMEDIATE');
  return async () => {
    await run('ROLLBACK');
    await new Promise<void>((resolve) => other.close(() => resolve()));
  };
}

/** From now on a transaction finds no room for more than `spare` pages beyond what the file has. */
async function fill(spare: number) {
  const { db } = await app();
  const [{ page_count: pages } = { page_count: 0 }] = await db.read<{ page_count: number }>('PRAGMA page_count');
  const real = db.sequelize.transaction.bind(db.sequelize) as (
    options: object,
    fn: (t: never) => Promise<unknown>,
  ) => Promise<unknown>;
  vi.spyOn(db.sequelize, 'transaction').mockImplementation(((options: object, fn: (t: never) => Promise<unknown>) =>
    real(options, async (transaction) => {
      await db.sequelize.query(`PRAGMA max_page_count = ${pages + spare}`, { transaction });
      return fn(transaction);
    })) as never);
}

const long = (words: string) =>
  text({ extra: `\n<Step id="long" title="Long">\n${`${words}\n\n`.repeat(1500)}</Step>\n` });

/** A fault of storage is ours, and logged; the test that provokes it says how often. */
const quiet = () => vi.spyOn(console, 'error').mockImplementation(() => undefined);

describe('a database that somebody else holds', () => {
  it('answers 503 with Retry-After, keeps answering readers, and goes on once it is free', async () => {
    const log = quiet();
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const before = await everything();
    const unlock = await lock();
    const refused = call(who('common.editor'), 'POST', `/proposals/${id}/publish`);
    expect((await call(who('north.apprentice'), 'GET', '/procedures/P-0142')).status).toBe(200);
    const answer = await refused;
    expect(answer).toMatchObject({ status: 503, body: { type: '/problems/busy' } });
    expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(0);
    expect(answer.body.detail).not.toMatch(/SQLITE/);
    await unlock();
    expect(await everything()).toEqual(before);
    expect((await call(who('common.editor'), 'POST', `/proposals/${id}/publish`)).status).toBe(200);
    expect(log).toHaveBeenCalledTimes(1);
    log.mockRestore();
  });
});

describe('a full disk', () => {
  it('refuses a save with 503 and keeps what stood', async () => {
    const log = quiet();
    const senior = who('north.senior');
    const { body: draft } = await call(senior, 'POST', '/procedures/P-0142/proposals', {
      body: { base: 'A', source: text({ nm: 11 }) },
    });
    const before = await everything();
    await fill(2);
    const answer = await call(senior, 'PUT', `/proposals/${draft.id}`, {
      body: { source: long('Wipe the joint once more.') },
      headers: { 'if-match': '"1"' },
    });
    expect(answer).toMatchObject({ status: 503, body: { type: '/problems/storage' } });
    expect(answer.body.detail).toContain('Nothing was saved');
    vi.mocked((await app()).db.sequelize.transaction).mockRestore();
    expect(await everything()).toEqual(before);
    expect(log).toHaveBeenCalledTimes(1);
    log.mockRestore();
  });

  // However far the publication gets before the disk is full, all of it is taken back.
  it.each([0, 4, 8])('takes a publication back whole, with room for %i pages', async (spare) => {
    const log = quiet();
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const { db } = await app();
    const before = await everything();
    // The words of this text need more pages than there are.
    const words = Array.from({ length: 9000 }, (_, i) => `word${i}`).join(' ');
    await db.write(() =>
      db.sequelize.query('UPDATE renderings SET json = json_set(json, :at, :words)', {
        replacements: { at: '$.steps[0].text', words },
      }),
    );
    await fill(spare);
    const answer = await call(who('common.editor'), 'POST', `/proposals/${id}/publish`);
    expect(answer).toMatchObject({ status: 503, body: { type: '/problems/storage' } });
    vi.mocked(db.sequelize.transaction).mockRestore();
    expect(await everything()).toEqual(before);
    expect((await call(who('north.senior'), 'GET', '/procedures/P-0142')).body.revision.letter).toBe('A');
    expect((await call(who('common.editor'), 'POST', `/proposals/${id}/publish`)).body.publishedLetter).toBe('B');
    expect(await verifyAudit()).toMatchObject({ ok: true });
    expect(log).toHaveBeenCalledTimes(1);
    log.mockRestore();
  });
});
