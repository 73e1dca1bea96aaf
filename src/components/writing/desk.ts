import { createContext, use } from 'react';
import { useFormContext } from 'react-hook-form';
import type { z } from 'zod';
import type { Threads } from '@/components/threads/useThreads';
import type { Remark } from '@/domain/api/schemas/proposals';
import type { Thread } from '@/domain/api/schemas/threads';
import type { SourceProblem } from '@/domain/procedure/types';
import type { Draft } from '@/domain/writing/draft';
import type { Place } from './places';

/** A drawing that the book has, with the words it was given where it was used first. */
export interface Drawing {
  file: string;
  alt: string;
  caption: string;
}

/** What every part of the desk shares besides the form itself. */
export interface Desk {
  /** The whole draft as it stands. */
  draft: Draft;
  /** The revision that it stands on, as a draft; null for a new procedure. */
  base: Draft | null;
  baseLetter: string | null;
  engines: readonly { key: string; name: string }[];
  drawings: readonly Drawing[];
  problems: readonly SourceProblem[];
  /** Why it was returned; empty unless it was. */
  remarks: readonly z.infer<typeof Remark>[];
  /** What is still open of what reviewers wrote; empty unless it was returned. */
  threads: readonly Thread[];
  /** What can be done in them; `accept` changes the draft, and the page loads again. */
  talk: Omit<Threads, 'accept'> & { accept: (thread: Thread) => void };
  /** The whole sheet is edited as text, so there are no fields to go to. */
  asText: boolean;
  /** The author asked what is wrong, so every field says it, touched or not. */
  tried: boolean;
  place: Place;
  /** `replace` leaves no trace in the browser's history. */
  choose: (place: Place, how?: { replace: boolean }) => void;
  /** Goes to the field at a problem's path. */
  goTo: (path: string) => void;
  /** Puts the caret into the field with this id as soon as it is on the screen. */
  focusSoon: (id: string) => void;
  /** Says what was deleted and offers to bring it back. */
  offerUndo: (said: string, undo: () => void) => void;
}

export const DeskContext = createContext<Desk | null>(null);

export function useDesk(): Desk {
  const desk = use(DeskContext);
  if (!desk) throw new Error('Outside of the writing desk.');
  return desk;
}

export const useDraftForm = () => useFormContext<Draft>();
