import { describe, expect, it } from 'vitest';
import { call } from './support/call';
import { waiting } from './support/review';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who } = useNetwork();

/** A draft of the senior of Pier on A, and another change published as B since. */
async function overtaken(mine: Parameters<typeof text>[0], theirs: Parameters<typeof text>[0]) {
  const author = who('pier.senior');
  const body = { base: 'A', source: text(mine), reason: 'A reason' };
  const draft = (await call(author, 'POST', '/procedures/P-0142/proposals', { body })).body;
  const winner = await waiting(who('north.senior'), 'P-0142', theirs);
  const published = await call(who('common.editor'), 'POST', `/proposals/${winner.id}/publish`);
  expect(published.status).toBe(200);
  return { author, draft, merged: await call(author, 'GET', `/proposals/${draft.id}/merge`) };
}

describe('a draft brought together with what was published meanwhile', () => {
  it('is answered whole where the edits do not touch, and saved as any text is', async () => {
    const { author, draft, merged } = await overtaken({ title: 'Titled by mine' }, { word: 'lint-free' });
    expect(merged).toMatchObject({ status: 200, body: { from: 'A', to: 'B', clean: true, conflicts: [] } });
    expect(merged.body.source).toBe(text({ title: 'Titled by mine', word: 'lint-free' }));
    const onto = await call(author, 'PUT', `/proposals/${draft.id}`, {
      body: { base: 'B', source: merged.body.source },
      headers: { 'if-match': '"1"' },
    });
    expect(onto).toMatchObject({ status: 200, body: { base: 'B', stale: false, takesBack: [] } });
    const again = await call(author, 'GET', `/proposals/${draft.id}/merge`);
    expect(again.body).toMatchObject({ from: 'B', to: 'B', clean: true, source: merged.body.source });
  });

  it('is answered with each conflict where they touch', async () => {
    const { merged } = await overtaken({ word: 'dry' }, { word: 'lint-free' });
    expect(merged.body).toMatchObject({ clean: false, source: null, conflicts: [{ kind: 'text', reason: 'both' }] });
    const [{ path, mine, theirs, says }] = merged.body.conflicts;
    expect(path).toMatch(/^steps\.[a-z-]+\.body$/);
    expect([mine, theirs]).toEqual([says.mine, says.theirs]);
    expect(mine).toContain('dry');
    expect(theirs).toContain('lint-free');
  });

  it('is the author’s alone', async () => {
    const { draft } = await overtaken({ word: 'dry' }, { word: 'lint-free' });
    for (const other of ['north.senior', 'common.editor'])
      expect((await call(who(other), 'GET', `/proposals/${draft.id}/merge`)).status).toBe(404);
    expect(
      (await call(who('pier.senior'), 'GET', '/proposals/01900000-0000-7000-8000-00000000ffff/merge')).status,
    ).toBe(404);
  });

  it('is not even an editor’s who may read it', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142', { word: 'oiled' });
    expect((await call(who('common.editor'), 'GET', `/proposals/${id}/merge`)).status).toBe(403);
  });

  it('is refused with line and column where the draft cannot be read', async () => {
    const { author, draft } = await overtaken({ word: 'dry' }, { word: 'lint-free' });
    await call(author, 'PUT', `/proposals/${draft.id}`, {
      body: { source: 'no head' },
      headers: { 'if-match': '"1"' },
    });
    const answer = await call(author, 'GET', `/proposals/${draft.id}/merge`);
    expect(answer).toMatchObject({ status: 422, body: { errors: [{ line: 1 }] } });
  });
});
