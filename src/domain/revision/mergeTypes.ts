import type { Procedure } from '../procedure/types';

export type Side = 'base' | 'mine' | 'theirs';

/** Why two texts cannot be brought together without asking. */
export type ConflictReason =
  /** Both changed it, and not to the same. */
  | 'both'
  /** Both added something of that name, and not the same. */
  | 'added'
  | 'mineRemoved'
  | 'theirsRemoved'
  /** Both arranged it anew, or both put something new into one place. */
  | 'order'
  /** One took away or changed what the words of the other point at. */
  | 'reference';

/** What a conflict is about: what its three values are, and what may be typed in their place. */
export type ConflictKind =
  /** One field of the head, of an entry, or the title of a step. */
  | 'field'
  /** A whole entry of a list, or null where it is not there. */
  | 'entry'
  /** A whole step, or null where it is not there. */
  | 'step'
  /** Words in canonical Markdown: a body or the introduction. */
  | 'text'
  /** Keys or step ids in their order. */
  | 'order'
  /** Keys of the cautions ahead of a step. */
  | 'cautions';

export interface Conflict {
  /** `title`, `torques.cover-bolt`, `parts.gasket.note`, `steps.draw-down.body`, `intro`; of an order: `order.steps`. */
  path: string;
  kind: ConflictKind;
  reason: ConflictReason;
  /** What it is called at the bench: "Cover bolt". */
  label: string;
  base: unknown;
  mine: unknown;
  theirs: unknown;
  /** The three as a person reads them; null where it is not there. */
  says: Record<Side, string | null>;
}

/** What an author chose: one of the three, or a value of their own in the shape of the conflict's kind. */
export type Choice = { take: Side } | { take: 'typed'; value: unknown };
export type Choices = Readonly<Record<string, Choice>>;

export interface Texts {
  base: Procedure;
  mine: Procedure;
  theirs: Procedure;
}

export interface Merge {
  texts: Texts;
  /** Both texts brought together; what nobody has chosen yet stands as in the base. */
  procedure: Procedure;
  conflicts: Conflict[];
}

/** Collects conflicts on the way and answers each with what was chosen, or with the base. */
export interface Asking {
  choices: Choices;
  conflicts: Conflict[];
}

/** Puts a conflict before the author; the chosen value, or that of the base while nothing is chosen. */
export function settle<T>(asking: Asking, conflict: Conflict): T {
  asking.conflicts.push(conflict);
  const choice = Object.hasOwn(asking.choices, conflict.path) ? asking.choices[conflict.path] : undefined;
  if (!choice) return conflict.base as T;
  return (choice.take === 'typed' ? choice.value : conflict[choice.take]) as T;
}
