import { agree } from '@/server/review/agree';
import { startProposal } from '@/server/review/startProposal';
import { submit } from '@/server/review/submit';
import { signedIn, type Member } from './network';
import { text } from './text';

/** A proposal by `author` that waits for review; `nm: 12` makes it critical, another word does not. */
export async function waiting(author: Member, number: string, change: Parameters<typeof text>[0] = { word: 'dry' }) {
  const { actor } = await signedIn(author);
  const started = await startProposal(actor, number, { base: 'A', source: text(change), reason: 'A reason' });
  return submit(actor, started.id);
}

export async function agreed(people: Member[], id: string): Promise<void> {
  for (const person of people) await agree((await signedIn(person)).actor, id);
}
