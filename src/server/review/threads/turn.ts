import type { PhotoChoice } from '@/domain/api/schemas/photos';
import type { Thread } from '@/domain/api/schemas/threads';
import type { Actor } from '@/domain/people/may';
import { mentionsIn } from '@/domain/review/mentions';
import { mayReopen, mayReply, mayResolve } from '@/domain/review/threads';
import { now } from '../../clock';
import { app } from '../../context';
import { attachPhotos } from '../../photos/attach';
import { record } from '../record';
import { insist, insistOnVersion } from './guard';
import { nameable } from './people';
import { readableThread, readThread } from './read';

/** Answers in a thread, also in a resolved one: it stays resolved until somebody opens it again. */
export async function writeMessage(
  actor: Actor,
  id: string,
  text: string,
  photos: readonly PhotoChoice[] = [],
): Promise<Thread> {
  const { db } = await app();
  await db.write(async () => {
    const { thread, proposal } = await readableThread(actor, id);
    insist(mayReply(actor, proposal.facts));
    const mentions = mentionsIn(text, await nameable(actor, proposal));
    const message = { threadId: id, personId: actor.personId, text, mentions, at: now() };
    const { id: messageId } = await db.models.ThreadMessage.create(message);
    const sent = await attachPhotos(actor, { type: 'message', id: messageId }, photos);
    await db.models.Thread.update({ version: thread.version + 1 }, { where: { id } });
    await record(actor, 'thread.answered', proposal, { thread: id, text, ...sent });
  });
  return readThread(actor, id);
}

/** Resolves a thread; a question holds publishing up no longer. */
export async function resolveThread(actor: Actor, id: string, version: number | null = null): Promise<Thread> {
  const { db } = await app();
  await db.write(async () => {
    const { thread, proposal } = await readableThread(actor, id);
    insist(mayResolve(actor, proposal.facts, thread.facts));
    insistOnVersion(version, thread);
    await db.models.Thread.update(
      { state: 'resolved', resolvedById: actor.personId, resolvedAt: now(), version: thread.version + 1 },
      { where: { id } },
    );
    await record(actor, 'thread.resolved', proposal, { thread: id });
  });
  return readThread(actor, id);
}

/** Opens a thread again. A question then wants another answer. */
export async function reopenThread(actor: Actor, id: string, version: number | null = null): Promise<Thread> {
  const { db } = await app();
  await db.write(async () => {
    const { thread, proposal } = await readableThread(actor, id);
    insist(mayReopen(actor, proposal.facts, thread.facts));
    insistOnVersion(version, thread);
    await db.models.Thread.update(
      {
        state: 'open',
        resolvedById: null,
        resolvedAt: null,
        openedAt: thread.messages.length,
        version: thread.version + 1,
      },
      { where: { id } },
    );
    await record(actor, 'thread.reopened', proposal, { thread: id });
  });
  return readThread(actor, id);
}
