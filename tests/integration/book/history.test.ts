import { createElement } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { History } from '@/components/sheet/History';
import { Whole } from '@/components/sheet/Whole';
import { nextLetter } from '@/domain/revision/letters';
import { readHistoryPage } from '@/server/book/historyPage';
import { readOrigins } from '@/server/book/origins';
import { letterByCheck } from '@/server/book/permanent';
import { standingOf as standing, reviseFromRelease } from '@/server/book/release';
import { atTime } from '@/server/clock';
import { app } from '@/server/context';
import { settleText } from '@/server/review/draftText';
import { call } from '../api/support/call';
import { publishFirst, signedIn, type Member } from '../api/support/network';
import { agreed, waiting } from '../api/support/review';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who, shop } = useNetwork();
const history = async (as: Member, place = {}) => readHistoryPage((await signedIn(as)).actor, 'P-0142', place);
const letters = (page: Awaited<ReturnType<typeof history>>) =>
  page.history.events.map((event) => (event.kind === 'revision' ? event.revision.letter : event.kind));

/** Revision B: a torque from 10 to 12 N·m, agreed to by two. */
async function publishB(): Promise<string> {
  const { id } = await waiting(who('north.senior'), 'P-0142', { nm: 12 });
  await agreed([who('common.editor'), who('common.editor2')], id);
  expect((await call(who('common.editor'), 'POST', `/proposals/${id}/publish`)).status).toBe(200);
  return id;
}

/** Later revisions as a release brings them in, one word or torque after the other. */
async function release(count: number): Promise<void> {
  const { db } = await app();
  for (let i = 0; i < count; i++) {
    const standingNow = await standing('P-0142');
    if (!standingNow?.current) throw new Error('nothing is published');
    const current = { ...standingNow, current: standingNow.current };
    const { text: settled, rendered } = await settleText(
      text({ nm: 8 + (i % 3), word: `word-${i}` }),
      current.current.id,
    );
    await atTime(`2026-02-${String(1 + Math.floor(i / 10)).padStart(2, '0')}T08:00:00.000Z`, () =>
      db.write(() => reviseFromRelease(current, settled, rendered)),
    );
  }
}

describe('the history of a sheet', () => {
  it('tells revisions, withdrawals and bringings back in one order of time, with what changed and who answered for it', async () => {
    const id = await publishB();
    await call(who('north.apprentice'), 'POST', `/read-and-sign/${id}`);
    for (const [act, reason] of [
      ['withdraw', 'Two broke.'],
      ['bring-back', 'A bad batch.'],
    ])
      await call(who('common.editor2'), 'POST', `/procedures/P-0142/${act}`, { body: { reason } });
    const page = await history(who('north.apprentice'));
    expect(letters(page)).toEqual(['brought back', 'withdrawn', 'B', 'A']);
    const [, withdrawn, b, a] = page.history.events;
    expect(withdrawn).toMatchObject({ by: { name: 'common.editor2' }, reason: 'Two broke.', letter: 'B' });
    expect(a).toMatchObject({ parent: null, changes: null });
    expect(b).toMatchObject({
      parent: 'A',
      revision: { author: { name: 'north senior' }, reason: 'A reason' },
      changes: {
        lines: [{ what: 'Cover bolt torque, 10 to 12 N·m' }],
      },
      // Of the five of the shop, the author is not asked.
      readBy: { signed: 1, asked: 4, all: false },
    });
    expect(b?.kind === 'revision' && b.acts.map(({ what, person }) => `${what} ${person.name}`)).toEqual([
      'proposed north senior',
      'agreed common.editor',
      'agreed common.editor2',
      'published common.editor',
    ]);
    expect(page.trail).toMatchObject({ faults: [], elsewhere: false, texts: 2 });
  });

  it('counts the readers of other shops for nobody but who answers for the book', async () => {
    await publishB();
    const readBy = async (as: Member) => {
      const { history: read } = await history(as);
      const [b] = read.events;
      return b?.kind === 'revision' ? b.readBy : null;
    };
    // Five in the other shop; all of ten, the steward and two editors, less the author and two who agreed.
    expect(await readBy(who('pier.owner'))).toEqual({ signed: 0, asked: 5, all: false });
    expect(await readBy(who('common.editor'))).toEqual({ signed: 0, asked: 10, all: true });
    expect(await readBy(who('steward'))).toEqual({ signed: 0, asked: 10, all: true });
  });

  it('comes 25 at a time, and each part leads to the next and back', async () => {
    await release(59);
    const all = [...Array(60)].reduce<string[]>((chain) => [...chain, nextLetter(chain.at(-1) ?? null)], []).reverse();
    const first = await history(who('north.apprentice'));
    expect(letters(first)).toEqual(all.slice(0, 25));
    expect(first.history).toMatchObject({ from: 1, total: 60, newer: null });
    const second = await history(who('north.apprentice'), { before: first.history.older });
    expect(letters(second)).toEqual(all.slice(25, 50));
    expect(second.history).toMatchObject({ from: 26, total: 60 });
    const third = await history(who('north.apprentice'), { before: second.history.older });
    expect(letters(third)).toEqual(all.slice(50));
    expect(third.history.older).toBeNull();
    const back = await history(who('north.apprentice'), { after: third.history.newer });
    expect(letters(back)).toEqual(all.slice(25, 50));
    const top = await history(who('north.apprentice'), { after: back.history.newer });
    expect(letters(top)).toEqual(all.slice(0, 25));
    expect(letters(await history(who('north.apprentice'), { before: 'no-such' }))).toEqual(all.slice(0, 25));

    const listed = await call(who('north.apprentice'), 'GET', '/procedures/P-0142/revisions?limit=40');
    expect(listed.body.items.map(({ letter }: { letter: string }) => letter)).toEqual(all.slice(0, 40));
    const rest = await call(
      who('north.apprentice'),
      'GET',
      `/procedures/P-0142/revisions?limit=40&cursor=${listed.body.next}`,
    );
    expect(rest.body).toMatchObject({ next: null, items: all.slice(40).map((letter) => ({ letter })) });

    // The origins of all sixty, and what was kept on the way serves the next.
    const { actor } = await signedIn(who('north.apprentice'));
    const origins = await readOrigins(actor, 'P-0142');
    const torque = origins.groups
      .flatMap((group) => group.origins)
      .find(({ place }) => place === 'torques.cover-bolt.nm');
    expect(torque).toMatchObject({ subject: 'Cover bolt', text: '9 N·m', letter: all[0] });
    const { db } = await app();
    expect(await db.read('SELECT count(*) AS kept FROM textOrigins')).toEqual([{ kept: 60 }]);
    await release(1);
    const after = await readOrigins(actor, 'P-0142');
    expect(after.revisions[0]?.letter).toBe(nextLetter(all[0]!));
    expect(await db.read('SELECT count(*) AS kept FROM textOrigins')).toEqual([{ kept: 61 }]);
  });

  it('is hidden with its procedure', async () => {
    await publishFirst('P-0500', { shopId: shop('north') });
    const { actor } = await signedIn(who('pier.owner'));
    for (const number of ['P-0500', 'P-9999']) {
      await expect(readHistoryPage(actor, number, {})).rejects.toMatchObject({ status: 404 });
      await expect(readOrigins(actor, number)).rejects.toMatchObject({ status: 404 });
      expect((await call(who('pier.owner'), 'GET', `/procedures/${number}/origins`)).status).toBe(404);
    }
  });
});

describe('a history that does not hold', () => {
  const shown = async () => {
    const { trail } = await history(who('north.apprentice'));
    return renderToStaticMarkup(createElement(Whole, { trail, part: false }));
  };
  const tamper = async (...statements: string[]) => {
    const { db } = await app();
    for (const sql of statements) await db.sequelize.query(sql);
  };

  it('says that it is whole while it is', async () => {
    await publishB();
    expect(await shown()).toMatch(
      /This history is whole:<\/b> \d+ entries in the audit trail, each follows from the one before it/,
    );
  });

  it('names the entry that was changed, what it was about and what to do', async () => {
    await publishB();
    await tamper(
      'DROP TRIGGER auditEntries_stay',
      `UPDATE auditEntries SET at = '2026-03-03T08:00:00.000Z' WHERE act = 'revision.published' AND detail LIKE '%"letter":"B"%'`,
    );
    const html = await shown();
    expect(html).toContain('The entry of 3 Mar 2026 about P-0142 revision B was changed after it was written.');
    expect(html).toContain('Do not work from it; tell the network&#x27;s steward.');
    expect(html).not.toContain('This history is whole');
  });

  it('names a text that was changed in its row though the trail is whole', async () => {
    await publishB();
    await tamper(
      'DROP TRIGGER revisions_published_text_stays',
      `UPDATE revisions SET source = replace(source, 'nm: 12', 'nm: 21') WHERE letter = 'B'`,
    );
    expect(await shown()).toMatch(
      /P-0142 revision B has another text than the one that was stored: it gives [0-9a-f]{8}, not [0-9a-f]{8}\./,
    );
  });

  it('says of another sheet only that something else does not hold', async () => {
    await publishFirst('P-0143', { source: text({ title: 'Another cover' }) });
    await tamper('DROP TRIGGER auditEntries_stay', `UPDATE auditEntries SET act = 'x' WHERE detail LIKE '%P-0143%'`);
    const html = await shown();
    expect(html).toContain('This history is whole');
    expect(html).not.toContain('each follows from the one before it');
    expect(html).toContain('does not hold in another place');
    expect(html).not.toContain('P-0143');
  });
});

describe('the text of an earlier revision', () => {
  const restore = (as: Member, letter = 'A', body: object = {}, number = 'P-0142') =>
    call(as, 'POST', `/procedures/${number}/revisions/${letter}/restore`, { body });

  it('is proposed again on the current one, once however often it is pressed, and its reason must be completed', async () => {
    await publishB();
    const pressed = await Promise.all([restore(who('north.technician')), restore(who('north.technician'))]);
    expect(new Set(pressed.map(({ status, body }) => `${status} ${body.id}`)).size).toBe(1);
    const draft = pressed[0].body;
    expect(draft).toMatchObject({ state: 'draft', base: 'B', reason: 'Brings back revision A: ' });
    expect(draft.takesBack).toEqual([{ revision: 'B', what: ['Cover bolt torque, 10 to 12 N·m'] }]);
    const begun = await call(who('north.technician'), 'POST', `/proposals/${draft.id}/submit`);
    expect(begun).toMatchObject({
      status: 422,
      body: {
        errors: [
          { path: 'reason', message: 'Write why revision A is to come back, behind “Brings back revision A:”.' },
        ],
      },
    });
    await call(who('north.technician'), 'PUT', `/proposals/${draft.id}`, {
      body: { reason: 'Brings back revision A: twelve pulls the washers through.' },
      headers: { 'if-match': `"${draft.version}"` },
    });
    expect((await call(who('north.technician'), 'POST', `/proposals/${draft.id}/submit`)).body.state).toBe('proposed');
    // The button is for others as well; theirs is a draft of their own.
    expect((await restore(who('pier.senior'))).body.id).not.toBe(draft.id);
  });

  it('takes the rest of the reason at once, and says its beginning once', async () => {
    await publishB();
    const { body } = await restore(who('north.senior'), 'A', { reason: 'Brings back revision A: it held.' });
    expect(body.reason).toBe('Brings back revision A: it held.');
  });

  it('is brought back on a withdrawn procedure too; it waits there', async () => {
    await publishB();
    await call(who('common.editor'), 'POST', '/procedures/P-0142/withdraw', { body: { reason: 'Two broke.' } });
    expect((await restore(who('north.senior'))).status).toBe(201);
  });

  it('is refused to who may not propose, of a shop that is not theirs, and where there is nothing to bring back', async () => {
    await publishB();
    await publishFirst('P-0500', { shopId: shop('north') });
    expect((await restore(who('north.apprentice'))).status).toBe(403);
    expect((await restore(who('steward'))).status).toBe(403);
    expect((await restore(who('pier.senior'), 'A', {}, 'P-0500')).status).toBe(404);
    expect((await restore(who('north.senior'), 'D')).status).toBe(404);
    expect((await restore(who('north.senior'), 'B')).body.detail).toMatch(/Revision B is the current one/);
    expect((await restore(null as unknown as Member)).status).toBe(401);
  });
});

describe('a permanent link', () => {
  it('leads by the sheet check to the letter, the latest where two say the same', async () => {
    const first = (await call(who('north.apprentice'), 'GET', '/procedures/P-0142')).body.revision;
    const { actor } = await signedIn(who('north.apprentice'));
    expect(await letterByCheck(actor, 'P-0142', first.sheetCheck)).toBe('A');
    await publishB();
    expect(await letterByCheck(actor, 'P-0142', `${first.hash.slice(0, 4)} ${first.hash.slice(4, 8)}`)).toBe('A');
    const back = await call(who('north.senior'), 'POST', '/procedures/P-0142/revisions/A/restore', {
      body: { reason: 'it held' },
    });
    await call(who('north.senior'), 'POST', `/proposals/${back.body.id}/submit`);
    await agreed([who('common.editor'), who('common.editor2')], back.body.id);
    await call(who('common.editor'), 'POST', `/proposals/${back.body.id}/publish`);
    expect(await letterByCheck(actor, 'P-0142', first.hash.toUpperCase())).toBe('C');
    for (const check of ['0000', 'zzzzzzzz', '00000000', `${first.sheetCheck}'`])
      await expect(letterByCheck(actor, 'P-0142', check)).rejects.toMatchObject({ status: 404 });
    await publishFirst('P-0500', { shopId: shop('north'), source: text({ title: 'Ours' }) });
    const pier = await signedIn(who('pier.owner'));
    const ours = (await call(who('north.owner'), 'GET', '/procedures/P-0500')).body.revision.sheetCheck;
    await expect(letterByCheck(pier.actor, 'P-0500', ours)).rejects.toMatchObject({ status: 404 });
  });

  it('shows the buttons that the reader may press', async () => {
    await publishB();
    const { history: part } = await history(who('north.apprentice'));
    const html = (mayPropose: boolean) =>
      renderToStaticMarkup(
        createElement(History, { number: 'P-0142', part, current: 'B', withdrawn: false, mayPropose }),
      );
    expect(html(false)).not.toContain('/restore');
    expect(html(true).match(/revisions\/\w\/restore/g)).toEqual(['revisions/A/restore']);
    expect(html(true)).toContain('data-copy="/procedures/P-0142/revisions/B"');
  });
});

describe('the audit trail for who may read it', () => {
  it('is whole for the steward, of the shop for its owner, and for nobody else', async () => {
    await publishFirst('P-0500', { shopId: shop('north'), source: text({ title: 'Ours' }) });
    await publishB();
    const ours = await call(who('north.senior'), 'POST', '/procedures/P-0500/proposals', {
      body: { base: 'A', source: text({ title: 'Ours', word: 'dry' }), reason: 'Dry.' },
    });
    expect(ours.status).toBe(201);
    const all = await call(who('steward'), 'GET', '/audit?limit=3');
    expect(all.body.items).toHaveLength(3);
    expect(all.body.items[0]).toMatchObject({ act: 'proposal.started', number: 'P-0500', shop: { id: shop('north') } });
    const rest = await call(who('steward'), 'GET', `/audit?cursor=${all.body.next}`);
    expect(rest.body.items[0].seq).toBe(all.body.items[2].seq - 1);
    expect(rest.body.items.at(-1).seq).toBe(1);

    const north = await call(who('north.owner'), 'GET', '/audit');
    expect(north.body.items).toEqual([all.body.items[0]]);
    expect((await call(who('pier.owner'), 'GET', '/audit')).body.items).toEqual([]);
    expect((await call(who('pier.owner'), 'GET', `/audit?shop=${shop('north')}`)).status).toBe(404);
    expect((await call(who('steward'), 'GET', `/audit?shop=${shop('north')}`)).body.items).toHaveLength(1);
    expect((await call(who('north.editor'), 'GET', '/audit')).status).toBe(403);
    expect((await call(who('north.editor'), 'GET', `/audit?shop=${shop('north')}`)).status).toBe(403);
    expect((await call(who('common.editor'), 'GET', '/audit')).status).toBe(403);
    expect((await call(null, 'GET', '/audit')).status).toBe(401);
  });
});
