import { mergedSequence } from './mergeText';
import type { Side } from './mergeTypes';
import { inEveryLongestRising } from './rising';

type Keys = readonly string[];

/** `keys` with each of `extra` behind the key that it follows in `like`; several in one place stand by
 * their name, or behind all that is there where they come `last`. */
function weave(keys: Keys, like: Keys, extra: ReadonlySet<string>, last = false): string[] {
  const out = [...keys];
  let before: string | undefined;
  for (const key of like) {
    if (!extra.has(key)) {
      if (out.includes(key)) before = key;
      continue;
    }
    let at = before === undefined ? 0 : out.indexOf(before) + 1;
    // Among what the other side put there too, by name: both orders of asking must end in one order.
    for (let next = out[at]; next !== undefined && !like.includes(next) && (last || next < key); next = out[at])
      at += 1;
    out.splice(at, 0, key);
    before = key;
  }
  return out;
}

/** Whether the neighbours of every new key in `like` still stand side by side in `keys`. */
function fits(keys: Keys, like: Keys, extra: ReadonlySet<string>): boolean {
  return like.every((key, i) => {
    if (!extra.has(key)) return true;
    const before = like.slice(0, i).findLast((k) => !extra.has(k));
    const after = like.slice(i + 1).find((k) => !extra.has(k));
    return before === undefined ? keys[0] === after : keys[keys.indexOf(before) + 1] === after && keys.includes(before);
  });
}

const without = (keys: Keys, others: Keys) => keys.filter((key) => !others.includes(key));

const isWhole = (order: Keys, members: ReadonlySet<string>) =>
  order.length === members.size && new Set(order).size === order.length && order.every((key) => members.has(key));

/**
 * The order of what a merge keeps. `firm` is for steps: where both put something new into one place, or what stood
 * around it has moved, the order is nobody's and is asked for; in a list of values it means nothing.
 *
 * @param members what is kept, each of them in at least one of the three
 */
export function mergeOrder(
  given: Record<Side, Keys>,
  members: ReadonlySet<string>,
  firm: boolean,
): { order: string[] } | { sides: Record<Side, string[]> } {
  const kept = (keys: Keys) => keys.filter((key) => members.has(key));
  const base = kept(given.base);
  /** What a side took away, and the merge keeps all the same, is back where it stood. */
  const whole = (keys: Keys) => {
    const own = kept(keys);
    return weave(own, base, new Set(base.filter((key) => !own.includes(key))));
  };
  const mine = whole(given.mine);
  const theirs = whole(given.theirs);
  const [ours, others] = [without(mine, base), without(theirs, base)];
  const both = new Set(ours.filter((key) => others.includes(key)));
  // What both sides added alike is as good as there before; each may still have put it elsewhere.
  const starts = [weave(base, mine, both), weave(base, theirs, both)].sort((a, b) =>
    a.join(' ') < b.join(' ') ? -1 : 1,
  );
  const start = starts[0] ?? [];
  const alike = start.join(' ') === starts[1]?.join(' ');
  const merged = mergedSequence(start, mine, theirs);
  if (alike && merged && isWhole(merged, members)) return { order: merged };

  const [newMine, newTheirs] = [new Set(without(ours, others)), new Set(without(others, ours))];
  const sides = {
    base: weave(weave(start, mine, newMine), theirs, newTheirs),
    mine: weave(mine, theirs, newTheirs, firm),
    theirs: weave(theirs, mine, newMine, firm),
  };
  if (sides.mine.join(' ') === sides.theirs.join(' ')) return { order: sides.mine };
  const shared = (keys: Keys) => keys.filter((key) => start.includes(key)).join(' ');
  const [myMoves, theirMoves] = [mine, theirs].map((keys) => shared(keys) !== start.join(' '));
  const bothMoved = myMoves && theirMoves && shared(mine) !== shared(theirs);
  const fit = theirMoves ? fits(theirs, mine, newMine) : fits(mine, theirs, newTheirs);
  if (bothMoved || (firm && !(alike && fit))) return { sides };
  return { order: theirMoves ? sides.theirs : myMoves ? sides.mine : sides.base };
}

/** What may be said to stand elsewhere than before; of two neighbours that changed places, that is each of them. */
export function movedKeys(base: Keys, side: Keys): Set<string> {
  const places = new Map(base.map((key, i) => [key, i]));
  const shared = side.filter((key) => places.has(key));
  const stay = inEveryLongestRising(shared.map((key) => places.get(key) ?? 0));
  return new Set(shared.filter((_, i) => !stay.has(i)));
}
