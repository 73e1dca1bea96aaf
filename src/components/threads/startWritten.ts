import type { ThreadKind } from '@/domain/review/threads';

/** A thread that is being started: where, and what was typed so far. */
export interface StartWritten {
  kind: ThreadKind;
  /** `step:<id>`, the path of a value or of an entry, or empty for the whole. */
  at: string;
  text: string;
  quote: string;
  replacement: string;
  value: string;
  /** The field of an entry that is suggested, where `at` names the entry as a whole. */
  field: string;
}

export const blankStart = (kind: ThreadKind, at: string): StartWritten => ({
  kind,
  at,
  text: '',
  quote: '',
  replacement: '',
  value: '',
  field: '',
});
