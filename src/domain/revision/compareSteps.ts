import type { Procedure, Step } from '../procedure/types';
import { bodyText } from './bodyText';
import { inOrder, type Reason, stepReasons } from './critical';
import type { Effect } from './effect';
import { longestRising } from './rising';
import { stepEffects } from './stepEffects';
import type { StepChange } from './types';
import { compareWords } from './words';

export interface StepDifference {
  change: StepChange;
  reasons: Reason[];
  effects: Effect[];
}

const sameStep = (a: Step, b: Step) =>
  a.title === b.title && a.body === b.body && a.cautions.join(' ') === b.cautions.join(' ');

function stepChange(
  from: { procedure: Procedure; step: Step; number: number } | null,
  to: { procedure: Procedure; step: Step; number: number } | null,
  moved: boolean,
  effects: Effect[],
): StepDifference {
  const text = (side: typeof from) => (side ? bodyText(side.step.body, side.procedure.frontmatter) : '');
  const title = compareWords(from?.step.title ?? '', to?.step.title ?? '');
  const body = compareWords(text(from), text(to));
  // A step whose words are the same is still edited where a value that it points at has changed.
  const same = from && to && sameStep(from.step, to.step) && body.every(({ kind }) => kind === 'same');
  const reasons = from ? stepReasons(from.step, to?.step ?? null, from.procedure.frontmatter) : [];
  return {
    reasons,
    effects,
    change: {
      id: (to ?? from)?.step.id ?? '',
      kind: same ? 'same' : from && to ? 'edited' : to ? 'added' : 'removed',
      moved,
      fromNumber: from?.number ?? null,
      toNumber: to?.number ?? null,
      title,
      body,
      cautions: { from: from?.step.cautions ?? [], to: to?.step.cautions ?? [] },
      effects: effects.map(({ words }) => words),
      critical: inOrder(reasons)[0] ?? null,
    },
  };
}

/** Steps followed by their id, in the order of the new text; a removed step stands after the one that it followed. */
export function compareSteps(from: Procedure | null, to: Procedure): StepDifference[] {
  const old = new Map((from?.steps ?? []).map((step, i) => [step.id, { procedure: from ?? to, step, number: i + 1 }]));
  const kept = new Set(to.steps.map(({ id }) => id));
  const shared = to.steps.flatMap(({ id }) => old.get(id) ?? []);
  const inPlace = longestRising(shared.map(({ number }) => number));
  const stays = new Set([...inPlace].flatMap((i) => shared[i]?.step.id ?? []));

  const out = to.steps.map((step, i) => {
    const before = old.get(step.id) ?? null;
    const moved = before !== null && !stays.has(step.id);
    const effects = from ? stepEffects(before?.step ?? null, step, from, to) : [];
    return stepChange(before, { procedure: to, step, number: i + 1 }, moved, effects);
  });
  let followed: string | null = null;
  for (const side of old.values()) {
    if (!kept.has(side.step.id)) {
      const after = out.findIndex(({ change }) => change.id === followed);
      out.splice(after + 1, 0, stepChange(side, null, false, from ? stepEffects(side.step, null, from, to) : []));
    }
    followed = side.step.id;
  }
  return out;
}
