import { describe, expect, it } from 'vitest';
import { verifyAudit } from '@/server/audit/verify';
import { app } from '@/server/context';
import { searchBook } from '@/server/book/search';
import { NO_FILTERS } from '@/domain/search/filters';
import { call } from './support/call';
import { publishFirst, signedIn, type Member } from './support/network';
import { agreed, waiting } from './support/review';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who, shop } = useNetwork();
const withdraw = (as: Member | null, reason = 'Two bolts broke at this torque.', number = 'P-0142') =>
  call(as, 'POST', `/procedures/${number}/withdraw`, { body: { reason } });
const bringBack = (as: Member, reason = 'The bolts were of a bad batch.', number = 'P-0142') =>
  call(as, 'POST', `/procedures/${number}/bring-back`, { body: { reason } });
const bulletins = async (as: Member) => (await call(as, 'GET', '/bulletins')).body.items as Record<string, unknown>[];
const count = async () => {
  const { db } = await app();
  return (await db.read<{ n: number }>('SELECT count(*) AS n FROM bulletins'))[0]!.n;
};

/** A critical change to P-0142, published with two agreements; the id of its revision. */
async function criticalChange(): Promise<string> {
  const { id } = await waiting(who('north.senior'), 'P-0142', { nm: 12 });
  await agreed([who('common.editor'), who('common.editor2')], id);
  expect((await call(who('common.editor'), 'POST', `/proposals/${id}/publish`)).status).toBe(200);
  return id;
}

describe('withdrawing', () => {
  it('says so on the sheet, in the list, in search and in the trail, until it is brought back', async () => {
    const before = await call(who('pier.apprentice'), 'GET', '/procedures/P-0142');
    expect(before.body.withdrawn).toBeNull();
    expect(await withdraw(who('common.editor'))).toMatchObject({ status: 200, body: { number: 'P-0142' } });

    const sheet = await call(who('pier.apprentice'), 'GET', '/procedures/P-0142', {
      headers: { 'if-none-match': before.headers.get('etag')! },
    });
    expect(sheet).toMatchObject({
      status: 200,
      body: {
        withdrawn: { reason: 'Two bolts broke at this torque.', by: { name: 'common.editor' } },
        current: { letter: 'A' },
      },
    });
    const old = await call(who('pier.apprentice'), 'GET', '/procedures/P-0142/revisions/A');
    expect(old.body.withdrawn).toMatchObject({ reason: 'Two bolts broke at this torque.' });
    const list = await call(who('pier.apprentice'), 'GET', '/procedures');
    expect(list.body.items).toMatchObject([{ number: 'P-0142', withdrawn: true }]);

    expect((await bringBack(who('common.editor2'))).body.withdrawn).toBeNull();
    const back = await call(who('pier.apprentice'), 'GET', '/procedures');
    expect(back.body.items).toMatchObject([{ number: 'P-0142', withdrawn: false }]);
    expect(await verifyAudit()).toMatchObject({ ok: true });
    const { db } = await app();
    const acts = await db.read<{ act: string }>(`SELECT act FROM auditEntries WHERE act LIKE 'procedure.%'`);
    expect(acts.map(({ act }) => act)).toEqual(['procedure.withdrawn', 'procedure.brought-back']);
  });

  it('puts the sheet last in search, and says so', async () => {
    await publishFirst('P-0143', { source: text({ title: 'Reseal the other test cover' }) });
    const { actor } = await signedIn(who('north.apprentice'));
    const found = async () =>
      (await searchBook(actor, 'reseal the test cover', NO_FILTERS)).hits.map(({ number, withdrawn }) => [
        number,
        withdrawn,
      ]);
    expect(await found()).toEqual([
      ['P-0142', false],
      ['P-0143', false],
    ]);
    await withdraw(who('common.editor'));
    expect(await found()).toEqual([
      ['P-0143', false],
      ['P-0142', true],
    ]);
    await bringBack(who('common.editor'));
    expect((await found())[0]).toEqual(['P-0142', false]);
  });

  it('is for an editor of the book: 403 for other readers, 404 for other shops, 401 signed out', async () => {
    await publishFirst('P-0200', { shopId: shop('north') });
    for (const name of ['north.owner', 'north.editor', 'pier.senior', 'steward'])
      expect((await withdraw(who(name))).status, name).toBe(403);
    expect((await withdraw(who('nobody'))).status).toBe(404);
    for (const name of ['pier.editor', 'common.editor', 'steward'])
      expect((await withdraw(who(name), 'why', 'P-0200')).status, name).toBe(404);
    for (const name of ['north.owner', 'north.senior'])
      expect((await withdraw(who(name), 'why', 'P-0200')).status, name).toBe(403);
    expect((await withdraw(null)).status).toBe(401);
    expect(await count()).toBe(0);
    expect((await withdraw(who('north.editor'), 'why', 'P-0200')).status).toBe(200);
  });

  it('takes a reason, and only a published sheet', async () => {
    expect(await withdraw(who('common.editor'), '  ')).toMatchObject({
      status: 422,
      body: { errors: [{ path: 'reason' }] },
    });
    expect((await withdraw(who('common.editor'), 'x'.repeat(2001))).status).toBe(422);
    expect((await withdraw(who('common.editor'), 'why', 'P-0999')).status).toBe(404);
    const draft = await call(who('common.editor'), 'POST', '/procedures', {
      body: { book: 'common', source: text({ title: 'Not published' }), reason: '' },
    });
    expect((await withdraw(who('common.editor'), 'why', draft.body.number as string)).status).toBe(404);
    expect((await bringBack(who('common.editor'))).status).toBe(409);
    expect(await count()).toBe(0);
  });

  it('done twice is done once; of two editors at once one is told', async () => {
    const both = await Promise.all([withdraw(who('common.editor')), withdraw(who('common.editor2'))]);
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(await count()).toBe(1);
    const first = both[0]!.status === 200 ? who('common.editor') : who('common.editor2');
    expect((await withdraw(first)).status).toBe(200);
    expect(await count()).toBe(1);
    expect((await bringBack(first)).status).toBe(200);
    expect((await bringBack(first)).status).toBe(200);
    expect(await count()).toBe(2);
  });

  it('lets a proposal wait, with its agreements, until it is brought back', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    await withdraw(who('common.editor'));
    const refused = await call(who('common.editor'), 'POST', `/proposals/${id}/publish`);
    expect(refused.status).toBe(409);
    expect(refused.body.detail).toContain('withdrawn');
    expect((await call(who('common.editor'), 'POST', `/proposals/${id}/agree`)).status).toBe(200);
    await bringBack(who('common.editor'));
    expect((await call(who('common.editor'), 'POST', `/proposals/${id}/publish`)).status).toBe(200);
  });
});

describe('bulletins', () => {
  it('tell every reader of a critical change, but not those who made it', async () => {
    const revision = await criticalChange();
    expect(await bulletins(who('pier.apprentice'))).toMatchObject([
      {
        kind: 'critical change',
        number: 'P-0142',
        revision: { id: revision, letter: 'B' },
        supersedes: 'A',
        words: ['A torque changes: Cover bolt torque, 10 to 12 N·m.'],
        unread: true,
        signedAt: null,
      },
    ]);
    for (const name of ['common.editor', 'common.editor2', 'north.senior'])
      expect(await bulletins(who(name)), name).toMatchObject([{ unread: false, signedAt: null }]);
    expect(await bulletins(who('nobody'))).toEqual([]);
  });

  it('say nothing of an ordinary change', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    expect((await call(who('common.editor'), 'POST', `/proposals/${id}/publish`)).status).toBe(200);
    expect(await bulletins(who('pier.apprentice'))).toEqual([]);
  });

  it("of a shop's own book are seen and signed in that shop alone", async () => {
    await publishFirst('P-0200', { shopId: shop('north') });
    await withdraw(who('north.editor'), 'why', 'P-0200');
    const [told] = await bulletins(who('north.apprentice'));
    expect(told).toMatchObject({ kind: 'withdrawn', words: ['why'], unread: true });
    for (const name of ['pier.owner', 'common.editor', 'steward']) {
      expect(await bulletins(who(name)), name).toEqual([]);
      expect((await call(who(name), 'POST', `/read-and-sign/${told!['id'] as string}`)).status, name).toBe(404);
    }
  });

  it('are signed once, by the id of the revision or of the bulletin', async () => {
    const revision = await criticalChange();
    const apprentice = who('pier.apprentice');
    const twice = await Promise.all([1, 2].map(() => call(apprentice, 'POST', `/read-and-sign/${revision}`)));
    expect(twice.map(({ status }) => status)).toEqual([200, 200]);
    expect(twice[0]!.body).toMatchObject({ unread: false, signedAt: expect.any(String) as string });
    const again = await call(apprentice, 'POST', `/read-and-sign/${twice[0]!.body.id as string}`);
    expect(again.body.signedAt).toBe(twice[0]!.body.signedAt);
    expect(await bulletins(apprentice)).toMatchObject([{ unread: false }]);
    expect(await bulletins(who('pier.technician'))).toMatchObject([{ unread: true }]);
    const { db } = await app();
    expect(await db.read('SELECT 1 FROM readAndSigned')).toHaveLength(1);
    for (const sql of ['UPDATE readAndSigned SET at = 1', 'DELETE FROM readAndSigned', 'DELETE FROM bulletins'])
      await expect(db.sequelize.query(sql), sql).rejects.toMatchObject({
        parent: { message: expect.stringContaining('never') as string },
      });
  });

  it('of a withdrawal stop asking once the sheet is back, and the bringing back asks instead', async () => {
    await withdraw(who('common.editor'));
    await bringBack(who('common.editor'));
    expect(await bulletins(who('north.apprentice'))).toMatchObject([
      { kind: 'brought back', unread: true, words: ['The bolts were of a bad batch.'] },
      { kind: 'withdrawn', unread: false },
    ]);
  });

  it('stand with those to sign first', async () => {
    await criticalChange();
    await withdraw(who('common.editor2'));
    const [, older] = await bulletins(who('north.apprentice'));
    expect(older).toMatchObject({ kind: 'critical change' });
    const [latest] = await bulletins(who('north.apprentice'));
    await call(who('north.apprentice'), 'POST', `/read-and-sign/${latest!['id'] as string}`);
    expect(await bulletins(who('north.apprentice'))).toMatchObject([
      { kind: 'critical change', unread: true },
      { kind: 'withdrawn', unread: false },
    ]);
    expect((await call(who('north.apprentice'), 'POST', '/read-and-sign/nothing')).status).toBe(404);
    expect((await call(null, 'GET', '/bulletins')).status).toBe(401);
  });
});
