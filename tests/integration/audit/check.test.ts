import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import sqlite3 from 'sqlite3';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { checkAtStart } from '@/server/audit/atStart';
import { checkBook } from '@/server/audit/check';
import { knownTrail } from '@/server/audit/known';
import { standingOf } from '@/server/audit/standing';
import { app } from '@/server/context';
import { readyWarnings } from '@/server/ready';
import { overrideClamp } from '@/server/review/override';
import { call } from '../api/support/call';
import { signedIn } from '../api/support/network';
import { agreed, waiting } from '../api/support/review';
import { useNetwork } from '../api/support/useNetwork';

const { who } = useNetwork();

/** Every kind of row: a critical change past proof, overridden, agreed to, published, signed; a return; a withdrawal. */
beforeEach(async () => {
  const { id } = await waiting(who('north.senior'), 'P-0142', { nm: 30 });
  await overrideClamp((await signedIn(who('common.editor'))).actor, id, {
    torque: 'cover-bolt',
    reason: 'A test bolt.',
  });
  await agreed([who('common.editor'), who('common.editor2')], id);
  expect((await call(who('common.editor'), 'POST', `/proposals/${id}/publish`)).status).toBe(200);
  expect((await call(who('pier.apprentice'), 'POST', `/read-and-sign/${id}`)).status).toBe(200);
  const other = await call(who('north.senior'), 'POST', '/procedures/P-0142/proposals', {
    body: {
      base: 'B',
      source: (await call(who('north.senior'), 'GET', '/procedures/P-0142')).body.source.replace('clean', 'dry'),
      reason: 'Dry.',
    },
  });
  await call(who('north.senior'), 'POST', `/proposals/${other.body.id}/submit`);
  const back = await call(who('common.editor'), 'POST', `/proposals/${other.body.id}/return`, {
    body: { reason: 'Say why.' },
  });
  expect(back.status).toBe(200);
  const out = await call(who('common.editor'), 'POST', '/procedures/P-0142/withdraw', {
    body: { reason: 'Two bolts broke.' },
  });
  expect(out.status).toBe(200);
});

/** What somebody with the file and a tool of their own could do: every trigger taken away first. */
async function raw(...statements: string[]): Promise<void> {
  const { config } = await app();
  const db = new sqlite3.Database(join(config.dataDir, 'matchmark.sqlite'));
  const all = (sql: string) =>
    new Promise<{ name: string }[]>((done, fail) =>
      db.all(sql, (error: Error | null, rows) => (error ? fail(error) : done(rows as { name: string }[]))),
    );
  db.configure('busyTimeout', 2000);
  for (const { name } of await all(`SELECT name FROM sqlite_master WHERE type = 'trigger'`))
    await all(`DROP TRIGGER ${name}`);
  for (const statement of statements) await all(statement);
  await new Promise<void>((done, fail) => db.close((error) => (error ? fail(error) : done())));
}

const OF_B = `(SELECT id FROM revisions WHERE letter = 'B')`;
const found = async () =>
  (await checkBook()).faults.map(({ table, number, letter, differs }) => [table, number, letter, differs.join('; ')]);

describe('a book that nobody has tampered with', () => {
  it('holds, both ways, and keeps a checkpoint', async () => {
    const report = await checkBook();
    expect(report).toMatchObject({ faults: [], texts: 3 });
    expect(report.entries).toBeGreaterThan(10);
    const { config } = await app();
    expect(JSON.parse(readFileSync(join(config.dataDir, 'audit-checkpoint.json'), 'utf8'))).toMatchObject({
      entries: report.entries,
      hash: report.end.hash,
    });
  });
});

describe('a changed byte is found and named', () => {
  it.each<[string, string, [table: string, letter: string | null, differs: RegExp][]]>([
    [
      'the text of a published revision',
      `UPDATE revisions SET source = replace(source, 'nm: 30', 'nm: 31') WHERE letter = 'B'`,
      [['revisions', 'B', /another text than the one that was stored: it gives [0-9a-f]{8}, not [0-9a-f]{8}/]],
    ],
    [
      'its hash',
      `UPDATE revisions SET hash = 'a' || substr(hash, 2) WHERE letter = 'B' AND hash NOT LIKE 'a%'`,
      [
        ['revisions', 'B', /has a[0-9a-f]{7} for its hash where the trail says/],
        ['revisions', 'B', /another text/],
      ],
    ],
    [
      'its letter',
      `UPDATE revisions SET letter = 'C' WHERE letter = 'B'`,
      [
        ['revisions', 'C', /has “C” for its letter where the trail says “B”/],
        ['procedures', null, /current revision/],
      ],
    ],
    [
      'its author',
      `UPDATE revisions SET authorId = (SELECT id FROM people WHERE name = 'pier owner') WHERE letter = 'B'`,
      [['revisions', 'B', /has “pier owner” for its author where the trail says “north senior”/]],
    ],
    [
      'its reason',
      `UPDATE revisions SET reason = 'Another reason' WHERE letter = 'B'`,
      [['revisions', 'B', /for its reason where the trail says “A reason”/]],
    ],
    [
      'its day',
      `UPDATE revisions SET publishedAt = '2020-01-01T00:00:00.000Z' WHERE letter = 'B'`,
      [['revisions', 'B', /day of publication/]],
    ],
    [
      'which revision is the current one',
      `UPDATE procedures SET currentRevisionId = (SELECT id FROM revisions WHERE letter = 'A')`,
      [
        ['revisions', 'A', /has “superseded” for its state where the trail says “published”/],
        ['revisions', 'B', /has “published” for its state where the trail says “superseded”/],
        ['procedures', null, /has “A” for its current revision where the trail says “B”/],
      ],
    ],
    [
      'who agreed',
      `UPDATE agreements SET personId = (SELECT id FROM people WHERE name = 'pier editor')
        WHERE personId = (SELECT id FROM people WHERE name = 'common.editor2')`,
      [
        ['agreements', 'B', /is gone or was changed/],
        ['agreements', 'B', /the trail does not tell of it/],
      ],
    ],
    [
      'the agreement of who published',
      `DELETE FROM agreements WHERE personId = (SELECT id FROM people WHERE name = 'common.editor')`,
      [
        ['agreements', 'B', /is gone or was changed/],
        ['revisions', 'B', /has no agreement of common\.editor, who published it/],
      ],
    ],
    [
      'an override',
      `UPDATE clampOverrides SET reason = 'A tested bolt.'`,
      [['clampOverrides', 'B', /reason where the trail says “A test bolt\.”/]],
    ],
    ['a signature', `DELETE FROM readAndSigned`, [['readAndSigned', 'B', /is gone or was changed/]]],
    [
      'the reason of a return',
      `UPDATE remarks SET text = 'Say why!'`,
      [
        ['remarks', null, /is gone or was changed/],
        ['remarks', null, /the trail does not tell of it/],
      ],
    ],
    [
      'the reason of a withdrawal',
      `UPDATE bulletins SET words = '["Two bolts bent."]' WHERE kind = 'withdrawn'`,
      [
        ['bulletins', null, /is gone or was changed/],
        ['bulletins', 'B', /the trail does not tell of it/],
      ],
    ],
    [
      'that it is withdrawn',
      `UPDATE procedures SET withdrawnAt = NULL`,
      [['procedures', null, /is in use, but the trail says that it was withdrawn/]],
    ],
    [
      'a revision that was put in',
      `INSERT INTO revisions (id, procedureId, letter, state, source, hash, head, authorId, publishedAt, parentId, everProposed)
        SELECT 'put-in', procedureId, 'C', 'superseded', source, hash, head, authorId, publishedAt, id, 1 FROM revisions WHERE letter = 'B'`,
      [['revisions', 'C', /is there, but the trail does not tell of it/]],
    ],
    [
      'an entry',
      `UPDATE auditEntries SET detail = replace(detail, '"letter":"B"', '"letter":"D"') WHERE act = 'revision.published' AND subjectId = ${OF_B}`,
      [
        ['auditEntries', 'B', /was changed after it was written/],
        ['revisions', 'B', /has “B” for its letter where the trail says “D”/],
        ['procedures', null, /current revision/],
      ],
    ],
    [
      'an entry that was taken out',
      `DELETE FROM auditEntries WHERE act = 'proposal.agreed' AND actorId = (SELECT id FROM people WHERE name = 'common.editor2')`,
      [
        ['auditEntries', null, /is missing/],
        ['agreements', 'B', /the trail does not tell of it/],
      ],
    ],
  ])('%s', async (_, sql, expected) => {
    await raw(sql);
    const faults = await found();
    expect(faults).toHaveLength(expected.length);
    for (const [table, letter, differs] of expected)
      expect(faults).toContainEqual([
        table,
        table === 'auditEntries' && letter === null ? null : 'P-0142',
        letter,
        expect.stringMatching(differs),
      ]);
  });
});

describe('a trail whose end was cut off', () => {
  const CUT = `DELETE FROM auditEntries WHERE seq > (SELECT max(seq) - 2 FROM auditEntries)`;
  const FORGET = `UPDATE sqlite_sequence SET seq = (SELECT max(seq) FROM auditEntries) WHERE name = 'auditEntries'`;

  it('is known by the numbers that were given', async () => {
    await raw(CUT);
    expect(await found()).toContainEqual([
      'auditEntries',
      null,
      null,
      expect.stringMatching(/numbers up to \d+ were given/),
    ]);
  });

  it('is known by the checkpoint, and by the rows that nothing tells of, where those were set back too', async () => {
    const { entries } = await checkBook();
    await raw(CUT, FORGET);
    const faults = await found();
    expect(faults).toContainEqual([
      'auditEntries',
      null,
      null,
      `ends at entry ${entries - 2}, but it was seen with ${entries} entries: its end was cut off`,
    ]);
    expect(faults).toContainEqual(['bulletins', 'P-0142', 'B', expect.stringMatching(/does not tell of it/)]);
    const { config } = await app();
    expect(existsSync(join(config.dataDir, 'audit-checkpoint.json'))).toBe(true);
  });

  it('is known by a count and a hash that were written down elsewhere, where the checkpoint was set back too', async () => {
    const { end } = await checkBook();
    await raw(CUT, FORGET);
    const expected = { entries: end.seq, hash: end.hash.slice(0, 8) };
    const { faults } = await checkBook({ expected, forgetCheckpoint: true });
    expect(faults).toContainEqual(expect.objectContaining({ differs: [expect.stringMatching(/its end was cut off/)] }));
  });
});

describe('what the history of a sheet says of it', () => {
  const standing = async (number = 'P-0142') => {
    const { db } = await app();
    const [procedure] = await db.read<{ id: string; number: string }>(
      'SELECT id, number FROM procedures WHERE number = :number',
      { number },
    );
    const rows = await db.read<{ id: string }>(
      'SELECT id FROM revisions WHERE procedureId = :id AND letter IS NOT NULL',
      { id: procedure!.id },
    );
    return standingOf(
      procedure!,
      rows.map(({ id }) => id),
    );
  };

  it('is that it is whole', async () => {
    const { entries, own, faults, elsewhere } = await standing();
    expect({ faults, elsewhere }).toEqual({ faults: [], elsewhere: false });
    expect(own).toBeGreaterThan(6);
    expect(entries).toBeGreaterThan(own);
  });

  it('is what was changed since it was first looked at, though the trail itself was followed already', async () => {
    expect((await standing()).faults).toEqual([]);
    await raw(
      `UPDATE auditEntries SET detail = replace(detail, 'Two bolts', 'Six bolts') WHERE act = 'procedure.withdrawn'`,
    );
    expect((await standing()).faults).toContainEqual(
      expect.objectContaining({
        table: 'auditEntries',
        number: 'P-0142',
        differs: ['was changed after it was written'],
      }),
    );
    await raw(`UPDATE revisions SET source = source || ' ' WHERE letter = 'A'`);
    expect((await standing()).faults).toContainEqual(expect.objectContaining({ table: 'revisions', letter: 'A' }));
  });

  it('finds the last entry made anew or cut off while the book is open', async () => {
    await standing();
    const last = '(SELECT max(seq) FROM auditEntries)';
    await raw(`UPDATE auditEntries SET hash = '${'b'.repeat(64)}' WHERE seq = ${last}`);
    expect((await knownTrail()).faults.length).toBeGreaterThan(0);
    await raw(`DELETE FROM auditEntries WHERE seq = ${last}`);
    expect((await knownTrail()).faults).toContainEqual(expect.objectContaining({ id: 'end' }));
  });
});

describe('at start', () => {
  it('says nothing of a trail that holds, and of one that does not names what is wrong, and stops nobody', async () => {
    const said = vi.spyOn(console, 'warn').mockImplementation(() => undefined);
    await checkAtStart();
    expect(said).not.toHaveBeenCalled();
    expect(await readyWarnings()).toEqual([]);
    await raw(`UPDATE revisions SET source = source || ' ' WHERE letter = 'B'`);
    await checkAtStart();
    expect(said.mock.calls.map(([line]) => String(line))).toEqual([
      expect.stringMatching(/^audit: revisions [0-9a-f-]{36}: P-0142 revision B has another text/),
      expect.stringContaining('npm run audit:check'),
    ]);
    expect(await readyWarnings()).toEqual(['audit: the trail does not hold; run npm run audit:check']);
    expect((await call(who('pier.apprentice'), 'GET', '/procedures/P-0142')).status).toBe(200);
    said.mockRestore();
  });

  it('moves the checkpoint on behind a check that found nothing, and leaves it where something was found', async () => {
    const { config } = await app();
    const kept = () =>
      JSON.parse(readFileSync(join(config.dataDir, 'audit-checkpoint.json'), 'utf8')) as { entries: number };
    const { entries } = await checkBook();
    expect(
      (await call(who('common.editor'), 'POST', '/procedures/P-0142/bring-back', { body: { reason: 'A bad batch.' } }))
        .status,
    ).toBe(200);
    await knownTrail();
    expect(kept().entries).toBe(entries + 1);
    await raw(`DELETE FROM auditEntries WHERE seq = ${entries + 1}`);
    expect((await knownTrail()).faults).toContainEqual(expect.objectContaining({ id: 'end' }));
    await knownTrail();
    expect(kept().entries).toBe(entries + 1);
  });
});
