import { mixUpsOfChange } from '../measure/unitMixUp';
import { clampOf, clampText, OUT_OF_TABLES, sizeMixUp } from '../procedure/clamp';
import type { Frontmatter, Torque } from '../procedure/schema';
import type { ClampChange } from './types';

/** Whether anything that the clamp check goes by differs. */
const differs = (a: Torque, b: Torque): boolean =>
  a.nm !== b.nm ||
  a.thread !== b.thread ||
  a.pitch !== b.pitch ||
  a.class !== b.class ||
  a.condition !== b.condition ||
  JSON.stringify(a.angles ?? []) !== JSON.stringify(b.angles ?? []);

const textOf = (torque: Torque | undefined): string | null => {
  const check = torque && clampOf(torque);
  return check ? (clampText(check)?.metric ?? null) : null;
};

function mixUps(before: Torque | undefined, now: Torque): string[] {
  const change = before && before.nm !== now.nm ? mixUpsOfChange(before.nm, now.nm) : null;
  const size = sizeMixUp(now);
  return [...(change?.ok ? change.value.slice(0, 1).map(({ says }) => says) : []), ...(size ? [size] : [])];
}

/** Clamp load then and now of every torque that is new or whose load may have changed. `null` is a blank sheet. */
export function clampChanges(from: Frontmatter | null, to: Frontmatter): ClampChange[] {
  return to.torques.flatMap((now): ClampChange[] => {
    const before = from?.torques.find(({ key }) => key === now.key);
    if (before && !differs(before, now)) return [];
    const check = clampOf(now);
    return [
      {
        key: now.key,
        name: now.name,
        from: textOf(before),
        to: textOf(now),
        verdict: check?.verdict ?? 'unknown',
        why: check?.why ?? OUT_OF_TABLES,
        mixUps: mixUps(before, now),
      },
    ];
  });
}
