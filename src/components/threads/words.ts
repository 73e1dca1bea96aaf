import { dayOf } from '@/components/ui/day';
import type { Thread } from '@/domain/api/schemas/threads';
import type { ThreadKind } from '@/domain/review/threads';

export const KIND_WORDS: Record<ThreadKind, string> = {
  remark: 'Remark',
  question: 'Question',
  suggestion: 'Suggestion',
};

/** What starts a thread of each kind, as the word of its link and its button. */
export const START_WORDS: Record<ThreadKind, { verb: string; doing: string }> = {
  question: { verb: 'Ask', doing: 'Asking' },
  remark: { verb: 'Remark', doing: 'Sending' },
  suggestion: { verb: 'Suggest', doing: 'Suggesting' },
};

/** Where a thread stands: "Question, not answered yet", "Suggestion, accepted by Wren on 3 Dec 2026". */
export function standingOf({ kind, state, answered, resolvedBy, resolvedAt, acceptedAt }: Thread): string {
  const by = `${resolvedBy ? ` by ${resolvedBy.name}` : ''}${resolvedAt ? ` on ${dayOf(resolvedAt)}` : ''}`;
  if (acceptedAt) return `${KIND_WORDS[kind]}, accepted${by}`;
  if (state === 'resolved') return `${KIND_WORDS[kind]}, resolved${by}`;
  if (kind !== 'question') return KIND_WORDS[kind];
  return answered ? 'Question, answered but not resolved' : 'Question, not answered yet';
}

/** Where a thread belongs, for one that cannot stand there. Null for the whole. */
export const aboutOf = ({ anchor, gone, place }: Pick<Thread, 'anchor' | 'gone' | 'place'>): string | null =>
  anchor === null ? null : gone ? `was on ${place}, which is no longer there` : `on ${place}`;

/** The open questions, oldest first: they hold publishing up. */
export const openQuestions = (threads: readonly Thread[]): Thread[] =>
  threads.filter(({ kind, state }) => kind === 'question' && state === 'open');
