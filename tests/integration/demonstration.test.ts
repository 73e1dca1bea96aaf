import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { PEOPLE } from '@db/seeders/demonstration';
import { whoIs } from '@/server/accounts/whoIs';
import { unreadBulletins } from '@/server/bulletins/read';
import { verifyAudit } from '@/server/audit/verify';
import { parsedText } from '@/server/book/parsed';
import { readRevisions } from '@/server/book/history';
import { listProcedures } from '@/server/book/list';
import { readSheet } from '@/server/book/sheet';
import { within, type App } from '@/server/context';
import { readDesk } from '@/server/review/readDesk';
import { start } from '@/server/start';

const config: App['config'] = {
  port: 0,
  host: '127.0.0.1',
  dataDir: mkdtempSync(join(tmpdir(), 'matchmark-demo-')),
  contentDir: resolve('content'),
  origin: null,
  demo: true,
  bucket: null,
};
let running: App;
const inBook = <T>(fn: () => Promise<T>) => within(running, fn);

beforeAll(async () => {
  running = await start(config);
}, 120_000);
afterAll(async () => {
  await running.db.close();
  rmSync(config.dataDir, { recursive: true, force: true });
});

const actor = async (email: string) => {
  const person = await running.db.models.Person.findOne({ where: { email } });
  return (await inBook(() => whoIs({ personId: person!.id, tokenVersion: person!.tokenVersion })))!.actor;
};

test('the network is the one that is promised: three shops, each person once, in the role of their address', async () => {
  expect(await running.db.models.Shop.count()).toBe(3);
  expect(new Set(PEOPLE.map((p) => p.name)).size).toBe(13);
  for (const { email, role, in: where } of PEOPLE) {
    const { memberships } = await actor(email);
    expect(memberships.map((m) => [m.in, m.role])).toEqual([
      [['common', 'network'].includes(where) ? where : 'shop', role],
    ]);
  }
});

test('the valve cover reseal has its history, each revision with an author and a reviewer who are not the same', async () => {
  const apprentice = await actor('apprentice@northgate.example');
  const history = (await inBook(() => readRevisions(apprentice, 'P-0142', { limit: 50 }))).items;
  const byLetter = new Map(history.map((revision) => [revision.letter, revision]));
  expect([...byLetter.keys()].sort()).toEqual(['A', 'B', 'C']);
  expect(byLetter.get('C')).toMatchObject({
    state: 'published',
    author: { name: 'Rowan Achterberg' },
    reviewers: [{ name: 'Ines Okafor' }],
  });
  const dates = ['A', 'B', 'C'].map((letter) => byLetter.get(letter)!.publishedAt);
  expect([...dates].sort()).toEqual(dates);
  expect(dates[2]! < new Date().toISOString()).toBe(true);
});

test('the review desk of the common book has work, worst first', async () => {
  const desk = await inBook(async () => readDesk(await actor('editor@halden.example')));
  expect(desk.map((item) => [item.number, item.agreementsNeeded, item.agreements])).toEqual([
    ['P-0142', 2, 1],
    ['P-0137', 1, 0],
  ]);
});

test('one sheet is withdrawn, and a critical change waits to be read and signed', async () => {
  const unread = async (email: string) => {
    const who = await actor(email);
    return (await inBook(() => unreadBulletins(who))).map(({ kind, number, revision }) => [
      kind,
      number,
      revision.letter,
    ]);
  };
  expect(await unread('apprentice@northgate.example')).toEqual([
    ['withdrawn', 'P-0173', 'A'],
    ['critical change', 'P-0137', 'B'],
  ]);
  // Whoever made or agreed to a change has read it.
  expect(await unread('editor@halden.example')).toEqual([['withdrawn', 'P-0173', 'A']]);
  expect(await unread('editor2@halden.example')).toEqual([]);
});

test("a shop's own sheet is in that shop's book alone", async () => {
  const titles = async (email: string) => {
    const who = await actor(email);
    const { items } = await inBook(() => listProcedures(who, { limit: 100 }));
    return items.filter((item) => item.book.kind === 'shop').map((item) => item.title);
  };
  expect(await titles('owner@pierstreet.example')).toEqual(['Receive an engine and tag it']);
  expect(await titles('apprentice@sawmill.example')).toEqual(['Lay up a B3 afloat for the winter']);
  expect(await titles('owner@northgate.example')).toEqual([]);
  expect(await titles('editor@halden.example')).toEqual([]);
});

test('every text in it is in canonical form, and the audit trail is whole', async () => {
  const rows = await running.db.read<{ source: string; number: string }>(
    `SELECT p.number, r.source FROM revisions r JOIN procedures p ON p.id = r.procedureId WHERE r.state <> 'returned'`,
  );
  for (const { number, source } of rows) {
    const parsed = await parsedText(source);
    expect(parsed.ok && parsed.canonical === source, number).toBe(true);
  }
  expect(await inBook(verifyAudit)).toMatchObject({ ok: true });
}, 60_000);

test('started again it is as it was', async () => {
  const counts = () =>
    running.db.read(
      'SELECT (SELECT count(*) FROM revisions) AS revisions, (SELECT count(*) FROM people) AS people, (SELECT count(*) FROM auditEntries) AS acts',
    );
  const before = await counts();
  await running.db.close();
  running = await start(config);
  expect(await counts()).toEqual(before);
  const who = await actor('apprentice@northgate.example');
  expect((await inBook(() => readSheet(who, 'P-0142'))).revision.letter).toBe('C');
});
