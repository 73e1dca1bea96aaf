import { expect, it } from 'vitest';
import { decline } from '@/server/review/giveBack';
import { publish } from '@/server/review/publish';
import { readReview } from '@/server/review/reviewPage';
import { saveProposal } from '@/server/review/saveProposal';
import { startProcedure } from '@/server/review/startProcedure';
import { openDraft } from '@/server/review/writing';
import { signedIn } from '../api/support/network';
import { waiting } from '../api/support/review';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who } = useNetwork();
const actor = async (name: string) => (await signedIn(who(name))).actor;

it('gives what waits the letter that it would get, and what was published its own', async () => {
  const editor = await actor('common.editor');
  const { id } = await waiting(who('north.senior'), 'P-0142');
  expect(await readReview(editor, id)).toMatchObject({
    letter: 'B',
    fault: null,
    compared: { base: { number: 'P-0142' } },
  });
  await publish(editor, id);
  expect((await readReview(editor, id)).letter).toBe('B');
});

it('gives no letter to what stands on an older revision, nor to what was declined', async () => {
  const editor = await actor('common.editor');
  const older = await waiting(who('north.senior'), 'P-0142');
  const declined = await waiting(who('north.technician'), 'P-0142', { word: 'lint-free' });
  await decline(editor, declined.id, { reason: 'Any cloth will do.', anchor: null });
  expect((await readReview(editor, declined.id)).letter).toBeNull();
  await publish(editor, (await waiting(who('pier.senior'), 'P-0142', { word: 'soft' })).id);
  expect(await readReview(editor, older.id)).toMatchObject({ letter: null, proposal: { stale: true } });
  // The base of the comparison stays what the text was written on.
  expect((await readReview(editor, older.id)).compared?.base?.revision.letter).toBe('A');
});

it('compares a new procedure with nothing, under the letter A', async () => {
  const senior = await actor('north.senior');
  const { id } = await startProcedure(senior, { book: 'common', source: text({ title: 'Fit the fan' }), reason: '' });
  expect(await readReview(senior, id)).toMatchObject({ letter: 'A', compared: { base: null } });
});

it('says where a draft stops that cannot be read, instead of failing', async () => {
  const senior = await actor('north.senior');
  const id = await openDraft(senior, 'P-0142');
  await saveProposal(senior, id, null, { source: text().replace('nm: 10', 'nm: ten') });
  const { compared, fault } = await readReview(senior, id);
  expect(compared).toBeNull();
  expect(fault).toMatch(/^Line \d+: /);
});

it('hides a draft from everybody but its author', async () => {
  const id = await openDraft(await actor('north.senior'), 'P-0142');
  await expect(readReview(await actor('common.editor'), id)).rejects.toMatchObject({ status: 404 });
});
