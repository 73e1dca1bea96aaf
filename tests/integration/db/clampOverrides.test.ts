import { beforeEach, describe, expect, test } from 'vitest';
import { v7 } from 'uuid';
import type { Database } from '@db/database';
import { migrate, migrateDownTo } from '@db/migrations/migrate';
import { overrideClamp } from '@/server/review/override';
import { judgeUnjudged } from '@/server/review/judgeUnjudged';
import { readProposal } from '@/server/review/readProposal';
import { app } from '@/server/context';
import { agreed, waiting } from '../api/support/review';
import { publishFirst, signedIn } from '../api/support/network';
import { useNetwork } from '../api/support/useNetwork';
import { openTestBook } from '../../setup/database';

// The rules are tried here past all of our own code, with the SQL that a mistake in it would send.
const { who, shop } = useNetwork();
let db: Database;
let id: string;
let hash: string;

const sql = async (text: string, replacements: Record<string, unknown> = {}) =>
  db.write(async () => {
    await db.sequelize.query(text, { replacements });
  });
const insert = (change: Record<string, unknown> = {}) =>
  sql(
    `INSERT INTO clampOverrides (id, revisionId, hash, torqueKey, personId, reason, share, at)
     VALUES (:row, :id, :hash, :torque, :person, :reason, :share, 'now')`,
    {
      row: v7(),
      id,
      hash,
      torque: 'cover-bolt',
      person: who('common.editor').id,
      reason: 'Why',
      share: 1.4,
      ...change,
    },
  );
const publish = (set = '') =>
  db.write(async () => {
    await db.sequelize.query(
      `UPDATE revisions SET state = 'superseded' WHERE state = 'published' AND procedureId = (SELECT procedureId FROM revisions WHERE id = :id)`,
      { replacements: { id } },
    );
    await db.sequelize.query(
      `UPDATE revisions SET state = 'published', letter = 'B', publishedAt = 'now' ${set} WHERE id = :id`,
      { replacements: { id } },
    );
  });

beforeEach(async () => {
  ({ db } = await app());
  ({ id } = await waiting(who('north.senior'), 'P-0142', { nm: 20 }));
  const [row] = await db.read<{ hash: string }>('SELECT hash FROM revisions WHERE id = :id', { id });
  hash = row!.hash;
});

describe('the database itself holds that', () => {
  test('a text that fails the clamp check is published only with an override of each torque', async () => {
    await agreed([who('common.editor'), who('common.editor2')], id);
    await expect(publish()).rejects.toThrow('only with an override of each failed clamp check');
    await insert();
    await publish();
  });

  test('nor by forgetting which torques fail, before or while it is published', async () => {
    await agreed([who('common.editor'), who('common.editor2')], id);
    await expect(sql(`UPDATE revisions SET failingTorques = '[]' WHERE id = :id`, { id })).rejects.toThrow(
      'changes only with the text',
    );
    for (const none of [`'[]'`, 'NULL'])
      await expect(publish(`, failingTorques = ${none}`)).rejects.toThrow(
        /changes only with the text|only with an override/,
      );
  });

  test('an override of another torque, text or proposal does not count', async () => {
    await agreed([who('common.editor'), who('common.editor2')], id);
    for (const wrong of [{ torque: 'head-bolt' }, { hash: 'f'.repeat(64) }, { torque: '' }])
      await expect(insert(wrong)).rejects.toThrow('a failing torque of the text that is proposed');
    const other = await waiting(who('north.technician'), 'P-0142', { nm: 21 });
    await expect(insert({ id: other.id })).rejects.toThrow('a failing torque of the text that is proposed');
    await expect(publish()).rejects.toThrow('only with an override');
  });

  test('nobody overrides their own, not even an editor', async () => {
    const own = await waiting(who('common.editor2'), 'P-0142', { nm: 22 });
    const [row] = await db.read<{ hash: string }>('SELECT hash FROM revisions WHERE id = :id', { id: own.id });
    await expect(insert({ id: own.id, hash: row!.hash, person: who('common.editor2').id })).rejects.toThrow(
      'Nobody overrides the clamp check of their own',
    );
  });

  test.each(['north.editor', 'north.owner', 'pier.editor', 'steward', 'nobody'])(
    'the common book is for its own editors: %s',
    async (name) => {
      await expect(insert({ person: who(name).id })).rejects.toThrow('by an editor of the book');
      await expect(
        sql(
          `INSERT INTO agreements (id, revisionId, personId, hash, base, at) VALUES (:row, :id, :person, :hash, 'A', 'now')`,
          { row: v7(), id, hash, person: who(name).id },
        ),
      ).rejects.toThrow('by somebody who answers for the book');
    },
  );

  test('a shop book is for its own editor', async () => {
    await publishFirst('P-0500', { shopId: shop('north') });
    const here = await waiting(who('north.technician'), 'P-0500', { nm: 20 });
    for (const name of ['pier.editor', 'common.editor', 'north.senior', 'north.owner'])
      await expect(insert({ id: here.id, person: who(name).id })).rejects.toThrow('by an editor of the book');
    await insert({ id: here.id, person: who('north.editor').id });
  });

  test('an override stays as it was given', async () => {
    await insert();
    await expect(sql(`UPDATE clampOverrides SET reason = 'Other'`)).rejects.toThrow('never changed');
    await expect(sql('DELETE FROM clampOverrides')).rejects.toThrow('never deleted');
    await expect(insert()).rejects.toThrow('never written over');
  });

  test.each([
    ['no reason', { reason: ' \n\t' }, 'CHECK'],
    ['a share within proof load', { share: 1 }, 'CHECK'],
    ['a share that is no number', { share: 'much' }, 'CHECK'],
  ])('it is never given with %s', async (_, wrong, message) => {
    await expect(insert(wrong)).rejects.toThrow(message);
  });

  test('nothing that fails enters the book unreviewed, as from a release', async () => {
    const { Person, Procedure, Revision } = db.models;
    const release = await Person.create({ kind: 'release', email: null, name: 'Release 2' });
    const { id: procedureId } = await Procedure.create({ number: 'P-0700', bookKind: 'common' });
    const row = {
      procedureId,
      letter: 'A',
      state: 'published',
      source: 'x',
      hash,
      head: {},
      publishedAt: 'now',
    } as never;
    const born = (failingTorques: { key: string; name: string; share: number }[]) =>
      db.write(() => Revision.create({ ...(row as object), authorId: release.id, failingTorques } as never));
    await expect(born([{ key: 'a', name: 'A', share: 1.2 }])).rejects.toThrow('does not enter the book unreviewed');
    await born([]);
  });
});

test('a text on its way that was saved before the check was kept is judged when the book opens', async () => {
  // As the migration leaves it.
  await sql('DROP TRIGGER revisions_failing_torques_stay');
  await sql('UPDATE revisions SET failingTorques = NULL WHERE id = :id', { id });
  await agreed([who('common.editor'), who('common.editor2')], id);
  await expect(publish()).rejects.toThrow('only with an override');
  const { actor } = await signedIn(who('common.editor'));
  expect((await readProposal(actor, id)).failing).toEqual([]);
  await judgeUnjudged();
  expect((await readProposal(actor, id)).failing).toMatchObject([{ key: 'cover-bolt', override: null }]);
  await overrideClamp(actor, id, { torque: 'cover-bolt', reason: 'Why' });
  await publish();
});

test('the migration can be taken back and made again', async () => {
  const { db: empty } = await openTestBook();
  await migrateDownTo(empty, '0007-clamp-overrides');
  expect(await empty.read("SELECT name FROM sqlite_master WHERE name LIKE 'clampOverrides%'")).toEqual([]);
  await migrate(empty);
  expect(await empty.models.ClampOverride.count()).toBe(0);
});
