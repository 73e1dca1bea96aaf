import { describe, expect, it } from 'vitest';
import { app } from '@/server/context';
import { verifyAudit } from '@/server/audit/verify';
import { call } from './support/call';
import { type Member } from './support/network';
import { agreed, waiting } from './support/review';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who } = useNetwork();

const start = (as: Member, change: Parameters<typeof text>[0], reason = 'A reason') =>
  call(as, 'POST', '/procedures/P-0142/proposals', { body: { base: 'A', source: text(change), reason } });

describe('two saves of one version', () => {
  it('keeps the first and tells the second which version stands', async () => {
    const senior = who('north.senior');
    const { id } = (await start(senior, { nm: 11 })).body;
    const save = (word: string) =>
      call(senior, 'PUT', `/proposals/${id}`, { body: { source: text({ word }) }, headers: { 'if-match': '"1"' } });
    const answers = await Promise.all([save('dry'), save('lint-free')]);
    expect(answers.map((a) => a.status).sort()).toEqual([200, 409]);
    const lost = answers.find((a) => a.status === 409)!;
    expect(lost.headers.get('content-type')).toBe('application/problem+json');
    expect(lost.body).toMatchObject({ type: '/problems/stale', status: 409, version: 2, state: 'draft' });
    expect(lost.body.detail).toContain('nothing you typed was lost');
    const stands = await call(senior, 'GET', `/proposals/${id}`);
    expect(stands.body.source).toBe(answers.find((a) => a.status === 200)!.body.source);
    expect(stands.body.version).toBe(2);
  });

  it('does not raise the version when nothing changed', async () => {
    const senior = who('north.senior');
    const { id, source } = (await start(senior, { nm: 11 })).body;
    const again = await call(senior, 'PUT', `/proposals/${id}`, { body: { source }, headers: { 'if-match': '"1"' } });
    expect(again).toMatchObject({ status: 200, body: { version: 1 } });
  });

  it.each([['"0"'], ['"99"'], ['"of another server"'], ['"1", "2"']])('refuses If-Match %s', async (tag) => {
    const senior = who('north.senior');
    const { id } = (await start(senior, { nm: 11 })).body;
    const answer = await call(senior, 'PUT', `/proposals/${id}`, {
      body: { reason: 'Other' },
      headers: { 'if-match': tag },
    });
    expect(answer).toMatchObject({ status: 409, body: { version: 1 } });
  });

  it('takes acts without If-Match on the state that stands, and refuses those with an old one', async () => {
    const senior = who('north.senior');
    const { id } = (await start(senior, { nm: 11 })).body;
    const old = await call(senior, 'POST', `/proposals/${id}/submit`, { headers: { 'if-match': '"7"' } });
    expect(old).toMatchObject({ status: 409, body: { version: 1, state: 'draft' } });
    expect((await call(senior, 'POST', `/proposals/${id}/submit`)).status).toBe(200);
    const late = await call(who('common.editor'), 'POST', `/proposals/${id}/agree`, { headers: { 'if-match': '"1"' } });
    expect(late).toMatchObject({ status: 409, body: { version: 2, state: 'proposed' } });
  });
});

it('says why a text that cannot be read is not published, before it looks at the text', async () => {
  const senior = who('north.senior');
  const { id } = await waiting(senior, 'P-0142');
  await call(who('common.editor'), 'POST', `/proposals/${id}/return`, { body: { reason: 'Look again' } });
  const broken = { body: { source: 'no front matter' }, headers: { 'if-match': '*' } };
  expect((await call(senior, 'PUT', `/proposals/${id}`, broken)).body.check.ok).toBe(false);
  expect((await call(senior, 'POST', `/proposals/${id}/publish`)).status).toBe(403);
  const early = await call(who('common.editor'), 'POST', `/proposals/${id}/publish`);
  expect(early).toMatchObject({ status: 409, body: { state: 'returned' } });
});

describe('a base that is no longer current', () => {
  /** Revision B is out; `loser` waits on A. */
  async function overtaken() {
    const loser = await waiting(who('pier.senior'), 'P-0142', { word: 'dry' });
    const winner = await waiting(who('north.senior'), 'P-0142', { word: 'lint-free' });
    expect((await call(who('common.editor'), 'POST', `/proposals/${winner.id}/publish`)).status).toBe(200);
    return loser.id;
  }

  it('is refused when publishing and when agreeing, with the letter that won', async () => {
    const id = await overtaken();
    for (const verb of ['agree', 'publish']) {
      const answer = await call(who('common.editor2'), 'POST', `/proposals/${id}/${verb}`);
      expect(answer).toMatchObject({ status: 409, body: { type: '/problems/stale', base: 'A', current: 'B' } });
      expect(answer.body.detail).toMatch(/Revision B .*Nothing was lost\./);
    }
    expect((await call(who('pier.senior'), 'GET', `/proposals/${id}`)).body).toMatchObject({
      stale: true,
      currentLetter: 'B',
    });
  });

  it('is refused when submitting; re-based, the same text goes through', async () => {
    const author = who('pier.senior');
    const draft = (await start(author, { word: 'oiled' })).body;
    const winner = await waiting(who('north.senior'), 'P-0142', { word: 'lint-free' });
    await call(who('common.editor'), 'POST', `/proposals/${winner.id}/publish`);
    const refused = await call(author, 'POST', `/proposals/${draft.id}/submit`);
    expect(refused).toMatchObject({ status: 409, body: { type: '/problems/stale', current: 'B', version: 1 } });
    const kept = await call(author, 'GET', `/proposals/${draft.id}`);
    expect(kept.body).toMatchObject({ state: 'draft', stale: true, source: draft.source, reason: 'A reason' });
    const onto = await call(author, 'PUT', `/proposals/${draft.id}`, {
      body: { base: 'B' },
      headers: { 'if-match': '"1"' },
    });
    expect(onto).toMatchObject({ status: 200, body: { base: 'B', stale: false, version: 2 } });
    expect((await call(author, 'POST', `/proposals/${draft.id}/submit`)).body.state).toBe('proposed');
  });

  it('is refused when starting; what was typed stays with whoever typed it', async () => {
    await overtaken();
    const answer = await start(who('pier.owner'), { word: 'warm' });
    expect(answer).toMatchObject({ status: 409, body: { type: '/problems/stale', base: 'A', current: 'B' } });
  });

  it('tells an unknown base from an old one', async () => {
    await overtaken();
    const unknown = await call(who('pier.owner'), 'POST', '/procedures/P-0142/proposals', {
      body: { base: 'K', source: text() },
    });
    expect(unknown).toMatchObject({ status: 422, body: { errors: [{ path: 'base' }] } });
    const id = (
      await call(who('pier.owner'), 'POST', '/procedures/P-0142/proposals', { body: { base: 'B', source: text() } })
    ).body.id;
    const back = await call(who('pier.owner'), 'PUT', `/proposals/${id}`, {
      body: { base: 'A' },
      headers: { 'if-match': '"1"' },
    });
    expect(back).toMatchObject({ status: 409, body: { current: 'B' } });
  });

  it('no longer counts an agreement that was given on it, also where the text stays the same', async () => {
    const author = who('pier.senior');
    const { id, source } = await waiting(author, 'P-0142', { nm: 12 });
    await agreed([who('common.editor'), who('common.editor2')], id);
    const winner = await waiting(who('north.senior'), 'P-0142', { word: 'lint-free' });
    await call(who('common.editor'), 'POST', `/proposals/${winner.id}/publish`);
    const back = await call(who('common.editor'), 'POST', `/proposals/${id}/return`, {
      body: { reason: 'Bring it up' },
    });
    const headers = { 'if-match': back.headers.get('etag')! };
    await call(author, 'PUT', `/proposals/${id}`, { body: { base: 'B' }, headers });
    const again = await call(author, 'POST', `/proposals/${id}/submit`);
    expect(again.body).toMatchObject({ state: 'proposed', base: 'B', source, agreements: 0, agreementsNeeded: 2 });
    expect(again.body.agreed.map((a: { stands: boolean }) => a.stands)).toEqual([false, false]);
    await agreed([who('common.editor2')], id);
    expect((await call(who('common.editor'), 'POST', `/proposals/${id}/publish`)).body.publishedLetter).toBe('C');
  });
});

describe('two publish at once', () => {
  it('the same proposal: one publishes, the other is told', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const answers = await Promise.all(
      ['common.editor', 'common.editor2'].map((name) => call(who(name), 'POST', `/proposals/${id}/publish`)),
    );
    expect(answers.map((a) => a.status).sort()).toEqual([200, 409]);
    expect((await call(who('north.senior'), 'GET', '/procedures/P-0142/revisions')).body.items).toHaveLength(2);
  });

  it('two proposals on one base: one publishes, the other is stale', async () => {
    const one = await waiting(who('north.senior'), 'P-0142', { word: 'dry' });
    const two = await waiting(who('pier.senior'), 'P-0142', { word: 'lint-free' });
    const answers = await Promise.all([
      call(who('common.editor'), 'POST', `/proposals/${one.id}/publish`),
      call(who('common.editor2'), 'POST', `/proposals/${two.id}/publish`),
    ]);
    expect(answers.map((a) => a.status).sort()).toEqual([200, 409]);
    expect(answers.find((a) => a.status === 409)!.body).toMatchObject({ type: '/problems/stale', current: 'B' });
    const { db } = await app();
    expect(await db.read(`SELECT letter, state FROM revisions WHERE letter IS NOT NULL ORDER BY letter`)).toEqual([
      { letter: 'A', state: 'superseded' },
      { letter: 'B', state: 'published' },
    ]);
    expect(await verifyAudit()).toMatchObject({ ok: true });
  });

  it('gives each of twenty new procedures started at once a number of its own', async () => {
    const senior = who('north.senior');
    const answers = await Promise.all(
      Array.from({ length: 20 }, (_, i) =>
        call(senior, 'POST', '/procedures', { body: { book: 'common', source: text({ title: `Test ${i}` }) } }),
      ),
    );
    expect(new Set(answers.map((a) => a.body.number)).size).toBe(20);
  });
});

describe('a call sent twice', () => {
  const key = { 'idempotency-key': 'one-press-1' };

  it('acts once and answers the same, one after the other and at once', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const publish = () => call(who('common.editor'), 'POST', `/proposals/${id}/publish`, { headers: key });
    const [first, second] = await Promise.all([publish(), publish()]);
    const third = await publish();
    expect([first, second, third].map((a) => a.status)).toEqual([200, 200, 200]);
    expect(third.body).toEqual(first.body);
    expect(third.headers.get('idempotency-replayed')).toBe('true');
    expect(third.headers.get('etag')).toBe(first.headers.get('etag'));
  });

  it('keeps keys of different people apart', async () => {
    const body = { base: 'A', source: text({ word: 'dry' }), reason: '' };
    const post = (name: string) => call(who(name), 'POST', '/procedures/P-0142/proposals', { body, headers: key });
    const [mine, theirs, mineAgain] = [
      await post('north.senior'),
      await post('pier.senior'),
      await post('north.senior'),
    ];
    expect(theirs.body.id).not.toBe(mine.body.id);
    expect(mineAgain.body.id).toBe(mine.body.id);
    expect(mineAgain.headers.get('location')).toBe(mine.headers.get('location'));
  });

  it('refuses a key that was used for another request, and keeps no refusal', async () => {
    const senior = who('north.senior');
    const post = (body: object) => call(senior, 'POST', '/procedures/P-0142/proposals', { body, headers: key });
    expect((await post({ base: 'K', source: text() })).status).toBe(422);
    expect((await post({ base: 'A', source: text({ word: 'dry' }) })).status).toBe(201);
    expect(await post({ base: 'A', source: text({ word: 'warm' }) })).toMatchObject({
      status: 422,
      body: { errors: [{ path: 'Idempotency-Key' }] },
    });
  });

  it('answers the same draft where the same text is started twice, and another one for another text', async () => {
    const first = await start(who('north.senior'), { word: 'dry' });
    const second = await start(who('north.senior'), { word: 'dry' });
    const other = await start(who('north.senior'), { word: 'warm' });
    expect(second.body.id).toBe(first.body.id);
    expect(other.body.id).not.toBe(first.body.id);
  });
});
