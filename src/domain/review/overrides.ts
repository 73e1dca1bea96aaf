import { listed } from '../wording';
import { shareText } from '../procedure/clamp';
import type { FailingTorque } from '../revision/failingTorques';

/**
 * An editor's written reason why a torque past proof load may be published all the same. It is to one exact text and one
 * of its torques, on whatever base: the load is the text's own.
 */
export interface Override {
  personId: string;
  /** SHA-256 of the canonical text. */
  hash: string;
  /** Key of the torque. */
  torque: string;
  reason: string;
}

/** What of the facts of a proposal is asked. */
interface Judged {
  authorId: string;
  hash: string;
  editorIds: readonly string[];
  overrides: readonly Override[];
}

/**
 * The override of a torque that stands: given to this text, with a reason, by somebody other than the author who still
 * is an editor of the book. Whoever lost the role no longer answers for the number.
 */
export const standingOverride = ({ authorId, hash, editorIds, overrides }: Judged, key: string): Override | null =>
  overrides.find(
    (o) =>
      o.torque === key &&
      o.hash === hash &&
      o.personId !== authorId &&
      editorIds.includes(o.personId) &&
      o.reason.trim() !== '',
  ) ?? null;

/** The torques whose failed clamp check nobody has overridden yet. */
export const openTorques = (facts: Judged & { failing: readonly FailingTorque[] }): FailingTorque[] =>
  facts.failing.filter(({ key }) => standingOverride(facts, key) === null);

/** "123 %"; never "100 %", which would read as if it held. */
export const overText = (share: number): string => (share < 1.005 ? 'just over 100 %' : shareText(share));

/** "Cover bolt to 123 % of proof load" for each, as one list. */
export const failingWords = (failing: readonly Pick<FailingTorque, 'name' | 'share'>[]): string =>
  `${listed(failing.map(({ name, share }) => `${name} to ${overText(share)}`))} of proof load`;

/** What must still be overridden before it can be published, in words; null where nothing must. */
export function overrideMissing(open: readonly Pick<FailingTorque, 'name' | 'share'>[]): string | null {
  if (open.length === 0) return null;
  const which = open.length === 1 ? 'it' : 'each of them';
  return `The clamp check fails: this clamps ${failingWords(open)}. An editor must override ${which} with a written reason first.`;
}
