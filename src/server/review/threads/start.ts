import type { z } from 'zod';
import type { StartThread, Thread } from '@/domain/api/schemas/threads';
import type { Actor } from '@/domain/people/may';
import { readAnchor } from '@/domain/review/anchors';
import { mentionsIn } from '@/domain/review/mentions';
import { applySuggestion, valueSuggestion, type Suggestion } from '@/domain/review/suggestions';
import { mayStart } from '@/domain/review/threads';
import { now } from '../../clock';
import { app } from '../../context';
import { attachPhotos } from '../../photos/attach';
import { invalid } from '../../refusal';
import { readableProposal } from '../guard';
import { record } from '../record';
import { insist, insistOnVersion } from './guard';
import { nameable } from './people';
import { readThread } from './read';
import { placeIn, textsOf, type Texts } from './texts';

type Given = z.output<typeof StartThread>;
type Wanted = Omit<Given, 'photos'> & Partial<Pick<Given, 'photos'>>;

const refuse = (path: string, message: string) => invalid(message, [{ path, message }]);

/** What is suggested, tried on the text before it is stored: nobody is offered what cannot be accepted. */
function suggested({ anchor, quote, replacement, value }: Wanted, { proposed }: Texts): Suggestion {
  if (!proposed) throw refuse('anchor', 'Nothing can be suggested while the text cannot be read.');
  if (readAnchor(anchor)?.to === 'step') {
    if (!quote?.trim()) throw refuse('quote', 'Quote the words of the step that are to be replaced.');
    if (replacement === undefined) throw refuse('replacement', 'Write what is to stand there instead.');
    const suggestion: Suggestion = { kind: 'words', quote: quote.trim(), replacement };
    const tried = applySuggestion(proposed, anchor, suggestion);
    if (!tried.ok) throw refuse(/[<>{}]/.test(replacement) ? 'replacement' : 'quote', tried.why);
    return suggestion;
  }
  const made = valueSuggestion(proposed, anchor, value ?? '');
  if (!made.ok) throw refuse('value', made.why);
  return made.suggestion;
}

/** The words of a suggestion that came without any. */
const ownWords = (suggestion: Suggestion): string =>
  suggestion.kind === 'value'
    ? `I suggest ${suggestion.toText}.`
    : suggestion.replacement
      ? 'I suggest these words.'
      : 'I suggest to leave these words out.';

/**
 * Starts a thread on a proposal that is under review.
 *
 * @param version of the proposal, where the caller says which text they read
 */
export async function startThread(
  actor: Actor,
  id: string,
  wanted: Wanted,
  version: number | null = null,
): Promise<Thread> {
  const before = await readableProposal(actor, id);
  insist(mayStart(actor, before.facts, wanted.kind));
  insistOnVersion(version, before);
  const texts = await textsOf(before);
  const place = placeIn(texts, wanted.anchor) ?? (wanted.anchor === null ? 'the whole proposal' : null);
  if (place === null) throw refuse('anchor', 'The text has no such step or value.');
  const suggestion = wanted.kind === 'suggestion' ? suggested(wanted, texts) : null;
  const text = wanted.text || (suggestion ? ownWords(suggestion) : '');
  if (!text) throw refuse('text', wanted.kind === 'question' ? 'Write your question.' : 'Write your remark.');
  const { db } = await app();
  const threadId = await db.write(async () => {
    const proposal = await readableProposal(actor, id);
    insist(mayStart(actor, proposal.facts, wanted.kind));
    // What was checked above was checked against this very text.
    insistOnVersion(before.version, proposal);
    const { kind, anchor } = wanted;
    const at = now();
    const thread = await db.models.Thread.create({
      revisionId: id,
      personId: actor.personId,
      kind,
      anchor,
      place,
      suggestion,
      at,
    });
    const mentions = mentionsIn(text, await nameable(actor, proposal));
    const message = { threadId: thread.id, personId: actor.personId, text, mentions, at };
    const { id: messageId } = await db.models.ThreadMessage.create(message);
    const sent = await attachPhotos(actor, { type: 'message', id: messageId }, wanted.photos ?? []);
    await record(actor, 'thread.started', proposal, { thread: thread.id, kind, anchor, text, suggestion, ...sent });
    return thread.id;
  });
  return readThread(actor, threadId);
}
