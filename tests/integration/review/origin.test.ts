import { expect, it } from 'vitest';
import { app } from '@/server/context';
import { readProposal } from '@/server/review/readProposal';
import { keepOrigin } from '@/server/review/origin';
import { startProcedure } from '@/server/review/startProcedure';
import { submit } from '@/server/review/submit';
import { signedIn } from '../api/support/network';
import { text } from '../api/support/text';
import { useNetwork } from '../api/support/useNetwork';

const { who } = useNetwork();
const actor = async (name: string) => (await signedIn(who(name))).actor;

it('tells what a document held to the author and to who judges the text, and to no other shop', async () => {
  const author = await actor('north.senior');
  const { id } = await startProcedure(author, { book: 'common', source: text({ nm: 9 }), reason: 'New' });
  const { db } = await app();
  const [row] = await db.read<{ procedureId: string }>('SELECT procedureId FROM revisions WHERE id = :id', { id });
  const origin = { kind: 'import' as const, name: 'ours.docx', leftOut: [] };
  await db.write(() => keepOrigin(row!.procedureId, origin));
  await submit(author, id);
  expect((await readProposal(author, id)).origin).toEqual(origin);
  expect((await readProposal(await actor('common.editor'), id)).origin).toEqual(origin);
  expect((await readProposal(await actor('pier.senior'), id)).origin).toBeNull();
});
