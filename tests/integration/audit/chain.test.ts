import { beforeEach, describe, expect, test } from 'vitest';
import type { App } from '@/server/context';
import { appendAudit } from '@/server/audit/append';
import { verifyAudit } from '@/server/audit/verify';
import { openTestBook } from '../../setup/database';

let running: App;
const add = (act: string) =>
  appendAudit({ actorId: null, act, subject: { type: 'book', id: 'common' }, detail: { act } });

beforeEach(async () => {
  running = await openTestBook();
  for (const act of ['one', 'two', 'three']) await add(act);
});

/** What somebody with a tool and the file could do, past every rule of the database. */
async function tamper(sql: string) {
  const { db } = running;
  await db.sequelize.query('DROP TRIGGER auditEntries_stay');
  await db.sequelize.query('DROP TRIGGER auditEntries_kept');
  await db.sequelize.query(sql);
}

describe('the audit trail', () => {
  test('is chained from the first entry on', async () => {
    expect(await verifyAudit()).toEqual({ ok: true, entries: 3 });
    const rows = await running.db.read<{ hash: string; previousHash: string }>(
      'SELECT * FROM auditEntries ORDER BY seq',
    );
    expect(rows.map((row) => row.previousHash)).toEqual(['', rows[0]?.hash, rows[1]?.hash]);
  });

  test('is neither changed nor deleted nor forked through the application', async () => {
    const { AuditEntry } = running.db.models;
    const { db } = running;
    await expect(db.write(() => AuditEntry.update({ act: 'x' }, { where: { seq: 2 } }))).rejects.toThrow(
      'never changed',
    );
    await expect(db.write(() => AuditEntry.destroy({ where: { seq: 3 } }))).rejects.toThrow('never deleted');
    const forked = (await AuditEntry.findByPk(2))!.get();
    await expect(db.write(() => AuditEntry.create({ ...forked, seq: 4, hash: 'f'.repeat(64) }))).rejects.toThrow(
      'names the hash of the one before it',
    );
  });

  test('is not written over', async () => {
    const { db } = running;
    const [last] = await db.read<{ hash: string }>('SELECT hash FROM auditEntries WHERE seq = 3');
    const put = (seq: number) =>
      db.write(() =>
        db.sequelize.query(
          `INSERT OR REPLACE INTO auditEntries (seq, at, act, subjectType, subjectId, detail, previousHash, hash)
           VALUES (${seq}, 'now', 'x', 'book', 'common', '{}', '${last!.hash}', '${'a'.repeat(64)}')`,
        ),
      );
    await expect(put(2)).rejects.toThrow('never written over');
    await put(4);
  });

  test.each([
    ['a changed word', `UPDATE auditEntries SET detail = '{"act":"else"}' WHERE seq = 2`, 2, 'changed after'],
    ['another actor', `UPDATE auditEntries SET actorId = NULL, act = 'six' WHERE seq = 3`, 3, 'changed after'],
    ['an entry taken out', 'DELETE FROM auditEntries WHERE seq = 2', 2, 'missing'],
    ['a link bent', `UPDATE auditEntries SET previousHash = '${'e'.repeat(64)}' WHERE seq = 2`, 2, 'changed after'],
    [
      'an entry and its hash made anew',
      `UPDATE auditEntries SET hash = '${'e'.repeat(64)}', detail = '{}' WHERE seq = 1`,
      1,
      'changed after',
    ],
  ])('shows %s', async (_, sql, seq, why) => {
    await tamper(sql);
    expect(await verifyAudit()).toEqual({ ok: false, seq, why: expect.stringContaining(why) });
  });

  test('keeps its chain when many acts come at once, and loses the entry of an act that failed', async () => {
    await Promise.all(Array.from({ length: 20 }, (_, i) => add(`act ${i}`)));
    const failing = running.db.write(async () => {
      await add('never happened');
      throw new Error('failed');
    });
    await expect(failing).rejects.toThrow('failed');
    expect(await verifyAudit()).toEqual({ ok: true, entries: 23 });
  });
});
