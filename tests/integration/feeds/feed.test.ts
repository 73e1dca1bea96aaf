import { describe, expect, test, vi } from 'vitest';
import { answerFeed } from '@/server/feeds/answer';
import { FETCHES, MISSES } from '@/server/feeds/limits';
import { keyHashOf, listFeeds, makeFeedKey, revokeFeedKey } from '@/server/feeds/keys';
import { withHeaders } from '@/server/front/headers';
import { isOpen } from '@/server/front/openPaths';
import { app } from '@/server/context';
import { publish } from '@/server/review/publish';
import { bringBack, withdraw } from '@/server/bulletins/withdraw';
import { verifyAudit } from '@/server/audit/verify';
import { openTestBook } from '../../setup/database';
import { elements, given, readAtom, texts } from '../../factories/atom';
import { makeNetwork, publishFirst, signedIn, type Member } from '../api/support/network';
import { agreed, waiting } from '../api/support/review';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who, shop } = useNetwork();
const actorOf = async (person: Member) => (await signedIn(person)).actor;

let places = 0;
/** Each test asks from a network address of its own, as misses are counted by it. */
const fetchFeed = (key: string, { query = '', headers = {}, address = `198.51.100.${(places += 1)}` } = {}) => {
  const url = new URL(`http://book.test/feed/${key}.atom${query}`);
  return answerFeed(key, new Request(url, { headers }), url, address);
};
const readFeed = async (key: string, query = '') => {
  const response = await fetchFeed(key, { query });
  expect(response.status).toBe(200);
  return readAtom(await response.text());
};
const keyOf = async (person: Member, shopId: string | null) => makeFeedKey(await actorOf(person), shopId, null);
const titles = async (key: string, query = '') => texts(await readFeed(key, query), '//a:entry/a:title');

async function publishChange(number = 'P-0142', change: Parameters<typeof text>[0] = { nm: 12 }) {
  const { id } = await waiting(who('north.senior'), number, change);
  await agreed([who('common.editor')], id);
  return publish(await actorOf(who('common.editor2')), id);
}

describe('what a feed tells', () => {
  test('publications, withdrawals and bringings back, latest first, with permanent ids and addresses', async () => {
    const key = await keyOf(who('north.apprentice'), shop('north'));
    const published = await publishChange();
    const editor = await actorOf(who('common.editor'));
    await withdraw(editor, 'P-0142', 'The torque is doubtful');
    await bringBack(editor, 'P-0142', 'It was checked');
    const doc = await readFeed(key);
    expect(texts(doc, '//a:entry/a:title')).toEqual([
      'P-0142 B, Reseal the test cover: brought back',
      'P-0142 B, Reseal the test cover: withdrawn',
      'P-0142 B, Reseal the test cover: published',
      'P-0142 A, Reseal the test cover: published',
    ]);
    const [back, , second] = elements(doc, '//a:entry');
    expect(texts(second!, 'a:id')).toEqual([`urn:uuid:${published.id}`]);
    expect(given(second!, 'a:link', 'href')).toEqual(['http://book.test/procedures/P-0142/revisions/B']);
    expect(texts(second!, 'a:author/a:name')).toEqual(['north senior']);
    expect(texts(second!, 'a:contributor/a:name')).toEqual(['common.editor', 'common.editor2']);
    expect(texts(second!, 'a:summary')[0]).toContain('A reason.\nWhat changed:\nA torque changes: Cover bolt.');
    expect(texts(back!, 'a:author/a:name')).toEqual(['common.editor']);
    expect(texts(doc, '/a:feed/a:updated')).toEqual(texts(back!, 'a:updated'));
    // Fetched again it is the same to the byte, and a reader that holds it is told so.
    const [once, again] = [await fetchFeed(key), await fetchFeed(key)];
    expect(await again.text()).toBe(await once.text());
    const held = await fetchFeed(key, { headers: { 'if-none-match': once.headers.get('etag') ?? '' } });
    expect([held.status, await held.text()]).toEqual([304, '']);
  });

  test('nothing of the text: no torque, no step; a draft and a proposal are not told', async () => {
    const key = await keyOf(who('north.senior'), shop('north'));
    await waiting(who('north.senior'), 'P-0142', { word: 'unheard' });
    const body = await (await fetchFeed(key)).text();
    for (const secret of ['N·m', 'Wipe', 'unheard']) expect(body).not.toContain(secret);
    expect(await titles(key)).toHaveLength(1);
  });

  test('it goes on page by page without a gap, also where much was published at one instant', async () => {
    for (let n = 200; n < 212; n += 1) await publishFirst(`P-0${n}`);
    const key = await keyOf(who('north.apprentice'), shop('north'));
    const whole = await titles(key);
    expect(whole).toHaveLength(13);
    const found: string[] = [];
    for (let query = '?limit=5', pages = 0; query; pages += 1) {
      expect(pages).toBeLessThan(4);
      const doc = await readFeed(key, query);
      found.push(...texts(doc, '//a:entry/a:title'));
      expect(given(doc, '/a:feed/a:link[@rel="first"]', 'href')).toEqual([`http://book.test/feed/${key}.atom?limit=5`]);
      const [next] = given(doc, '/a:feed/a:link[@rel="next"]', 'href');
      query = next ? new URL(next).search : '';
    }
    expect(found).toEqual(whole);
    for (const query of ['?before=nonsense', '?before=0192f3a4-0000-7000-8000-000000000001'])
      expect((await fetchFeed(key, { query })).status).toBe(404);
    expect(await titles(key, '?limit=nonsense')).toEqual(whole);
  });

  test('a feed of which nothing is told yet is a feed', async () => {
    await openTestBook();
    const network = await makeNetwork();
    const key = await keyOf(network.people['common.editor']!, null);
    const doc = await readFeed(key);
    expect(texts(doc, '//a:entry')).toEqual([]);
    expect(texts(doc, '/a:feed/a:updated')).toHaveLength(1);
  });
});

describe('whose feed it is', () => {
  test('a shop never hears of another one, nor does a feed of the common book of any', async () => {
    await publishFirst('P-0901', { shopId: shop('north'), source: text({ title: 'Only north does this' }) });
    await publishFirst('P-0902', { shopId: shop('pier'), source: text({ title: 'Only pier does this' }) });
    const told = async (person: string, shopId: string | null) =>
      (await titles(await keyOf(who(person), shopId))).join('\n');
    const north = await told('north.apprentice', shop('north'));
    expect(north).toContain('Only north');
    expect(north).not.toContain('Only pier');
    const pier = await told('pier.owner', shop('pier'));
    expect(pier).toContain('Only pier');
    expect(pier).not.toContain('Only north');
    for (const person of ['common.editor', 'steward']) {
      const common = await told(person, null);
      expect(common).not.toContain('Only');
    }
  });

  test('somebody with roles in two shops hears of one shop in each feed', async () => {
    const { db } = await app();
    const { id } = who('north.senior');
    await db.models.Membership.create({ personId: id, scope: 'shop', shopId: shop('pier'), role: 'technician' });
    await publishFirst('P-0901', { shopId: shop('north'), source: text({ title: 'Only north does this' }) });
    await publishFirst('P-0902', { shopId: shop('pier'), source: text({ title: 'Only pier does this' }) });
    const inNorth = await keyOf(who('north.senior'), shop('north'));
    const inPier = await keyOf(who('north.senior'), shop('pier'));
    expect((await titles(inNorth)).join()).not.toContain('Only pier');
    expect((await titles(inPier)).join()).not.toContain('Only north');
    expect((await listFeeds(await actorOf(who('north.senior')))).map(({ name }) => name)).toEqual([
      'Common book and Test shop north',
      'Common book and Test shop pier',
    ]);
  });

  test('nobody makes a feed of a shop they have no role in, or without any role', async () => {
    for (const [person, shopId] of [
      ['north.owner', shop('pier')],
      ['steward', shop('north')],
      ['nobody', null],
      ['nobody', shop('north')],
    ] as const)
      await expect(keyOf(who(person), shopId)).rejects.toMatchObject({ status: 404 });
    expect(await listFeeds(await actorOf(who('nobody')))).toEqual([]);
  });
});

describe('a key ends', () => {
  const gone = async (key: string) => {
    const response = await fetchFeed(key);
    return [response.status, await response.text()];
  };
  const unknown = async () => gone('A'.repeat(43));

  test('with the role, and comes back with it', async () => {
    const { db } = await app();
    const key = await keyOf(who('north.technician'), shop('north'));
    const where = { personId: who('north.technician').id };
    await db.models.Membership.destroy({ where });
    expect(await gone(key)).toEqual(await unknown());
    // Still in the network, but no longer in that shop.
    await db.models.Membership.create({ ...where, scope: 'shop', shopId: shop('pier'), role: 'technician' });
    expect(await gone(key)).toEqual(await unknown());
    await db.models.Membership.create({ ...where, scope: 'shop', shopId: shop('north'), role: 'apprentice' });
    expect((await gone(key))[0]).toBe(200);
  });

  test('when it is revoked or replaced, and the feed keeps its name', async () => {
    const actor = await actorOf(who('north.owner'));
    const north = shop('north');
    const standing = async () => (await listFeeds(actor))[0]?.madeAt ?? null;
    const first = await makeFeedKey(actor, north, null);
    const id = texts(await readFeed(first), '/a:feed/a:id');
    const second = await makeFeedKey(actor, north, await standing());
    expect(await gone(first)).toEqual(await unknown());
    expect(texts(await readFeed(second), '/a:feed/a:id')).toEqual(id);
    await revokeFeedKey(actor, north, (await standing())!);
    expect(await gone(second)).toEqual(await unknown());
    expect(await standing()).toBeNull();
    const third = await makeFeedKey(actor, north, null);
    expect(texts(await readFeed(third), '/a:feed/a:id')).toEqual(id);
    const { db } = await app();
    const acts = await db.read(`SELECT act, shopId FROM auditEntries WHERE subjectType = 'feed' ORDER BY seq`);
    expect(acts).toEqual(['made', 'replaced', 'revoked', 'made'].map((act) => ({ act: `feed.${act}`, shopId: north })));
    expect((await verifyAudit()).ok).toBe(true);
  });

  test('when the account can no longer sign in', async () => {
    const { db } = await app();
    const key = await keyOf(who('north.owner'), shop('north'));
    await db.models.Person.update({ passwordHash: null }, { where: { id: who('north.owner').id } });
    expect(await gone(key)).toEqual(await unknown());
  });

  test('not because a page was sent twice: the second makes nothing and says so', async () => {
    const actor = await actorOf(who('north.owner'));
    const key = await makeFeedKey(actor, shop('north'), null);
    await expect(makeFeedKey(actor, shop('north'), null)).rejects.toMatchObject({ status: 409 });
    expect((await gone(key))[0]).toBe(200);
  });
});

describe('the key is kept from others', () => {
  test('it is 256 random bits, of which only the hash is stored', async () => {
    const key = await keyOf(who('north.owner'), shop('north'));
    expect(key).toMatch(/^[A-Za-z0-9_-]{43}$/);
    expect(Buffer.from(key, 'base64url')).toHaveLength(32);
    const { db } = await app();
    const tables = await db.read<{ name: string }>(`SELECT name FROM sqlite_master WHERE type = 'table'`);
    let stored = '';
    for (const { name } of tables) stored += JSON.stringify(await db.read(`SELECT * FROM "${name}"`));
    expect(stored).toContain(keyHashOf(key));
    expect(stored).not.toContain(key);
  });

  test('no answer passes it on, and nothing is written to a log', async () => {
    const logs = (['log', 'warn', 'info', 'debug'] as const).map((name) => vi.spyOn(console, name));
    const key = await keyOf(who('north.owner'), shop('north'));
    for (const asked of [key, 'A'.repeat(43), 'short']) {
      const { headers } = withHeaders(await fetchFeed(asked), false);
      expect(headers.get('referrer-policy')).toBe('no-referrer');
      expect(headers.get('x-robots-tag')).toContain('noindex');
      expect(headers.get('cache-control')).toMatch(/private/);
    }
    expect(await (await fetchFeed('A'.repeat(43))).text()).not.toContain('AAAA');
    for (const log of logs) expect(log).not.toHaveBeenCalled();
    expect(isOpen(`/feed/${key}.atom`)).toBe(true);
    expect(isOpen('/feed/../profile')).toBe(false);
  });

  test('who asks too often waits: for one feed, and for what is not there', async () => {
    const key = await keyOf(who('pier.senior'), shop('pier'));
    for (let n = 0; n < FETCHES; n += 1) expect((await fetchFeed(key, { address: '203.0.113.1' })).status).toBe(200);
    const over = await fetchFeed(key, { address: '203.0.113.1' });
    expect(over.status).toBe(429);
    expect(Number(over.headers.get('retry-after'))).toBeGreaterThan(0);
    for (let n = 0; n < MISSES; n += 1) expect((await fetchFeed('x', { address: '203.0.113.2' })).status).toBe(404);
    expect((await fetchFeed('x', { address: '203.0.113.2' })).status).toBe(429);
    expect((await fetchFeed('x', { address: '203.0.113.3' })).status).toBe(404);
    // A good key works from there all the same.
    const good = await keyOf(who('pier.editor'), shop('pier'));
    expect((await fetchFeed(good, { address: '203.0.113.2' })).status).toBe(200);
  });
});
