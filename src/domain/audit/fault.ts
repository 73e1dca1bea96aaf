import type { Break } from './chain';

export const FAULT_TABLES = [
  'auditEntries',
  'procedures',
  'revisions',
  'agreements',
  'clampOverrides',
  'remarks',
  'bulletins',
  'readAndSigned',
] as const;
export type FaultTable = (typeof FAULT_TABLES)[number];

/** A row that does not say what the trail says, or an entry that does not follow. */
export interface Fault {
  table: FaultTable;
  /** Id of the row; of an entry its number, "12" or "12 to 14", "end" for the end of the trail; of a row that is gone, "entry 12", which tells of it. */
  id: string;
  /** Of the entry, where it is known: ISO 8601 in UTC. */
  at: string | null;
  /** Of the procedure it is about, and of the revision; null where that cannot be known. */
  number: string | null;
  letter: string | null;
  /** What differs, as clauses behind its name. */
  differs: string[];
}

const BREAKS: Record<Break['kind'], string> = {
  changed: 'was changed after it was written',
  replaced: 'is not the one that was written: what comes after it does not follow from it',
  missing: 'is missing',
};

export const breakFault = (one: Break, about: Pick<Fault, 'at' | 'number' | 'letter'>): Fault => ({
  table: 'auditEntries',
  id: one.kind === 'missing' && one.through > one.seq ? `${one.seq} to ${one.through}` : String(one.seq),
  ...about,
  differs: [BREAKS[one.kind]],
});

const place = ({ number, letter }: Fault) => [number, letter && `revision ${letter}`].filter(Boolean).join(' ');

const NAMES: Record<Exclude<FaultTable, 'auditEntries'>, (place: string) => string> = {
  procedures: (at) => at || 'A procedure',
  revisions: (at) => at || 'A text that was never published',
  agreements: (at) => `An agreement to ${at || 'a text'}`,
  clampOverrides: (at) => `An override of the clamp check of ${at || 'a text'}`,
  remarks: (at) => `The reason of a return of ${at || 'a text'}`,
  bulletins: (at) => `A bulletin of ${at || 'a procedure'}`,
  readAndSigned: (at) => `A signature to a bulletin of ${at || 'a procedure'}`,
};

/**
 * A fault as a sentence: "The entry of 3 Mar 2026 about P-0142 revision C was changed after it was written."
 *
 * @param day how a date reads where the sentence is said
 */
export function faultSentence(fault: Fault, day: (iso: string) => string): string {
  const { table, id, at, differs } = fault;
  const about = place(fault);
  const several = id.includes(' to ');
  const name =
    id === 'end'
      ? 'The trail'
      : table === 'auditEntries'
        ? at === null
          ? `${several ? 'The entries' : 'The entry'} ${id} of the trail`
          : `The entry of ${day(at)}${about ? ` about ${about}` : ` (number ${id})`}`
        : NAMES[table](about);
  const clauses = differs.join('; ');
  return `${name} ${several ? clauses.replace(/^is missing/, 'are missing') : clauses}.`;
}

/** What to do about it, behind the sentence on a sheet's own history. */
export const TELL_THE_STEWARD = "Do not work from it; tell the network's steward.";
