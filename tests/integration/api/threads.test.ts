import { describe, expect, it } from 'vitest';
import { verifyAudit } from '@/server/audit/verify';
import { app } from '@/server/context';
import { call } from './support/call';
import type { Member } from './support/network';
import { agreed, waiting } from './support/review';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who, shop } = useNetwork();
const start = (person: Member, id: string, body: Record<string, unknown>, headers = {}) =>
  call(person, 'POST', `/proposals/${id}/threads`, { body, headers });
const turn = (person: Member, thread: string, act: string, headers = {}) =>
  call(person, 'POST', `/threads/${thread}/${act}`, { headers });
const answer = (person: Member, thread: string, words: string) =>
  call(person, 'POST', `/threads/${thread}/messages`, { body: { text: words } });

it('holds publishing up over a question until it is answered and resolved', async () => {
  const author = who('north.senior');
  const editor = who('common.editor');
  const { id } = await waiting(author, 'P-0142', { nm: 12 });
  const asked = await start(editor, id, {
    kind: 'question',
    anchor: 'step:tighten',
    text: 'Which washer, @north senior?',
  });
  expect(asked).toMatchObject({
    status: 201,
    body: { place: 'step 2, Tighten the cover', gone: false, state: 'open', answered: false },
  });
  expect(asked.body.messages[0].mentions).toEqual([{ id: author.id, name: 'north senior' }]);
  await agreed([editor, who('common.editor2')], id);
  const refused = await call(editor, 'POST', `/proposals/${id}/publish`);
  expect(refused.status).toBe(409);
  expect(refused.body.detail).toBe(
    'A question on step 2, Tighten the cover is still open. It must be answered and resolved first.',
  );

  const thread = asked.body.id as string;
  expect(await turn(editor, thread, 'resolve')).toMatchObject({
    status: 409,
    body: { detail: 'Nobody has answered this question yet.' },
  });
  expect(await answer(author, thread, 'The new one.')).toMatchObject({ status: 201, body: { answered: true } });
  expect((await turn(author, thread, 'resolve')).status).toBe(403);
  expect((await turn(editor, thread, 'resolve', { 'if-match': '"1"' })).status, 'it was answered since').toBe(409);
  expect(await turn(editor, thread, 'resolve', { 'if-match': '"2"' })).toMatchObject({
    status: 200,
    body: { state: 'resolved', resolvedBy: { id: editor.id } },
  });
  expect((await turn(who('pier.technician'), thread, 'reopen')).status).toBe(200);
  expect((await turn(editor, thread, 'resolve')).status, 'asked again, it wants another answer').toBe(409);
  await answer(author, thread, 'As I said.');
  await turn(who('common.editor2'), thread, 'resolve');
  expect(await call(editor, 'POST', `/proposals/${id}/publish`)).toMatchObject({
    status: 200,
    body: { state: 'published' },
  });
  expect((await answer(author, thread, 'Thanks.')).status, 'a record now').toBe(409);
  expect((await verifyAudit()).ok).toBe(true);
});

it('changes the draft by one press of its author, once, after it was returned', async () => {
  const author = who('north.senior');
  const editor = who('common.editor');
  const { id } = await waiting(author, 'P-0142', { nm: 12 });
  const value = await start(editor, id, { kind: 'suggestion', anchor: 'torques.cover-bolt.nm', value: '11' });
  expect(value.body).toMatchObject({
    suggestion: { kind: 'value', from: 12, to: 11, fromText: '12 N·m', toText: '11 N·m' },
    messages: [{ text: 'I suggest 11 N·m.' }],
  });
  const words = await start(editor, id, {
    kind: 'suggestion',
    anchor: 'step:wipe',
    quote: 'clean cloth',
    replacement: 'lint-free cloth',
  });
  expect(words.status).toBe(201);
  const press = (thread: string, headers = {}) => turn(author, thread, 'accept', headers);
  const [first, second] = [value.body.id as string, words.body.id as string];
  expect(await press(first)).toMatchObject({
    status: 409,
    body: { detail: expect.stringContaining('once the text is returned to you') as string },
  });
  const returned = await call(editor, 'POST', `/proposals/${id}/return`, { body: { reason: 'See the suggestions' } });
  const version = returned.body.version as number;
  expect((await turn(editor, first, 'accept')).status).toBe(403);
  expect((await press(first, { 'if-match': `"${version - 1}"` })).status).toBe(409);
  const taken = await press(first, { 'if-match': `"${version}"`, 'idempotency-key': 'press-one-of-them' });
  expect(taken).toMatchObject({ status: 200, body: { version: version + 1, state: 'returned' } });
  expect(taken.body.source).toContain('nm: 11\n');
  const again = await press(first, { 'if-match': `"${version}"`, 'idempotency-key': 'press-one-of-them' });
  expect(again).toMatchObject({ status: 200, body: { version: version + 1 } });
  expect((await press(first)).status).toBe(409);
  expect((await press(second)).body.source).toContain('lint-free cloth');
  const list = await call(author, 'GET', `/proposals/${id}/threads`);
  expect(list.body.items).toMatchObject([
    { state: 'resolved', acceptedAt: expect.any(String) as string, resolvedBy: { id: author.id } },
    { state: 'resolved', acceptedAt: expect.any(String) as string },
  ]);
  expect((await turn(editor, first, 'reopen')).status).toBe(409);
});

it('stays where it was tied to when the step goes, and says so', async () => {
  const author = who('north.senior');
  const editor = who('common.editor');
  const extra = '\n<Step id="look" title="Look at it">\nLook.\n</Step>\n';
  const { id } = await waiting(author, 'P-0142', { nm: 12, extra });
  const asked = await start(editor, id, { kind: 'remark', anchor: 'step:look', text: 'With what light?' });
  expect(asked.body.place).toBe('step 3, Look at it');
  const returned = await call(editor, 'POST', `/proposals/${id}/return`, { body: { reason: 'Leave it out' } });
  const headers = { 'if-match': `"${returned.body.version as number}"` };
  await call(author, 'PUT', `/proposals/${id}`, { body: { source: text({ nm: 12 }) }, headers });
  const list = await call(editor, 'GET', `/proposals/${id}/threads`);
  expect(list.body.items).toMatchObject([{ gone: true, place: 'step 3, Look at it', state: 'open' }]);
  await call(author, 'PUT', `/proposals/${id}`, { body: { source: 'broken' }, headers: { 'if-match': '*' } });
  expect((await call(editor, 'GET', `/proposals/${id}/threads`)).body.items[0].gone).toBe(false);
});

describe('refuses', () => {
  it('what is left out, what is tied to nothing, and what cannot be taken up', async () => {
    const editor = who('common.editor');
    const { id, version } = await waiting(who('north.senior'), 'P-0142', { nm: 12 });
    const why = async (body: Record<string, unknown>) => {
      const { status, body: problem } = await start(editor, id, body);
      return [status, problem.errors?.[0]?.path];
    };
    expect(await why({ kind: 'question', text: ' ' })).toEqual([422, 'text']);
    expect(await why({ kind: 'remark', text: 'x', anchor: 'step:nowhere' })).toEqual([422, 'anchor']);
    expect(await why({ kind: 'remark', text: 'x', anchor: '__proto__.nm' })).toEqual([422, 'anchor']);
    expect(await why({ kind: 'suggestion', anchor: 'torques.cover-bolt.nm', value: 'twelve' })).toEqual([422, 'value']);
    expect(await why({ kind: 'suggestion', anchor: 'step:wipe', quote: 'no such', replacement: 'x' })).toEqual([
      422,
      'quote',
    ]);
    expect(await why({ kind: 'suggestion', anchor: 'step:wipe', quote: 'clean', replacement: '<b>' })).toEqual([
      422,
      'replacement',
    ]);
    expect((await start(editor, id, { kind: 'remark', text: 'x' }, { 'if-match': `"${version - 1}"` })).status).toBe(
      409,
    );
    expect((await call(editor, 'GET', `/proposals/${id}/threads`)).body.items).toEqual([]);
  });

  it('who may only read, and hides a shop from another', async () => {
    const common = await waiting(who('north.senior'), 'P-0142');
    expect((await start(who('north.apprentice'), common.id, { kind: 'remark', text: 'x' })).status).toBe(403);
    expect((await start(who('steward'), common.id, { kind: 'remark', text: 'x' })).status).toBe(403);
    expect((await start(who('nobody'), common.id, { kind: 'remark', text: 'x' })).status).toBe(404);
    expect((await start(who('north.senior'), common.id, { kind: 'suggestion', value: '1' })).status).toBe(403);

    const own = await call(who('north.technician'), 'POST', '/procedures', {
      body: { book: shop('north'), source: text({ title: 'Own sheet' }), reason: 'We had none' },
    });
    const id = own.body.id as string;
    await call(who('north.technician'), 'POST', `/proposals/${id}/submit`);
    const asked = await start(who('north.editor'), id, { kind: 'question', text: 'Why?' });
    expect(asked.status).toBe(201);
    const thread = asked.body.id as string;
    for (const stranger of ['pier.owner', 'common.editor', 'nobody']) {
      expect((await call(who(stranger), 'GET', `/proposals/${id}/threads`)).status).toBe(404);
      expect((await start(who(stranger), id, { kind: 'remark', text: 'x' })).status).toBe(404);
      expect((await answer(who(stranger), thread, 'x')).status).toBe(404);
      for (const act of ['resolve', 'reopen', 'accept'])
        expect((await turn(who(stranger), thread, act)).status).toBe(404);
    }
    const people = async (person: string, proposal: string) =>
      ((await call(who(person), 'GET', `/proposals/${proposal}/threads`)).body.people as Member[]).map((p) => p.name);
    expect((await people('north.editor', id)).every((name) => name.startsWith('north'))).toBe(true);
    const named = await people('pier.editor', common.id);
    expect(named).toContain('common.editor');
    expect(named.filter((name) => name.startsWith('north'))).toEqual(['north senior']);
    expect(await people('north.apprentice', common.id)).toEqual([]);
  });

  it('in the database too: nothing of it is changed, deleted or published over', async () => {
    const { id } = await waiting(who('north.senior'), 'P-0142');
    const asked = await start(who('common.editor'), id, { kind: 'question', text: 'Why?' });
    await agreed([who('common.editor')], id);
    const { db } = await app();
    const run = (sql: string) => db.write(() => db.sequelize.query(sql));
    const thread = asked.body.id as string;
    await expect(run(`UPDATE threads SET anchor = 'step:wipe' WHERE id = '${thread}'`)).rejects.toThrow(
      'never changes',
    );
    await expect(run(`DELETE FROM threads`)).rejects.toThrow();
    await expect(run(`UPDATE threadMessages SET text = 'x'`)).rejects.toThrow('never changed');
    await expect(run(`DELETE FROM threadMessages`)).rejects.toThrow('never deleted');
    await expect(
      run(`UPDATE revisions SET state = 'published', letter = 'B', publishedAt = 'now' WHERE id = '${id}'`),
    ).rejects.toThrow('open question');
  });
});
