import { describe, expect, it } from 'vitest';
import { call } from './support/call';
import { publishFirst, type Member } from './support/network';
import { waiting } from './support/review';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who, shop } = useNetwork();

/** Follows `next` to the end. */
async function pages(as: Member, path: string, limit: number, keyOf: (item: never) => string): Promise<string[][]> {
  const found: string[][] = [];
  let cursor = '';
  do {
    const { body } = await call(as, 'GET', `${path}?limit=${limit}${cursor && `&cursor=${cursor}`}`);
    found.push(body.items.map(keyOf));
    cursor = body.next ?? '';
  } while (cursor);
  return found;
}

describe('lists', () => {
  it('gives the procedures page by page, each once, by number and not by its text', async () => {
    for (const number of ['P-0009', 'P-10000', 'P-9999']) await publishFirst(number);
    await publishFirst('P-0143', { shopId: shop('north') });
    const numbers = (as: Member) => pages(as, '/procedures', 2, (item: { number: string }) => item.number);
    expect(await numbers(who('north.apprentice'))).toEqual([['P-0009', 'P-0142'], ['P-0143', 'P-9999'], ['P-10000']]);
    expect(await numbers(who('steward'))).toEqual([
      ['P-0009', 'P-0142'],
      ['P-9999', 'P-10000'],
    ]);
    expect(await numbers(who('nobody'))).toEqual([[]]);
  });

  it('gives my proposals, what waits for me first', async () => {
    const me = who('north.senior');
    const returned = await waiting(me, 'P-0142', { word: 'dry' });
    await call(who('common.editor'), 'POST', `/proposals/${returned.id}/return`, { body: { reason: 'Say which' } });
    const proposed = await waiting(me, 'P-0142', { word: 'oiled' });
    const draft = await call(me, 'POST', '/procedures/P-0142/proposals', {
      body: { base: 'A', source: text({ word: 'wet' }) },
    });
    await waiting(who('pier.senior'), 'P-0142', { word: 'warm' });
    expect(await pages(me, '/proposals', 2, (item: { id: string }) => item.id)).toEqual([
      [returned.id, draft.body.id],
      [proposed.id],
    ]);
  });

  it('gives the desk worst first, without my own and without what I may not judge', async () => {
    await publishFirst('P-0500', { shopId: shop('north') });
    const ordinary = await waiting(who('north.senior'), 'P-0142', { word: 'dry' });
    const critical = await waiting(who('north.senior'), 'P-0142', { nm: 12 });
    const own = await waiting(who('common.editor'), 'P-0142', { nm: 13 });
    const inShop = await waiting(who('north.technician'), 'P-0500', { nm: 12 });
    const desk = async (name: string) =>
      (await call(who(name), 'GET', '/review-desk')).body.items.map((i: { id: string; next: string }) => [
        i.id,
        i.next,
      ]);
    expect(await desk('common.editor')).toEqual([
      [critical.id, 'agree'],
      [ordinary.id, 'publish'],
    ]);
    expect(await desk('common.editor2')).toEqual([
      [critical.id, 'agree'],
      [own.id, 'agree'],
      [ordinary.id, 'publish'],
    ]);
    expect(await desk('north.owner')).toEqual([[inShop.id, 'agree']]);
    await call(who('common.editor2'), 'POST', `/proposals/${critical.id}/agree`);
    expect(await desk('common.editor')).toEqual([
      [critical.id, 'publish'],
      [ordinary.id, 'publish'],
    ]);
    expect((await desk('common.editor2'))[0]).toEqual([critical.id, 'wait']);
  });
});

describe('a sheet that is asked for again', () => {
  it('is 304 while nothing changed, and new once a proposal waits or somebody changed their name', async () => {
    const reader = who('pier.apprentice');
    const get = (tag?: string) =>
      call(reader, 'GET', '/procedures/P-0142', { headers: tag ? { 'if-none-match': tag } : {} });
    const tag = (await get()).headers.get('etag')!;
    expect(await get(tag)).toMatchObject({ status: 304, body: null });
    expect(await get(`W/${tag}, "other"`)).toMatchObject({ status: 304 });
    expect((await get('"other"')).status).toBe(200);
    await waiting(who('north.senior'), 'P-0142');
    const changed = await get(tag);
    expect(changed).toMatchObject({ status: 200, body: { openProposals: 1 } });
    expect(changed.headers.get('etag')).not.toBe(tag);
  });
});

describe('a draft', () => {
  it('is thrown away by its author, and its number is free again', async () => {
    const me = who('north.senior');
    const start = () => call(me, 'POST', '/procedures', { body: { book: 'common', source: text({ title: 'New' }) } });
    const { body } = await start();
    expect((await call(who('pier.senior'), 'DELETE', `/proposals/${body.id}`)).status).toBe(404);
    expect((await call(me, 'DELETE', `/proposals/${body.id}`, { headers: { 'if-match': '"9"' } })).status).toBe(409);
    expect((await call(me, 'DELETE', `/proposals/${body.id}`)).status).toBe(204);
    expect((await call(me, 'GET', `/proposals/${body.id}`)).status).toBe(404);
    expect((await start()).body.number).toBe(body.number);
  });

  it('stays once it was sent in', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    await call(who('common.editor'), 'POST', `/proposals/${id}/return`, { body: { reason: 'Say which' } });
    expect((await call(who('north.senior'), 'DELETE', `/proposals/${id}`)).status).toBe(409);
  });
});
