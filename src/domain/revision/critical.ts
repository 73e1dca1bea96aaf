import type { Frontmatter } from '../procedure/schema';
import type { Step } from '../procedure/types';
import { actedOn } from './bodyText';
import { type ListName, nameOf } from './fields';
import { clampReasons } from './severity';
import type { ClampChange } from './types';

/**
 * What makes a change critical, so that two editors must agree: a torque, limit, caution, hold point or what happens to
 * a part is changed or removed, in the lists or in the step that uses it; or the sheet is marked critical, before or
 * after. What is only added to a sheet is an ordinary change, unless it is a torque that cannot be right for its fastener.
 * A new sheet is critical where it gives a torque or a limit: nobody has checked those numbers yet.
 */

/** Most serious first. */
const KINDS = ['torque', 'limit', 'hold', 'caution', 'part', 'sheet'] as const;
export interface Reason {
  kind: (typeof KINDS)[number];
  words: string;
}

export const inOrder = (reasons: readonly (Reason | null)[]): string[] => {
  const given = reasons.filter((reason): reason is Reason => reason !== null);
  given.sort((a, b) => KINDS.indexOf(a.kind) - KINDS.indexOf(b.kind));
  return [...new Set(given.map(({ words }) => words))];
};

const GUARDED = { torques: 'torque', limits: 'limit', cautions: 'caution' } as const;
const isGuarded = (list: ListName): list is keyof typeof GUARDED => Object.hasOwn(GUARDED, list);

/**
 * Why a change to an entry of a list is critical. `field` is null where the whole entry was removed. Where a value comes
 * from (`source`) may be put right by one editor; everything else of a torque, a limit or a caution is acted on.
 */
export function entryReason(list: ListName, entry: Frontmatter[ListName][number], field: string | null): Reason | null {
  const name = nameOf(list, entry);
  if (isGuarded(list)) {
    const kind = GUARDED[list];
    if (field === null) return { kind, words: `a ${kind} is removed: ${name}` };
    return field === 'source' ? null : { kind, words: `a ${kind} changes: ${name}` };
  }
  if (list !== 'parts') return null;
  if (field === null) return { kind: 'part', words: `a part is removed: ${name}` };
  return field === 'action' ? { kind: 'part', words: `what happens to a part changes: ${name}` } : null;
}

export const SHEET_IS_CRITICAL = 'the sheet is marked critical';

export function sheetReasons(from: Frontmatter | null, to: Frontmatter): Reason[] {
  const reasons: Reason[] = [];
  if (from?.critical || to.critical) reasons.push({ kind: 'sheet', words: SHEET_IS_CRITICAL });
  if (from) return reasons;
  for (const { name } of to.torques) reasons.push({ kind: 'torque', words: `a new sheet gives a torque: ${name}` });
  for (const { name } of to.limits) reasons.push({ kind: 'limit', words: `a new sheet gives a limit: ${name}` });
  return reasons;
}

/** A torque that comes to a sheet past its proof load, or as a likely mix-up of units, is no ordinary addition. */
export function addedTorqueReasons(from: Frontmatter | null, clamp: readonly ClampChange[]): Reason[] {
  const added = clamp.filter(({ key }) => from && !from.torques.some((torque) => torque.key === key));
  return added.flatMap((one) =>
    clampReasons(one).map(({ kind }) => ({
      kind: 'torque',
      words: `an added torque ${kind === 'past-proof' ? 'is past its proof load' : 'looks like a mix-up of units'}: ${one.name}`,
    })),
  );
}

/** The first of `before` that cannot be found in `after` in the same order; -1 where all are still there. */
function firstLost(before: readonly string[], after: readonly string[]): number {
  let at = 0;
  return before.findIndex((item) => {
    const found = after.indexOf(item, at);
    at = found + 1;
    return found === -1;
  });
}

/** Why a change to a step is critical; `to` is null where the step was removed. Names come from the old front matter. */
export function stepReasons(from: Step, to: Step | null, head: Frontmatter): Reason[] {
  const reasons: Reason[] = [];
  const where = `in “${from.title}”`;
  const before = actedOn(from.body);
  const after = to ? actedOn(to.body) : { values: [], holds: [] };
  for (const kind of ['torque', 'limit'] as const) {
    const old = before.values.filter((value) => value.kind === kind);
    const now = after.values.filter((value) => value.kind === kind).map(({ id }) => id);
    const lost =
      old[
        firstLost(
          old.map(({ id }) => id),
          now,
        )
      ];
    if (!lost) continue;
    const list = kind === 'torque' ? head.torques : head.limits;
    const name = list.find(({ key }) => key === lost.key)?.name ?? lost.key;
    const how = now.includes(lost.id) ? 'is given in another order' : 'is no longer given';
    reasons.push({ kind, words: `a ${kind} ${how} ${where}: ${name}` });
  }
  if (firstLost(before.holds, after.holds) !== -1) {
    const how = after.holds.length < before.holds.length ? 'is removed' : 'changes';
    reasons.push({ kind: 'hold', words: `a hold point ${how} ${where}` });
  }
  const caution = from.cautions.find((key) => !to?.cautions.includes(key));
  if (caution !== undefined) {
    const name = head.cautions.find(({ key }) => key === caution)?.hazard ?? caution;
    reasons.push({ kind: 'caution', words: `a caution no longer stands before “${from.title}”: ${name}` });
  }
  return reasons;
}
