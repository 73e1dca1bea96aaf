import { describe, expect, it } from 'vitest';
import { atTime } from '@/server/clock';
import { app } from '@/server/context';
import { call } from './support/call';
import { publishFirst, type Member } from './support/network';
import { waiting } from './support/review';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who, shop } = useNetwork();

const start = async (as: Member, word = 'dry') =>
  (
    await call(as, 'POST', '/procedures/P-0142/proposals', {
      body: { base: 'A', source: text({ word }), reason: 'Why' },
    })
  ).body;
const save = (as: Member, id: string, version: number, body: object, minute = 0) =>
  atTime(`2027-01-01T08:${String(minute).padStart(2, '0')}:00.000Z`, () =>
    call(as, 'PUT', `/proposals/${id}`, { body, headers: { 'if-match': `"${version}"` } }),
  );
const list = async (as: Member, id: string, query = '') =>
  (await call(as, 'GET', `/proposals/${id}/versions${query}`)).body;
const numbers = (items: { n: number }[]) => items.map(({ n }) => n);
const read = (as: Member, id: string, n: number) => call(as, 'GET', `/proposals/${id}/versions/${n}`);
const restore = (as: Member, id: string, n: number, version: number | null) =>
  call(as, 'POST', `/proposals/${id}/versions/${n}/restore`, {
    headers: version === null ? {} : { 'if-match': `"${version}"` },
  });

describe('versions of a draft', () => {
  it('are made by each save, thinned within five minutes, and told in words against the one that is kept before', async () => {
    const me = who('north.senior');
    const { id } = await start(me);
    for (const [i, [minute, nm]] of [
      [0, 11],
      [1, 12],
      [2, 13],
      [7, 14],
    ].entries())
      expect((await save(me, id, i + 1, { source: text({ word: 'dry', nm: nm! }), page: 'p' }, minute)).status).toBe(
        200,
      );
    const { items, next } = await list(me, id);
    expect([numbers(items), next]).toEqual([[5, 4, 2, 1], null]);
    expect(items[0]).toMatchObject({
      kind: 'write',
      current: true,
      base: 'A',
      at: '2027-01-01T08:07:00.000Z',
      person: { id: me.id, name: me.name },
      what: ['torque Cover bolt changed'],
    });
    expect(items[3]).toMatchObject({ kind: 'start', current: false, what: [] });
    const broken = await save(me, id, 5, { source: 'no head at all', reason: 'Other' }, 8);
    expect(broken.status).toBe(200);
    const [latest] = (await list(me, id)).items;
    expect(latest.what).toEqual([expect.stringMatching(/^\d+ lines of the text$/), 'reason changed']);
    expect((await read(me, id, 4)).body).toMatchObject({ source: text({ word: 'dry', nm: 13 }), comparison: null });
  });

  it('are given page by page', async () => {
    const me = who('north.senior');
    const { id } = await start(me);
    for (let v = 1; v <= 5; v += 1) await save(me, id, v, { reason: `Reason ${v}`, page: `p${v}` }, v);
    const first = await list(me, id, '?limit=4');
    expect([numbers(first.items), first.next]).toEqual([[6, 5, 4, 3], '3']);
    const rest = await list(me, id, `?limit=4&cursor=${first.next}`);
    expect([numbers(rest.items), rest.next]).toEqual([[2, 1], null]);
  });

  it('begin with what stood there where a draft is older than they are', async () => {
    const me = who('north.senior');
    const { id } = await start(me);
    const { db } = await app();
    // As an update of the product finds it.
    await db.write(async () => {
      await db.sequelize.query('DROP TRIGGER draftVersions_first_and_sent_in_stay');
      await db.sequelize.query('DELETE FROM draftVersions');
    });
    expect((await list(me, id)).items).toEqual([]);
    await save(me, id, 1, { source: text({ word: 'oiled' }) });
    expect((await list(me, id)).items.map(({ n, kind }: { n: number; kind: string }) => [n, kind])).toEqual([
      [2, 'write'],
      [1, 'start'],
    ]);
    expect((await read(me, id, 1)).body.source).toBe(text({ word: 'dry' }));
  });

  it('go with a draft that is thrown away', async () => {
    const me = who('north.senior');
    const { id } = await start(me);
    await save(me, id, 1, { reason: 'x' });
    expect((await call(me, 'DELETE', `/proposals/${id}`)).status).toBe(204);
    const { db } = await app();
    expect(await db.read('SELECT n FROM draftVersions')).toEqual([]);
  });
});

describe('going back to a version', () => {
  it('makes a new one, brings text and reason back, and can be gone back on', async () => {
    const me = who('north.senior');
    const { id } = await start(me);
    await save(me, id, 1, { source: text({ word: 'oiled' }), reason: 'Oil', page: 'p' });
    const back = await restore(me, id, 1, 2);
    expect(back).toMatchObject({ status: 200, body: { version: 3, source: text({ word: 'dry' }), reason: 'Why' } });
    expect(back.headers.get('etag')).toBe('"3"');
    const { items } = await list(me, id);
    expect(items[0]).toMatchObject({
      n: 3,
      kind: 'restore',
      of: 1,
      current: true,
      what: ['step 1 changed', 'reason changed'],
    });
    expect(numbers(items)).toEqual([3, 2, 1]);
    expect((await restore(me, id, 2, 3)).body).toMatchObject({ source: text({ word: 'oiled' }), reason: 'Oil' });
    // What stands already makes no version.
    expect((await restore(me, id, 2, 4)).body.version).toBe(4);
  });

  it('is refused where the draft moved on, and without the version that was seen', async () => {
    const me = who('north.senior');
    const { id } = await start(me);
    await save(me, id, 1, { source: text({ word: 'oiled' }) });
    const late = await restore(me, id, 1, 1);
    expect(late).toMatchObject({ status: 409, body: { type: '/problems/stale', version: 2 } });
    expect((await restore(me, id, 1, null)).status).toBe(428);
    expect((await call(me, 'GET', `/proposals/${id}`)).body.source).toBe(text({ word: 'oiled' }));
    const both = await Promise.all([restore(me, id, 1, 2), save(me, id, 2, { reason: 'At the same time' })]);
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('goes back to the older base too, and says what going back would change', async () => {
    const me = who('pier.senior');
    const { id } = await start(me);
    const winner = await waiting(who('north.senior'), 'P-0142', { nm: 10, title: 'Another title' });
    expect((await call(who('common.editor'), 'POST', `/proposals/${winner.id}/publish`)).status).toBe(200);
    await save(me, id, 1, { base: 'B', source: text({ word: 'dry', title: 'Another title' }) });
    expect((await list(me, id)).items[0]).toMatchObject({ kind: 'merge', base: 'B', what: ['title changed'] });
    const { body } = await read(me, id, 1);
    expect(body.comparison.values).toMatchObject([
      { path: 'title', from: 'Another title', to: 'Reseal the test cover' },
    ]);
    expect((await restore(me, id, 1, 2)).body).toMatchObject({ base: 'A', stale: true });
  });
});

it('keeps what was sent in and returned, and nobody else sees what was typed in between', async () => {
  const me = who('north.senior');
  const { id } = await start(me);
  expect((await read(who('common.editor'), id, 1)).status).toBe(404);
  expect((await call(who('common.editor'), 'GET', `/proposals/${id}/versions`)).status).toBe(404);
  await call(me, 'POST', `/proposals/${id}/submit`);
  const editor = who('common.editor');
  await call(editor, 'POST', `/proposals/${id}/return`, { body: { reason: 'Which cloth?' } });
  await save(me, id, 3, { source: text({ word: 'lint-free' }) });
  const mine = (await list(me, id)).items;
  expect(mine.map(({ kind }: { kind: string }) => kind)).toEqual(['write', 'return', 'submit', 'start']);
  expect(mine[1]).toMatchObject({ person: { id: editor.id }, what: [] });
  for (const name of ['common.editor', 'pier.apprentice', 'north.technician']) {
    expect((await list(who(name), id)).items.map(({ kind }: { kind: string }) => kind)).toEqual(['submit']);
    expect((await read(who(name), id, 2)).body.source).toContain('dry cloth');
    for (const n of [1, 3, 4, 99]) expect((await read(who(name), id, n)).status).toBe(404);
    expect((await restore(who(name), id, 2, 4)).status).toBe(403);
  }
  await publishFirst('P-0500', { shopId: shop('north') });
  const own = (
    await call(me, 'POST', '/procedures/P-0500/proposals', {
      body: { base: 'A', source: text({ word: 'wet' }), reason: 'r' },
    })
  ).body;
  await call(me, 'POST', `/proposals/${own.id}/submit`);
  expect((await call(who('pier.editor'), 'GET', `/proposals/${own.id}/versions`)).status).toBe(404);
  expect((await restore(who('pier.editor'), own.id, 1, 2)).status).toBe(404);
});

it('keeps words that were set aside for those of another tab, and never takes them for the draft', async () => {
  const me = who('north.senior');
  const { id } = await start(me);
  await save(me, id, 1, { source: text({ word: 'oiled' }) });
  const body = { source: text({ word: 'mine' }), reason: 'Mine' };
  expect((await call(me, 'POST', `/proposals/${id}/versions`, { body })).status).toBe(204);
  await save(me, id, 2, { source: text({ word: 'oiled' }), reason: 'After' });
  const { items } = await list(me, id);
  expect(items.map(({ kind, what }: { kind: string; what: string[] }) => [kind, what])).toEqual([
    ['write', ['reason changed']],
    ['aside', ['step 1 changed', 'reason changed']],
    ['write', ['step 1 changed']],
    ['start', []],
  ]);
  expect((await restore(me, id, 3, 3)).body).toMatchObject({ source: body.source, reason: 'Mine' });
  expect((await call(who('pier.senior'), 'POST', `/proposals/${id}/versions`, { body })).status).toBe(404);
  const long = { source: 'x'.repeat(70_000), reason: '' };
  expect((await call(me, 'POST', `/proposals/${id}/versions`, { body: long })).status).toBe(422);
});

describe('the database itself holds that', () => {
  it('a version never changes, and the first and what was sent in stay', async () => {
    const me = who('north.senior');
    const { id } = await waiting(me, 'P-0142');
    const { db } = await app();
    const sql = (statement: string) => db.write(async () => void (await db.sequelize.query(statement)));
    await expect(sql("UPDATE draftVersions SET reason = 'x'")).rejects.toThrow('A version of a draft never changes');
    await expect(sql("UPDATE draftVersions SET packed = x'00'")).rejects.toThrow('never changes');
    await expect(sql('DELETE FROM draftVersions WHERE n = 1')).rejects.toThrow('kept with it');
    await expect(sql("DELETE FROM draftVersions WHERE kind = 'submit'")).rejects.toThrow('kept with it');
    await expect(sql("UPDATE draftVersions SET what = '[]'")).resolves.toBeUndefined();
    expect((await list(me, id)).items).toHaveLength(2);
  });
});
