import type { Step } from '../procedure/types';
import { mergeOrder, movedKeys } from './mergeOrder';
import { pick } from './mergeSame';
import { mergedSequence, mergeText } from './mergeText';
import { type Asking, settle, type Side, type Texts } from './mergeTypes';
import { stepText } from './mergeWords';

type Three<T> = Record<Side, T>;
const SIDES = ['base', 'mine', 'theirs'] as const;
const three = <T>(make: (side: Side) => T): Three<T> => ({
  base: make('base'),
  mine: make('mine'),
  theirs: make('theirs'),
});

/** Words in canonical Markdown: a body, or the introduction. */
export function mergeWords(asking: Asking, path: string, label: string, of: Three<string>): string {
  const merged = mergeText(of.base, of.mine, of.theirs);
  if ('text' in merged) return merged.text;
  const { sides } = merged;
  return settle<string>(asking, { path, kind: 'text', reason: 'both', label, ...sides, says: sides });
}

function mergeTitle(asking: Asking, of: Three<Step>): string {
  const clean = pick(of.base.title, of.mine.title, of.theirs.title);
  if (clean) return clean.value;
  const titles = three((side) => of[side].title);
  const label = `Title of step “${of.base.title}”`;
  return settle<string>(asking, {
    path: `steps.${of.base.id}.title`,
    kind: 'field',
    reason: 'both',
    label,
    ...titles,
    says: titles,
  });
}

function mergeCautions(asking: Asking, of: Three<Step>, hazard: (key: string) => string): string[] {
  const lists = three((side) => of[side].cautions);
  const clean = pick(lists.base, lists.mine, lists.theirs);
  const merged = clean?.value ?? mergedSequence(lists.base, lists.mine, lists.theirs);
  if (merged && new Set(merged).size === merged.length) return merged;
  const says = three((side) => lists[side].map(hazard).join('; ') || null);
  const label = `Cautions ahead of step “${of.base.title}”`;
  return settle<string[]>(asking, {
    path: `steps.${of.base.id}.cautions`,
    kind: 'cautions',
    reason: 'both',
    label,
    ...lists,
    says,
  });
}

function mergeStep(
  asking: Asking,
  of: Three<Step | undefined>,
  moved: boolean,
  hazard: (key: string) => string,
): Step | undefined {
  const { base, mine, theirs } = of;
  const clean = pick(base, mine, theirs);
  // Who moved a step wants it, so that it is not taken away without asking.
  const unwanted = moved && (mine === undefined) !== (theirs === undefined);
  if (clean && !unwanted) return clean.value;
  if (base && mine && theirs) {
    const whole = { base, mine, theirs };
    const bodies = three((side) => whole[side].body);
    return {
      id: base.id,
      title: mergeTitle(asking, whole),
      cautions: mergeCautions(asking, whole, hazard),
      body: mergeWords(asking, `steps.${base.id}.body`, `Step “${mine.title}”`, bodies),
    };
  }
  const some = mine ?? theirs;
  const chosen = settle<Step | null>(asking, {
    path: `steps.${some?.id ?? ''}`,
    kind: 'step',
    reason: !mine ? 'mineRemoved' : !theirs ? 'theirsRemoved' : 'added',
    label: `Step “${some?.title ?? ''}”`,
    ...three((side) => of[side] ?? null),
    says: three((side) => stepText(of[side])),
  });
  return chosen ?? undefined;
}

/** Steps by their id, in an order that somebody gave them. */
export function mergeSteps(asking: Asking, texts: Texts): Step[] {
  const hazard = (key: string) =>
    SIDES.flatMap((side) => texts[side].frontmatter.cautions).find((caution) => caution.key === key)?.hazard ?? key;
  const byId = three((side) => new Map(texts[side].steps.map((step) => [step.id, step])));
  const ids = three((side) => texts[side].steps.map(({ id }) => id));
  const [movedByMine, movedByTheirs] = [movedKeys(ids.base, ids.mine), movedKeys(ids.base, ids.theirs)];
  const kept = new Map<string, Step>();
  // In the order of the published text, so that conflicts are asked about as the sheet is read.
  for (const id of new Set([...ids.theirs, ...ids.base, ...ids.mine])) {
    const moved = movedByMine.has(id) || movedByTheirs.has(id);
    const step = mergeStep(
      asking,
      three((side) => byId[side].get(id)),
      moved,
      hazard,
    );
    if (step) kept.set(id, step);
  }
  const merged = mergeOrder(ids, new Set(kept.keys()), true);
  const inOrder = (order: readonly string[]) => order.flatMap((id) => kept.get(id) ?? []);
  if ('order' in merged) return inOrder(merged.order);
  const { sides } = merged;
  const says = three((side) =>
    inOrder(sides[side])
      .map(({ title }, i) => `${i + 1} ${title}`)
      .join('\n'),
  );
  const asks = { path: 'order.steps', kind: 'order', reason: 'order', label: 'Order of the steps' } as const;
  return inOrder(settle<string[]>(asking, { ...asks, ...sides, says }));
}
