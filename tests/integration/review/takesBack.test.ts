import { expect, it } from 'vitest';
import { publish } from '@/server/review/publish';
import { onDesk, readDesk } from '@/server/review/readDesk';
import { readProposal } from '@/server/review/readProposal';
import { saveProposal } from '@/server/review/saveProposal';
import { startProposal } from '@/server/review/startProposal';
import { submit } from '@/server/review/submit';
import { app } from '@/server/context';
import { agreed } from '../api/support/review';
import { signedIn } from '../api/support/network';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who } = useNetwork();
const actor = async (name: string) => (await signedIn(who(name))).actor;

/** Publishes the next revision of P-0142 with two agreements. */
async function follow(base: string, change: Parameters<typeof text>[0]) {
  const author = await actor('pier.senior');
  const { id } = await startProposal(author, 'P-0142', { base, source: text(change), reason: 'A reason' });
  await submit(author, id);
  await agreed([who('common.editor2')], id);
  await publish(await actor('common.editor'), id);
}

it('says on the desk and on the proposal that a text brought up to a newer revision undoes it', async () => {
  const author = await actor('north.senior');
  const { id } = await startProposal(author, 'P-0142', { base: 'A', source: text({ word: 'dry' }), reason: 'Fluff' });
  expect((await readProposal(author, id)).takesBack).toEqual([]);
  await follow('A', { nm: 12 });
  // Said to stand on B now, and not a word of it changed.
  await saveProposal(author, id, null, { base: 'B' });
  await submit(author, id);
  const undone = [{ revision: 'B', what: ['Cover bolt torque, 10 to 12 N·m'] }];
  const editor = await actor('common.editor');
  expect((await readProposal(editor, id)).takesBack).toEqual(undone);
  expect((await onDesk(editor, await readDesk(editor))).map((item) => [item.id, item.takesBack])).toEqual([
    [id, undone],
  ]);
});

it('says nothing of a text that took over what the newer revision changed', async () => {
  const author = await actor('north.senior');
  const { id } = await startProposal(author, 'P-0142', { base: 'A', source: text({ word: 'dry' }), reason: 'Fluff' });
  await follow('A', { nm: 12 });
  const saved = await saveProposal(author, id, null, { base: 'B', source: text({ word: 'dry', nm: 12 }) });
  expect(saved.takesBack).toEqual([]);
});

it('looks back over all that was published meanwhile, latest first', async () => {
  const author = await actor('north.senior');
  const { id } = await startProposal(author, 'P-0142', { base: 'A', source: text({ title: 'Other' }), reason: 'Why' });
  await follow('A', { nm: 12 });
  await follow('B', { nm: 12, word: 'dry' });
  expect((await saveProposal(author, id, null, { base: 'C' })).takesBack).toEqual([
    { revision: 'C', what: ['the words of step “Wipe the joint”'] },
    { revision: 'B', what: ['Cover bolt torque, 10 to 12 N·m'] },
  ]);
});

it('forgets it while the text cannot be read, and knows it again afterwards', async () => {
  const author = await actor('north.senior');
  await follow('A', { nm: 12 });
  const { id } = await startProposal(author, 'P-0142', { base: 'B', source: text(), reason: 'Why' });
  expect((await readProposal(author, id)).takesBack).toHaveLength(1);
  expect((await saveProposal(author, id, null, { source: 'no front matter' })).takesBack).toEqual([]);
  expect((await saveProposal(author, id, null, { source: text() })).takesBack).toHaveLength(1);
});

it('is refused by the database where it is no list', async () => {
  const { db } = await app();
  const [row] = await db.read<{ id: string }>('SELECT id FROM revisions LIMIT 1');
  const broken = () => db.sequelize.query(`UPDATE revisions SET takesBack = 'x' WHERE id = '${row?.id ?? ''}'`);
  await expect(db.write(async () => void (await broken()))).rejects.toThrow(/CHECK/);
});
