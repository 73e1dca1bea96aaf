import { expect, it } from 'vitest';
import { agree } from '@/server/review/agree';
import { onDesk, readDesk } from '@/server/review/readDesk';
import { startProposal } from '@/server/review/startProposal';
import { submit } from '@/server/review/submit';
import { readWaiting } from '@/server/review/waiting';
import { app } from '@/server/context';
import { signedIn } from '../api/support/network';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who } = useNetwork();
const actor = async (name: string) => (await signedIn(who(name))).actor;

async function waits(nm: number): Promise<string> {
  const author = await actor('north.senior');
  const { id } = await startProposal(author, 'P-0142', { base: 'A', source: text({ nm }), reason: 'Why' });
  await submit(author, id);
  return id;
}

it('keeps what waits until something in the book changes', async () => {
  await waits(11);
  const before = await readWaiting();
  expect(await readWaiting()).toBe(before);
  const second = await waits(9);
  expect((await readWaiting()).map(({ row }) => row.id)).toContain(second);
});

it('sees an agreement and a lost role at once', async () => {
  const id = await waits(11);
  const [editor, editor2] = [await actor('common.editor'), await actor('common.editor2')];
  const seen = async () => (await readDesk(editor)).map(({ agreements, next }) => [agreements, next]);
  expect(await seen()).toEqual([[0, 'agree']]);
  await agree(editor2, id);
  expect(await seen()).toEqual([[1, 'publish']]);
  const { db } = await app();
  await db.write(async () => {
    await db.models.Membership.destroy({ where: { personId: editor2.personId } });
  });
  expect(await seen()).toEqual([[0, 'agree']]);
});

it('inside a write reads what is being written, and keeps nothing of it', async () => {
  const id = await waits(11);
  const { db } = await app();
  await readWaiting();
  await expect(
    db.write(async () => {
      await db.models.Revision.update({ state: 'declined' }, { where: { id } });
      expect(await readWaiting()).toEqual([]);
      throw new Error('taken back');
    }),
  ).rejects.toThrow('taken back');
  expect((await readWaiting()).map(({ row }) => row.id)).toEqual([id]);
});

it('shows the rest of a proposal, in the order of the desk, and leaves out what left it meanwhile', async () => {
  const [first, second] = [await waits(9), await waits(11)];
  const editor = await actor('common.editor');
  const rows = await readDesk(editor);
  expect((await onDesk(editor, rows)).map(({ id, reason }) => [id, reason])).toEqual([
    [first, 'Why'],
    [second, 'Why'],
  ]);
  expect((await onDesk(editor, [...rows].reverse())).map(({ id }) => id)).toEqual([second, first]);
  const { db } = await app();
  await db.write(async () => void (await db.models.Revision.update({ state: 'declined' }, { where: { id: first } })));
  expect((await onDesk(editor, rows)).map(({ id }) => id)).toEqual([second]);
});
