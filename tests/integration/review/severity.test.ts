import { expect, it } from 'vitest';
import { compareProposal } from '@/server/review/compareProposal';
import { readDesk } from '@/server/review/readDesk';
import { readProposal } from '@/server/review/readProposal';
import { saveProposal } from '@/server/review/saveProposal';
import { startProposal } from '@/server/review/startProposal';
import { submit } from '@/server/review/submit';
import { app } from '@/server/context';
import { signedIn } from '../api/support/network';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who } = useNetwork();
const actor = async (name: string) => (await signedIn(who(name))).actor;

/** A text of P-0142 that waits for review. */
async function waits(change: Parameters<typeof text>[0]) {
  const author = await actor('north.senior');
  const { id } = await startProposal(author, 'P-0142', { base: 'A', source: text(change), reason: 'Why' });
  await submit(author, id);
  return id;
}
const PAST_PROOF = 16;

it('is kept with the text, and orders the desk within which age decides', async () => {
  const ordinary = await waits({ word: 'dry' });
  const serious = await waits({ nm: 11 });
  const grave = await waits({ nm: PAST_PROOF });
  const alsoSerious = await waits({ nm: 9 });
  const editor = await actor('common.editor');
  const desk = await readDesk(editor);
  expect(desk.map(({ id, severity }) => [id, severity.level])).toEqual([
    [grave, 'grave'],
    [serious, 'serious'],
    [alsoSerious, 'serious'],
    [ordinary, 'ordinary'],
  ]);
  expect(desk.map(({ agreementsNeeded }) => agreementsNeeded)).toEqual([2, 2, 2, 1]);
  expect(desk[0]?.severity.because).toEqual(['“Cover bolt” is tightened past its proof load']);
  // What was kept is what comparing again would say.
  for (const item of desk) expect((await compareProposal(editor, item.id)).comparison.severity).toEqual(item.severity);
});

it('is weighed again with every save, and is nothing yet while the text cannot be read', async () => {
  const author = await actor('north.senior');
  const { id } = await startProposal(author, 'P-0142', { base: 'A', source: text({ nm: PAST_PROOF }), reason: '' });
  expect((await readProposal(author, id)).severity.level).toBe('grave');
  expect((await saveProposal(author, id, null, { source: 'no front matter' })).severity.level).toBe('ordinary');
  expect((await saveProposal(author, id, null, { source: text({ nm: 11 }) })).severity).toEqual({
    level: 'serious',
    because: ['a torque changes (Cover bolt)'],
  });
});

it('goes by the critical reasons where a text was kept before it was weighed so', async () => {
  const id = await waits({ nm: PAST_PROOF });
  const { db } = await app();
  await db.write(
    async () => void (await db.sequelize.query(`UPDATE revisions SET severity = NULL WHERE id = '${id}'`)),
  );
  expect((await readProposal(await actor('common.editor'), id)).severity).toEqual({
    level: 'serious',
    because: ['a torque changes (Cover bolt)'],
  });
});

it('is refused by the database where it is no JSON', async () => {
  const { db } = await app();
  const [row] = await db.read<{ id: string }>('SELECT id FROM revisions LIMIT 1');
  const broken = () => db.sequelize.query(`UPDATE revisions SET severity = 'x' WHERE id = '${row?.id ?? ''}'`);
  await expect(db.write(async () => void (await broken()))).rejects.toThrow(/CHECK/);
});
