import type { Proposal } from '@/domain/api/schemas/proposals';
import type { ThreadList } from '@/domain/api/schemas/threads';
import type { Drawing } from './desk';

/** A published text with its letter. */
export interface Standing {
  letter: string;
  source: string;
}

export interface WritingProps {
  proposal: Proposal;
  threads: ThreadList;
  /** The draft's text, in the shape of the form wherever it can be read. */
  source: string;
  base: Standing | null;
  /** What is published now, where that is no longer the base. */
  current: Standing | null;
  engines: readonly { key: string; name: string }[];
  drawings: readonly Drawing[];
  /** What was just done that brought the author here. */
  said?: string | undefined;
}
