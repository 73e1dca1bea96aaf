import { beforeEach, expect, it } from 'vitest';
import { app } from '@/server/context';
import { verifyAudit } from '@/server/audit/verify';
import { overrideClamp } from '@/server/review/override';
import { saveProposal } from '@/server/review/saveProposal';
import { submit } from '@/server/review/submit';
import { returnToAuthor } from '@/server/review/giveBack';
import { call } from './support/call';
import { signedIn } from './support/network';
import { agreed, waiting } from './support/review';
import { text } from './support/text';
import { useNetwork } from './support/useNetwork';

const { who } = useNetwork();
let id: string;
const REASON = 'Stretch measured on three bolts: 0.02 mm, and back to length.';
const override = (name: string, body: object = { torque: 'cover-bolt', reason: REASON }, headers = {}) =>
  call(who(name), 'POST', `/proposals/${id}/overrides`, { body, headers });
const publish = (name: string) => call(who(name), 'POST', `/proposals/${id}/publish`);

beforeEach(async () => {
  ({ id } = await waiting(who('north.senior'), 'P-0142', { nm: 20 }));
});

it('stops publishing at a torque past proof load until an editor has written why, and keeps the reason for every reader', async () => {
  await agreed([who('common.editor2')], id);
  const refused = await publish('common.editor');
  expect(refused.status).toBe(409);
  expect(refused.body.detail).toBe(
    'The clamp check fails: this clamps Cover bolt to 143 % of proof load. An editor must override it with a written reason first.',
  );
  // The refusal recorded nothing, the publisher's own agreement neither.
  const before = await call(who('common.editor'), 'GET', `/proposals/${id}`);
  expect(before.body).toMatchObject({
    agreements: 1,
    failing: [{ key: 'cover-bolt', name: 'Cover bolt', override: null }],
    may: { override: true, publish: false },
  });
  expect(before.body.failing[0].share).toBeCloseTo(1.43, 2);

  const given = await override('common.editor');
  expect(given.status).toBe(200);
  expect(given.body).toMatchObject({
    failing: [{ override: { person: { name: 'common.editor' }, reason: REASON } }],
    trail: [{ what: 'proposed' }, { what: 'agreed' }, { what: 'overrode', person: { name: 'common.editor' } }],
    may: { override: false, publish: true },
  });
  expect((await publish('common.editor')).body).toMatchObject({ state: 'published', failing: [{ override: {} }] });

  const history = await call(who('pier.apprentice'), 'GET', '/procedures/P-0142/revisions');
  expect(history.body.items.map((r: { letter: string; overrides: unknown[] }) => [r.letter, r.overrides])).toEqual([
    [
      'B',
      [
        {
          torque: 'Cover bolt',
          share: expect.closeTo(1.43, 2) as number,
          person: expect.objectContaining({ name: 'common.editor' }) as object,
          reason: REASON,
          at: expect.any(String) as string,
        },
      ],
    ],
    ['A', []],
  ]);
});

it('is written into the audit trail in the same transaction', async () => {
  await override('common.editor');
  const { db } = await app();
  const [entry] = await db.read<{ actorId: string; detail: string }>(
    `SELECT actorId, detail FROM auditEntries WHERE act = 'proposal.overridden'`,
  );
  expect(entry?.actorId).toBe(who('common.editor').id);
  expect(JSON.parse(entry?.detail ?? '')).toMatchObject({
    number: 'P-0142',
    torque: 'cover-bolt',
    name: 'Cover bolt',
    reason: REASON,
  });
  expect(await verifyAudit()).toMatchObject({ ok: true });
});

it('leaves nothing behind where the audit entry cannot be written', async () => {
  const { db } = await app();
  await db.sequelize.query(
    `CREATE TRIGGER no_entries BEFORE INSERT ON auditEntries BEGIN SELECT RAISE(ABORT, 'no room'); END`,
  );
  const { actor } = await signedIn(who('common.editor'));
  await expect(overrideClamp(actor, id, { torque: 'cover-bolt', reason: REASON })).rejects.toThrow('no room');
  expect(await db.models.ClampOverride.count()).toBe(0);
});

it.each([
  ['no reason', { torque: 'cover-bolt', reason: ' ' }, 'reason'],
  ['another torque', { torque: 'head-bolt', reason: 'Why' }, 'torque'],
  ['no torque', { reason: 'Why' }, 'torque'],
  ['too long a reason', { torque: 'cover-bolt', reason: 'x'.repeat(4001) }, 'reason'],
])('refuses %s with 422 and the field', async (_, body, path) => {
  const answer = await override('common.editor', body);
  expect(answer.status).toBe(422);
  expect(answer.body.errors).toMatchObject([{ path }]);
});

it('accepts If-Match, and refuses a text that is no longer the one that was judged', async () => {
  const answer = await override('common.editor', undefined, { 'if-match': '"1"' });
  expect(answer.status).toBe(409);
  expect(answer.body.detail).toMatch(/another text than the one you judged/);
  expect((await override('common.editor', undefined, { 'if-match': '"2"' })).status).toBe(200);
  expect((await override('common.editor2')).status).toBe(409);
});

it('no longer counts once the text changes, counts again when the very text comes back', async () => {
  await override('common.editor');
  const author = (await signedIn(who('north.senior'))).actor;
  const editor = (await signedIn(who('common.editor'))).actor;
  const change = async (nm: number) => {
    await returnToAuthor(editor, id, { reason: 'Try another', anchor: null });
    await saveProposal(author, id, null, { source: text({ nm }) });
    return submit(author, id);
  };
  expect((await change(21)).failing).toMatchObject([{ override: null }]);
  expect((await change(13)).failing).toEqual([]);
  expect((await change(20)).failing).toMatchObject([{ override: { reason: REASON } }]);
});

it('no longer counts once its giver has lost the role, and another editor can give theirs', async () => {
  await override('common.editor');
  await agreed([who('common.editor2')], id);
  const { db } = await app();
  await db.models.Membership.destroy({ where: { personId: who('common.editor').id } });
  expect((await publish('common.editor2')).body.detail).toMatch(/Cover bolt to 143 %/);
  expect((await override('common.editor2')).status).toBe(200);
});

it('asks nothing of a change that leaves an overridden torque as it is', async () => {
  await override('common.editor');
  await agreed([who('common.editor2')], id);
  expect((await publish('common.editor')).status).toBe(200);
  const started = await call(who('pier.senior'), 'POST', '/procedures/P-0142/proposals', {
    body: { base: 'B', source: text({ nm: 20, word: 'dry' }), reason: 'Fluff' },
  });
  expect(started.body.failing).toEqual([]);
  await call(who('pier.senior'), 'POST', `/proposals/${started.body.id}/submit`);
  expect((await call(who('common.editor'), 'POST', `/proposals/${started.body.id}/publish`)).status).toBe(200);
});

it('waits for the editor on the desk although they have agreed', async () => {
  await agreed([who('common.editor')], id);
  const desk = await call(who('common.editor'), 'GET', '/review-desk');
  expect(desk.body.items).toMatchObject([{ id, next: 'override' }]);
});
