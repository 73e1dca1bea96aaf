import type { RevisionState } from './types';

/**
 * The life of a revision: draft → proposed → (returned → proposed) → published → superseded; or declined.
 * Everything that is not in the table cannot happen. Who may do it is asked of `may`, not here.
 */
export const MOVES = {
  edit: { draft: 'draft', returned: 'returned' },
  submit: { draft: 'proposed', returned: 'proposed' },
  return: { proposed: 'returned' },
  decline: { proposed: 'declined' },
  agree: { proposed: 'proposed' },
  override: { proposed: 'proposed' },
  publish: { proposed: 'published' },
  /** Done by the book itself when the next revision is published. */
  supersede: { published: 'superseded' },
} as const satisfies Record<string, Partial<Record<RevisionState, RevisionState>>>;
export type Move = keyof typeof MOVES;

export type Moved = { ok: true; state: RevisionState } | { ok: false; why: string };

const STANDS: Record<RevisionState, string> = {
  draft: 'is a draft that its author has not sent in yet',
  proposed: 'is waiting for review',
  returned: 'has gone back to its author',
  declined: 'was declined',
  published: 'is published',
  superseded: 'was published and has been superseded',
};
const WANTS: Record<Move, string> = {
  edit: 'Only a draft or a returned proposal can be edited.',
  submit: 'Only a draft or a returned proposal can be sent in.',
  return: 'Only a proposal that waits for review can be returned.',
  decline: 'Only a proposal that waits for review can be declined.',
  agree: 'Only a proposal that waits for review can be agreed to.',
  override: 'The clamp check is overridden only while a proposal waits for review.',
  publish: 'Only a proposal that waits for review can be published.',
  supersede: 'Only a published revision can be superseded.',
};

/** Where a move leads from a state, or why there is no such way. */
export function move(state: RevisionState, by: Move): Moved {
  const ways: Partial<Record<RevisionState, RevisionState>> = MOVES[by];
  const next = ways[state];
  return next ? { ok: true, state: next } : { ok: false, why: `This proposal ${STANDS[state]}. ${WANTS[by]}` };
}
