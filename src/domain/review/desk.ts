import { SEVERITY_LEVELS, type Severity, type TakenBackFrom } from '../revision/types';
import { agreementsNeeded } from './rules';

/** What the review desk needs of a proposal to put it in its place. */
export interface DeskItem {
  id: string;
  /** Letter of the revision it changes; null for a new procedure, which nobody works to yet. */
  base: string | null;
  criticalReasons: readonly string[];
  severity: Severity;
  /** When it was sent in, ISO 8601 in UTC. */
  proposedAt: string;
  /** How many agreements stand. */
  agreements: number;
}

/** Where it stands: by severity, and within one a sheet in use, which somebody works to, before a new one. */
const rank = ({ severity, base }: Pick<DeskItem, 'base' | 'severity'>): number =>
  SEVERITY_LEVELS.indexOf(severity.level) * 2 + (base === null ? 0 : 1);

/** Worst first: by severity, then who has waited longest. A new list; the order is total, so it never flickers. */
export function deskOrder<T extends DeskItem>(items: readonly T[]): T[] {
  return [...items].sort(
    (a, b) =>
      rank(b) - rank(a) ||
      Date.parse(a.proposedAt) - Date.parse(b.proposedAt) ||
      (a.id < b.id ? -1 : a.id > b.id ? 1 : 0),
  );
}

export const LEVEL_WORDS = { grave: 'Grave', serious: 'Serious' };

/** What a proposal would do, in words: "Grave: the caution “Hot oil” is weaker, and 1 more." */
export function severityWords({ base, severity: { level, because } }: Pick<DeskItem, 'base' | 'severity'>): string {
  if (level === 'ordinary') return base === null ? 'A new sheet.' : 'An ordinary change to a sheet in use.';
  const [first = '', ...others] = because;
  return `${LEVEL_WORDS[level]}: ${first}${others.length > 0 ? `, and ${others.length} more` : ''}.`;
}

/**
 * What a proposal undoes of earlier revisions, a sentence for each: "Takes back what revision C changed: Cover bolt
 * torque, 10 to 12 N·m; step “Wait”, added; and 2 more." Whoever proposes it may not know.
 *
 * @param most how many are named of each revision before the rest is counted
 * @param done true once it was published: it took them back
 */
export function takenBackWords(takesBack: readonly TakenBackFrom[], most: number, done = false): string[] {
  return takesBack.map(({ revision, what }) => {
    // A rest of one is named: counting it would be no shorter.
    const named = what.length === most + 1 ? what : what.slice(0, most);
    const rest = what.length - named.length;
    const told = [...named, ...(rest > 0 ? [`and ${rest} more`] : [])].join('; ');
    return `${done ? 'Took' : 'Takes'} back what revision ${revision} changed: ${told}.`;
  });
}

const DAY = 86_400_000;
/** Whole days since then; 0 on the day itself. Both ISO 8601 in UTC. */
export const daysSince = (then: string, now: string): number =>
  Math.max(0, Math.floor((Date.parse(now) - Date.parse(then)) / DAY));

/**
 * Why a proposal stands where it stands: "Serious: a torque changes (Cover bolt). Waiting 3 days, 1 of 2 agreed."
 *
 * @param now ISO 8601 in UTC
 */
export function deskReason(item: DeskItem, now: string): string {
  const days = daysSince(item.proposedAt, now);
  const waiting = days === 0 ? 'Sent in today' : `Waiting ${days} ${days === 1 ? 'day' : 'days'}`;
  return `${severityWords(item)} ${waiting}, ${item.agreements} of ${agreementsNeeded(item.criticalReasons)} agreed.`;
}

const proposals = (count: number) => (count === 1 ? '1 proposal waits' : `${count} proposals wait`);

/**
 * How much of a desk is the reader's to do, and how much waits for its author or for another editor: "2 proposals wait
 * for you, 1 for others." Empty for an empty desk.
 */
export function deskCount(
  items: readonly { next: 'agree' | 'override' | 'publish' | 'wait'; stale: boolean }[],
): string {
  const yours = items.filter(({ next, stale }) => next !== 'wait' && !stale).length;
  const others = items.length - yours;
  if (items.length === 0) return '';
  if (yours === 0) return `Nothing here waits for you; ${proposals(others)} for others.`;
  return `${proposals(yours)} for you${others > 0 ? `, ${others} for others` : ''}.`;
}
