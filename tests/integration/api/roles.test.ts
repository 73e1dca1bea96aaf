import { beforeEach, describe, expect, it } from 'vitest';
import { call } from './support/call';
import { publishFirst, type Member } from './support/network';
import { waiting } from './support/review';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

// PRODUCT: who may do what, in the common book and in a shop's own. The author of the proposals is the
// technician of the shop north, and each shop has one editor.
const PEOPLE = [
  ...['apprentice', 'technician', 'senior', 'editor', 'owner'].map((role) => `north.${role}`),
  ...['apprentice', 'technician', 'senior', 'editor', 'owner'].map((role) => `pier.${role}`),
  'common.editor',
  'steward',
  'nobody',
];

/** Status for each of PEOPLE, in their order. */
const EXPECTED: Record<'common' | 'shop', Record<string, string>> = {
  common: {
    'read the sheet': '200 200 200 200 200 | 200 200 200 200 200 | 200 200 404',
    'propose a change': '403 201 201 201 201 | 403 201 201 201 201 | 201 403 404',
    'propose a new procedure': '403 201 201 201 201 | 403 201 201 201 201 | 201 403 404',
    'read the proposal': '200 200 200 200 200 | 200 200 200 200 200 | 200 200 404',
    'edit the proposal': '403 409 403 403 403 | 403 403 403 403 403 | 403 403 404',
    return: '403 403 403 403 403 | 403 403 403 403 403 | 200 403 404',
    decline: '403 403 403 403 403 | 403 403 403 403 403 | 200 403 404',
    agree: '403 403 403 403 403 | 403 403 403 403 403 | 200 403 404',
    'agree to a critical change': '403 403 403 403 403 | 403 403 403 403 403 | 200 403 404',
    'override a failed clamp check': '403 403 403 403 403 | 403 403 403 403 403 | 200 403 404',
    publish: '403 403 403 403 403 | 403 403 403 403 403 | 200 403 404',
    'publish a critical change alone': '403 403 403 403 403 | 403 403 403 403 403 | 409 403 404',
    'see the review desk': '403 403 200 200 200 | 403 403 200 200 200 | 200 403 403',
  },
  shop: {
    'read the sheet': '200 200 200 200 200 | 404 404 404 404 404 | 404 404 404',
    'propose a change': '403 201 201 201 201 | 404 404 404 404 404 | 404 404 404',
    'propose a new procedure': '403 201 201 201 201 | 404 404 404 404 404 | 404 404 404',
    'read the proposal': '200 200 200 200 200 | 404 404 404 404 404 | 404 404 404',
    'edit the proposal': '403 409 403 403 403 | 404 404 404 404 404 | 404 404 404',
    return: '403 403 403 200 403 | 404 404 404 404 404 | 404 404 404',
    decline: '403 403 403 200 403 | 404 404 404 404 404 | 404 404 404',
    agree: '403 403 403 200 403 | 404 404 404 404 404 | 404 404 404',
    'agree to a critical change': '403 403 200 200 200 | 404 404 404 404 404 | 404 404 404',
    'override a failed clamp check': '403 403 403 200 403 | 404 404 404 404 404 | 404 404 404',
    publish: '403 403 403 200 403 | 404 404 404 404 404 | 404 404 404',
    'publish a critical change alone': '403 403 403 409 403 | 404 404 404 404 404 | 404 404 404',
  },
};

const { who, shop } = useNetwork();
beforeEach(() => publishFirst('P-0500', { shopId: shop('north') }));

/** A fresh proposal for each cell, so that no cell depends on the one before it. */
async function cell(act: string, person: Member, number: string, book: string): Promise<number> {
  const author = who('north.technician');
  const post = async (verb: string, body?: object, change?: Parameters<typeof text>[0]) => {
    const { id } = await waiting(author, number, change);
    return call(person, 'POST', `/proposals/${id}/${verb}`, { body });
  };
  const acts: Record<string, () => Promise<{ status: number }>> = {
    'read the sheet': () => call(person, 'GET', `/procedures/${number}`),
    'propose a change': () =>
      call(person, 'POST', `/procedures/${number}/proposals`, { body: { base: 'A', source: text({ nm: 11 }) } }),
    'propose a new procedure': () => call(person, 'POST', '/procedures', { body: { book, source: text() } }),
    'read the proposal': async () => call(person, 'GET', `/proposals/${(await waiting(author, number)).id}`),
    'edit the proposal': async () => {
      const { id, version } = await waiting(author, number);
      return call(person, 'PUT', `/proposals/${id}`, {
        body: { reason: 'Another' },
        headers: { 'if-match': `"${version}"` },
      });
    },
    return: () => post('return', { reason: 'Say which' }),
    decline: () => post('decline', { reason: 'Not safe' }),
    agree: () => post('agree'),
    'agree to a critical change': () => post('agree', undefined, { nm: 12 }),
    'override a failed clamp check': () =>
      post('overrides', { torque: 'cover-bolt', reason: 'Tried on the bench' }, { nm: 20 }),
    publish: async () => {
      // Other cells of the row publish, too; each needs a procedure of its own.
      const own = `P-9${String(published++).padStart(3, '0')}`;
      await publishFirst(own, { shopId: book === 'common' ? null : book });
      const { id } = await waiting(author, own);
      return call(person, 'POST', `/proposals/${id}/publish`);
    },
    'publish a critical change alone': () => post('publish', undefined, { nm: 12 }),
    'see the review desk': () => call(person, 'GET', '/review-desk'),
  };
  const status = (await acts[act]!()).status;
  return status;
}
let published = 0;

describe.each(Object.keys(EXPECTED) as (keyof typeof EXPECTED)[])('%s book', (kind) => {
  it.each(Object.keys(EXPECTED[kind]))('%s', async (act) => {
    const wanted = EXPECTED[kind][act]!.replaceAll('|', ' ').trim().split(/\s+/).map(Number);
    expect(wanted).toHaveLength(PEOPLE.length);
    const [book, number] = kind === 'common' ? ['common', 'P-0142'] : [shop('north'), 'P-0500'];
    const got: Record<string, number> = {};
    for (const name of PEOPLE) got[name] = await cell(act, who(name), number, book);
    expect(got).toEqual(Object.fromEntries(PEOPLE.map((name, i) => [name, wanted[i]])));
  });
});

describe('nobody reviews their own', () => {
  it.each([
    ['an editor of the common book', 'common.editor', 'P-0142'],
    ["a shop's editor", 'north.editor', 'P-0500'],
  ])('%s', async (_, name, number) => {
    const { id } = await waiting(who(name), number);
    for (const verb of ['agree', 'publish', 'return', 'decline']) {
      const answer = await call(who(name), 'POST', `/proposals/${id}/${verb}`, {
        body: verb === 'return' || verb === 'decline' ? { reason: 'Mine' } : undefined,
      });
      expect({ verb, status: answer.status }).toEqual({ verb, status: 403 });
      expect(answer.body.detail).toContain('own');
    }
    expect((await call(who(name), 'GET', `/proposals/${id}`)).body.may).toMatchObject({ agree: false, publish: false });
  });

  it('counts the second agreement of a one-editor shop from a senior technician, and publishes by the editor only', async () => {
    const { id } = await waiting(who('north.technician'), 'P-0500', { nm: 12 });
    expect((await call(who('north.senior'), 'POST', `/proposals/${id}/agree`)).status).toBe(200);
    expect((await call(who('north.senior'), 'POST', `/proposals/${id}/publish`)).status).toBe(403);
    expect((await call(who('north.editor'), 'POST', `/proposals/${id}/publish`)).body).toMatchObject({
      state: 'published',
      publishedLetter: 'B',
    });
  });
});
