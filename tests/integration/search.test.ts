import type { APIContext } from 'astro';
import { gunzipSync, brotliDecompressSync } from 'node:zlib';
import { beforeEach, describe, expect, it } from 'vitest';
import { unpackBook, type PackedBook } from '@/domain/search/columns';
import { createSearch } from '@/domain/search/engine';
import { NO_FILTERS } from '@/domain/search/filters';
import { searchBook, searchIndex } from '@/server/book/search';
import { publish } from '@/server/review/publish';
import { GET } from '@/pages/api/v1/search-index';
import { openTestBook } from '../setup/database';
import { call } from './api/support/call';
import { makeNetwork, publishFirst, signedIn, type Member, type Network } from './api/support/network';
import { waiting } from './api/support/review';
import { text } from './api/support/text';

let network: Network;
const who = (name: string): Member => network.people[name]!;
const actorOf = async (name: string) => (await signedIn(who(name))).actor;

beforeEach(async () => {
  await openTestBook({ contentDir: 'content' });
  network = await makeNetwork();
  await publishFirst('P-0142', { source: text({ title: 'Reseal the valve cover', word: 'woollen' }) });
  await publishFirst('P-0150', { source: text({ title: 'Fit the oil pan', nm: 12 }) });
  await publishFirst('P-0900', { shopId: network.north, source: text({ title: 'Northern zeppelin cover' }) });
  await publishFirst('P-0901', { shopId: network.pier, source: text({ title: 'Pier zeppelin cover' }) });
});

const numbers = (answer: { body: { items: { number: string }[] } }) => answer.body.items.map((item) => item.number);

/** The index as a person's page gets it, through the route, in an encoding. */
async function fetchIndex(name: string, headers: Record<string, string> = {}) {
  const { actor, me } = await signedIn(who(name));
  const url = new URL('http://book.test/api/v1/search-index');
  const context = { request: new Request(url, { headers }), url, params: {}, locals: { actor, person: me } };
  return GET(context as unknown as APIContext);
}

describe('search over the API', () => {
  it('finds by measure, trade name and number', async () => {
    expect(numbers(await call(who('north.apprentice'), 'GET', '/search?q=89+lbf+in+rocker+cover'))).toEqual(['P-0142']);
    expect(numbers(await call(who('north.apprentice'), 'GET', '/search?q=sump'))).toEqual(['P-0150']);
    expect(numbers(await call(who('north.apprentice'), 'GET', '/search?q=p150'))).toEqual(['P-0150']);
  });

  it('filters, and refuses what is no query', async () => {
    const none = await call(who('north.apprentice'), 'GET', '/search?q=cover&engine=tarn-t24d');
    expect(none.body).toMatchObject({ items: [], total: 0, facets: { engine: { 'tarn-t18f': 3 } } });
    expect((await call(who('north.apprentice'), 'GET', `/search?q=${'x'.repeat(201)}`)).status).toBe(422);
    expect((await call(null, 'GET', '/search?q=cover')).status).toBe(401);
    expect((await call(null, 'GET', '/search-index')).status).toBe(401);
  });

  it('finds words that stand only in the prose, after the rest, and shows them', async () => {
    const { body } = await call(who('north.apprentice'), 'GET', '/search?q=woollen');
    expect(body.items).toHaveLength(1);
    expect(body).toMatchObject({ near: false, total: 1, facets: { system: { sealing: 1 } } });
    const prose = body.items[0].matched.find((one: { field: string }) => one.field === 'text');
    const [start, end] = prose.marks[0] as [number, number];
    expect(prose.text.slice(start, end)).toBe('woollen');
  });

  it('does not add sheets for their prose where a measure was asked for that they do not have', async () => {
    expect(numbers(await call(who('north.apprentice'), 'GET', '/search?q=12+Nm+woollen'))).toEqual(['P-0150']);
    expect((await call(who('north.apprentice'), 'GET', '/search?q=12+Nm+woollen')).body.near).toBe(true);
  });

  it('reads operators of the text index as words', async () => {
    for (const q of [
      '"',
      'a" OR "b',
      'NEAR(x y)',
      'cover AND NOT words:zeppelin',
      '*',
      "'; DROP TABLE searchWords; --",
    ])
      expect((await call(who('north.apprentice'), 'GET', `/search?q=${encodeURIComponent(q)}`)).status, q).toBe(200);
  });
});

describe('the books of other shops', () => {
  it('are in no answer and no index', async () => {
    for (const [name, own, other] of [
      ['north.apprentice', 'P-0900', 'P-0901'],
      ['pier.owner', 'P-0901', 'P-0900'],
    ] as const) {
      for (const q of ['zeppelin', 'p90', other, 'cover', '', '10 Nm', 'zeppelin cover woollen']) {
        const answer = await call(who(name), 'GET', `/search?q=${encodeURIComponent(q)}`);
        expect(numbers(answer), q).not.toContain(other);
      }
      expect(numbers(await call(who(name), 'GET', '/search?q=zeppelin'))).toEqual([own]);
      const bytes = await (await fetchIndex(name)).text();
      expect(bytes).toContain(own);
      expect(bytes).not.toContain(other);
      expect(bytes).not.toContain(own === 'P-0900' ? 'Pier zeppelin' : 'Northern zeppelin');
    }
  });

  it('leave nothing to somebody without a role', async () => {
    expect((await call(who('nobody'), 'GET', '/search?q=cover')).body.total).toBe(0);
    expect(unpackBook((await (await fetchIndex('nobody')).json()) as PackedBook).documents).toEqual([]);
  });
});

describe('the index', () => {
  it('answers 304 to who has it, and a new tag once a sheet is published', async () => {
    const first = await fetchIndex('north.senior');
    const tag = first.headers.get('etag')!;
    expect((await fetchIndex('north.senior', { 'if-none-match': tag })).status).toBe(304);
    await publishFirst('P-0160', { source: text({ title: 'Balance the flywheel' }) });
    const next = await fetchIndex('north.senior', { 'if-none-match': tag });
    expect(next.status).toBe(200);
    expect(next.headers.get('etag')).not.toBe(tag);
    expect(numbers(await call(who('north.senior'), 'GET', '/search?q=fly+wheel'))).toEqual(['P-0160']);
  });

  it('knows the next revision of a sheet at once, and no more of the one before', async () => {
    const before = await fetchIndex('north.apprentice');
    expect(numbers(await call(who('north.apprentice'), 'GET', '/search?q=valve+cover'))).toContain('P-0142');
    const { id } = await waiting(who('north.senior'), 'P-0142', { title: 'Reseal the tappet lid' });
    await publish(await actorOf('common.editor'), id);
    const after = await fetchIndex('north.apprentice', { 'if-none-match': before.headers.get('etag')! });
    expect(after.status).toBe(200);
    expect(await after.text()).toContain('Reseal the tappet lid');
    const { body } = await call(who('north.apprentice'), 'GET', '/search?q=tappet+lid');
    expect(body.items[0]).toMatchObject({ number: 'P-0142', letter: 'B', title: 'Reseal the tappet lid' });
  });

  it('is the same in every encoding', async () => {
    const plain = await (await fetchIndex('north.senior')).text();
    const zipped = await fetchIndex('north.senior', { 'accept-encoding': 'gzip, deflate' });
    expect(zipped.headers.get('content-encoding')).toBe('gzip');
    expect(gunzipSync(Buffer.from(await zipped.arrayBuffer())).toString()).toBe(plain);
    const small = await fetchIndex('north.senior', { 'accept-encoding': 'gzip, deflate, br' });
    expect(small.headers.get('content-encoding')).toBe('br');
    expect(small.headers.get('vary')).toContain('Accept-Encoding');
    expect(brotliDecompressSync(Buffer.from(await small.arrayBuffer())).toString()).toBe(plain);
    const refused = await fetchIndex('north.senior', { 'accept-encoding': 'br;q=0, gzip;q=0' });
    expect(refused.headers.get('content-encoding')).toBeNull();
  });

  it('gives the page the same order as the server', async () => {
    const actor = await actorOf('north.senior');
    const { index } = await searchIndex(actor);
    const page = createSearch(unpackBook(JSON.parse(index.bytes.toString()) as PackedBook));
    for (const q of [
      'cover',
      '10 Nm',
      '89 lbf in cover',
      'sump',
      'p0',
      '',
      'zeppelin',
      'vlave',
      'oil cover',
      'tighten',
    ]) {
      const server = await searchBook(actor, q, NO_FILTERS);
      const withoutProse = server.hits.filter((hit) => !hit.matched.some((one) => one.field === 'text'));
      expect(
        page.query(q).hits.map((hit) => hit.number),
        q,
      ).toEqual(withoutProse.map((hit) => hit.number));
    }
  });

  it('holds no prose', async () => {
    const bytes = await (await fetchIndex('north.senior')).text();
    expect(bytes).toContain('Wipe the joint');
    expect(bytes).not.toContain('woollen');
    expect(bytes).not.toContain('Wipe both faces');
  });
});
