import type { Procedure, Step } from '../procedure/types';
import { actedOn } from './bodyText';
import { effect, type Effect } from './effect';

/** What is in the first list and not in the second; what stands there twice must be in both twice. */
function lost(from: readonly string[], to: readonly string[]): string[] {
  const left = [...to];
  return from.filter((one) => {
    const at = left.indexOf(one);
    if (at !== -1) left.splice(at, 1);
    return at === -1;
  });
}

const holdsOf = (step: Step | null) => (step ? actedOn(step.body).holds : []);
const allHolds = (procedure: Procedure) => procedure.steps.flatMap(holdsOf);

function holdEffects(from: Step | null, to: Step | null, before: Procedure, after: Procedure): Effect[] {
  if (from?.body === to?.body) return [];
  const [old, now] = [holdsOf(from), holdsOf(to)];
  const [gone, come] = [lost(old, now), lost(now, old)];
  // As many for as many are the same hold points in other words.
  const dropped = gone.slice(come.length);
  const changed = Math.min(gone.length, come.length);
  // Every step of both texts is read for it, so only where it is asked.
  const nowhere = dropped.length > 0 ? lost(allHolds(before), allHolds(after)) : [];
  const title = (to ?? from)?.title ?? '';
  return [
    ...dropped.map((hold) =>
      nowhere.includes(hold)
        ? effect('hold-dropped', 'Nobody needs to check here any longer', `a hold point is dropped in “${title}”`)
        : effect('hold-changed', 'Its hold point stands in another step now'),
    ),
    ...(changed > 0 ? [effect('hold-changed', 'Its hold point is put in other words')] : []),
    ...(come.length > gone.length ? [effect('hold-added', 'A hold point more')] : []),
  ];
}

function warningEffects(from: Step | null, to: Step | null, before: Procedure, after: Procedure): Effect[] {
  // A step that is gone leaves nothing to be warned of; one that is new is read with its cautions.
  if (!from || !to) return [];
  const name = (key: string) =>
    [...after.frontmatter.cautions, ...before.frontmatter.cautions].find((one) => one.key === key)?.hazard ?? key;
  const places = (procedure: Procedure, key: string) =>
    procedure.steps.filter(({ cautions }) => cautions.includes(key)).length;
  return [
    ...lost(from.cautions, to.cautions).map((key) =>
      places(after, key) < places(before, key)
        ? effect(
            'caution-removed',
            'Whoever works here is no longer warned',
            `the caution “${name(key)}” no longer stands before “${to.title}”`,
          )
        : effect('caution-reworded', `“${name(key)}” stands before another step now`),
    ),
    ...lost(to.cautions, from.cautions).map((key) => effect('caution-stronger', `Warns of “${name(key)}” now`)),
  ];
}

/** What a changed step does at the bench beyond its words. Null is the side that has no such step. */
export const stepEffects = (from: Step | null, to: Step | null, before: Procedure, after: Procedure): Effect[] => [
  ...holdEffects(from, to, before, after),
  ...warningEffects(from, to, before, after),
];
