import { describe, expect, it } from 'vitest';
import { verifyAudit } from '@/server/audit/verify';
import { app } from '@/server/context';
import { endedUnseen, noteSeen, readFlags } from '@/server/flags/read';
import { call } from './support/call';
import type { Member } from './support/network';
import { useNetwork } from './support/useNetwork';

const { who, shop } = useNetwork();
const DOUBT = { kind: 'unclear', text: 'Which bolt is bolt 1?' };

const raise = (as: Member, body: Record<string, unknown> = DOUBT, number = 'P-0142') =>
  call(as, 'POST', `/procedures/${number}/flags`, { body });
const flags = async (as: Member) =>
  (await call(as, 'GET', '/flags')).body as unknown as { toAnswer: { id: string }[]; mine: { id: string }[] };
const act = (as: Member, id: unknown, how: string, body?: Record<string, unknown>) =>
  call(as, 'POST', `/flags/${String(id)}/${how}`, body ? { body } : {});
const firstStep = async () => {
  const { body } = await call(who('north.apprentice'), 'GET', '/procedures/P-0142');
  return (body.steps as { id: string; title: string }[])[0]!;
};

describe('a flag', () => {
  it('is raised from a step, waits for the seniors of the shop and the editors of the book, and is answered', async () => {
    const step = await firstStep();
    const raised = await raise(who('north.apprentice'), { ...DOUBT, step: step.id });
    expect(raised).toMatchObject({
      status: 201,
      body: { number: 'P-0142', letter: 'A', state: 'open', step: { id: step.id, title: step.title, number: 1 } },
    });
    const { id } = raised.body;
    for (const name of ['north.senior', 'north.owner', 'common.editor'])
      expect(
        (await flags(who(name))).toAnswer.map((flag) => flag.id),
        name,
      ).toEqual([id]);
    for (const name of ['north.technician', 'pier.senior', 'north.apprentice'])
      expect((await flags(who(name))).toAnswer, name).toEqual([]);

    const answered = await act(who('north.senior'), id, 'answer', { text: 'The one beside the filler cap.' });
    expect(answered).toMatchObject({ status: 200, body: { state: 'answered', endedBy: { name: 'north senior' } } });
    expect((await flags(who('north.senior'))).toAnswer).toEqual([]);
    expect((await flags(who('north.apprentice'))).mine).toMatchObject([
      { id, answer: 'The one beside the filler cap.' },
    ]);
    expect((await act(who('common.editor'), id, 'answer', { text: 'Again.' })).status).toBe(409);
    expect(await verifyAudit()).toMatchObject({ ok: true });
  });

  it('tells whoever raised it once', async () => {
    const actor = {
      personId: who('north.apprentice').id,
      memberships: [{ in: 'shop', shopId: shop('north'), role: 'apprentice' }],
    } as const;
    const { body } = await raise(who('north.apprentice'));
    expect(await endedUnseen(actor.personId)).toBe(0);
    await act(who('common.editor'), body.id, 'answer', { text: 'Yes.' });
    expect(await endedUnseen(actor.personId)).toBe(1);
    await noteSeen(actor, (await readFlags(actor)).mine);
    expect(await endedUnseen(actor.personId)).toBe(0);
  });

  it('becomes a draft whose reason it is', async () => {
    const step = await firstStep();
    const { body } = await raise(who('north.apprentice'), { ...DOUBT, step: step.id });
    const taken = await act(who('north.senior'), body.id, 'take-up');
    expect(taken).toMatchObject({
      status: 200,
      body: { state: 'taken up', proposal: { state: 'draft', letter: null } },
    });
    const draft = (taken.body.proposal as { id: string }).id;
    expect((await call(who('north.senior'), 'GET', `/proposals/${draft}`)).body.reason).toBe(
      `Flag by north apprentice at step 1, ${step.title}. Something is unclear: Which bolt is bolt 1?`,
    );
    expect((await act(who('common.editor'), body.id, 'take-up')).status).toBe(409);
  });

  it('pressed twice is one; taken back it is gone from the desk', async () => {
    const [one, two] = [await raise(who('north.apprentice')), await raise(who('north.apprentice'))];
    expect(two.body.id).toBe(one.body.id);
    expect((await act(who('north.senior'), one.body.id, 'withdraw')).status).toBe(403);
    expect(await act(who('north.apprentice'), one.body.id, 'withdraw')).toMatchObject({ body: { state: 'withdrawn' } });
    expect((await flags(who('common.editor'))).toAnswer).toEqual([]);
  });

  it('is hidden from other shops, and refused where it cannot be', async () => {
    const { body } = await raise(who('north.apprentice'));
    for (const how of ['answer', 'take-up', 'withdraw']) {
      const given = how === 'answer' ? { text: 'x' } : undefined;
      expect((await act(who('pier.senior'), body.id, how, given)).status, how).toBe(404);
      expect((await act(who('common.editor'), '0190a1b2-0000-7000-8000-000000000000', how, given)).status).toBe(404);
    }
    expect((await act(who('north.apprentice'), body.id, 'answer', { text: 'Mine.' })).status).toBe(403);
    expect((await act(who('north.senior'), body.id, 'answer', { text: ' ' })).status).toBe(422);
    expect((await raise(who('north.apprentice'), { ...DOUBT, text: ' ' })).body.errors).toEqual([
      { path: 'text', message: 'Write what is wrong or unclear.' },
    ]);
    expect((await raise(who('north.apprentice'), { ...DOUBT, step: 'no-such-step' })).status).toBe(422);
    expect((await raise(who('north.apprentice'), DOUBT, 'P-9999')).status).toBe(404);
  });

  it('is held by the database too', async () => {
    const { body } = await raise(who('north.apprentice'));
    const { db } = await app();
    const tries = (sql: string) => db.write(() => db.sequelize.query(sql));
    await expect(tries(`UPDATE flags SET text = 'other'`)).rejects.toThrow(/never changed/);
    await expect(tries('DELETE FROM flags')).rejects.toThrow(/never deleted/);
    await act(who('common.editor'), body.id, 'answer', { text: 'Yes.' });
    await expect(tries(`UPDATE flags SET state = 'withdrawn'`)).rejects.toThrow(/stays ended/);
  });
});
