import type { RevisionSummary } from '../api/schemas/book';
import type { PersonRef } from '../api/schemas/common';
import type { TrailEntry } from '../api/schemas/proposals';
import type { ChangeWords } from './changeWords';

/** The history of a procedure in one order of time, as a page shows it. */

/** How many were asked to read and sign, and how many have, as far as the reader may know. */
export interface ReadBy {
  signed: number;
  asked: number;
  /** Whether all the network is counted, or only the reader's own shops. */
  all: boolean;
}

export interface RevisionEvent {
  kind: 'revision';
  id: string;
  at: string;
  revision: RevisionSummary;
  /** Letter of the revision it grew from; null for the first. */
  parent: string | null;
  /** What became of it from being proposed to being published, oldest first. */
  acts: TrailEntry[];
  /** Null for the first revision, all of which is new. */
  changes: ChangeWords | null;
  readBy: ReadBy | null;
}

export interface WithdrawalEvent {
  kind: 'withdrawn' | 'brought back';
  id: string;
  at: string;
  by: PersonRef;
  reason: string;
  /** The revision that was published then. */
  letter: string;
  readBy: ReadBy | null;
}

export type HistoryEvent = RevisionEvent | WithdrawalEvent;

/** Some of a history, latest first. */
export interface HistoryPart {
  events: HistoryEvent[];
  /** Place of the first of them, from 1, and how many there are in all. */
  from: number;
  total: number;
  /** Ids to go on from; null at either end. */
  older: string | null;
  newer: string | null;
}
