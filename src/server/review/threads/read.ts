import type { Thread, ThreadList } from '@/domain/api/schemas/threads';
import type { Actor } from '@/domain/people/may';
import { isAnswered, mayAccept, mayReopen, mayReply, mayResolve, mayStart } from '@/domain/review/threads';
import { photosOf } from '../../photos/load';
import { notFound } from '../../refusal';
import { readableProposal } from '../guard';
import type { Loaded } from '../proposals';
import { loadThread, threadsOf, type LoadedThread } from './load';
import { nameable } from './people';
import { placeIn, textsOf, type Texts } from './texts';

type Photos = Awaited<ReturnType<typeof photosOf>>;

/** The photos of all messages of these threads, in one read. */
const photosIn = (actor: Actor, { facts }: Loaded, threads: readonly LoadedThread[]): Promise<Photos> =>
  photosOf(
    actor,
    'message',
    threads.flatMap(({ messages }) => messages.map(({ id }) => id)),
    () => ({ book: facts.book }),
  );

function threadView(actor: Actor, { facts }: Loaded, thread: LoadedThread, texts: Texts, photos: Photos): Thread {
  const verdicts = {
    reply: mayReply(actor, facts),
    resolve: mayResolve(actor, facts, thread.facts),
    reopen: mayReopen(actor, facts, thread.facts),
    accept: mayAccept(actor, facts, thread.facts),
  };
  const { id, kind, anchor, suggestion, state, resolvedBy, resolvedAt, acceptedAt, version } = thread;
  const now = placeIn(texts, anchor);
  return {
    ...{ id, kind, anchor, suggestion, state, resolvedBy, resolvedAt, acceptedAt, version },
    messages: thread.messages.map((message) => ({ ...message, photos: photos(message.id) })),
    place: now ?? thread.place,
    // While a draft cannot be read nobody knows what it still has.
    gone: now === null && texts.proposed !== null,
    answered: isAnswered(thread.facts),
    may: {
      reply: verdicts.reply.ok,
      resolve: verdicts.resolve.ok,
      reopen: verdicts.reopen.ok,
      accept: verdicts.accept.ok,
    },
    whyNot: Object.fromEntries(
      Object.entries(verdicts).flatMap(([act, verdict]) => (verdict.ok ? [] : [[act, verdict.why]])),
    ),
  };
}

/** All threads of a proposal. Refuses 404 like `readProposal`. */
export async function readThreads(actor: Actor, proposalId: string): Promise<ThreadList> {
  const proposal = await readableProposal(actor, proposalId);
  const threads = await threadsOf(proposalId);
  const texts = threads.length > 0 ? await textsOf(proposal) : { proposed: null, base: null };
  const start = mayStart(actor, proposal.facts, 'remark').ok;
  const photos = await photosIn(actor, proposal, threads);
  return {
    items: threads.map((thread) => threadView(actor, proposal, thread, texts, photos)),
    people: start ? await nameable(actor, proposal) : [],
    may: { start, suggest: mayStart(actor, proposal.facts, 'suggestion').ok },
  };
}

/** A thread with its proposal, if this person may read it; 404 for an unknown and an unseen one alike. */
export async function readableThread(actor: Actor, id: string): Promise<{ thread: LoadedThread; proposal: Loaded }> {
  const thread = await loadThread(id);
  if (!thread) throw notFound();
  return { thread, proposal: await readableProposal(actor, thread.revisionId) };
}

export async function readThread(actor: Actor, id: string): Promise<Thread> {
  const { thread, proposal } = await readableThread(actor, id);
  return threadView(actor, proposal, thread, await textsOf(proposal), await photosIn(actor, proposal, [thread]));
}
