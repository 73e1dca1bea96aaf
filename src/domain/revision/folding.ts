import { isChange, type StepPair } from './twoTexts';

type Foldable = Pick<StepPair, 'id' | 'kind' | 'moved'> & {
  old: { number: number | null } | null;
  now: { number: number | null } | null;
};

/** A step that is shown, or a run of unchanged ones that is folded away. */
export type Section<P> = { kind: 'step'; pair: P } | { kind: 'fold'; id: string; pairs: P[] };

/** A fold must be worth its line. */
const LEAST = 2;

/**
 * Folds long runs of unchanged steps. One step stays open on either side of a change, to show where it stands; so does
 * every step that `keep` names. A run holds steps that follow one another in both texts, so that it is one block left
 * and right.
 */
export function foldSteps<P extends Foldable>(
  pairs: readonly P[],
  keep: (id: string) => boolean = () => false,
): Section<P>[] {
  const open = pairs.map((pair) => isChange(pair) || keep(pair.id));
  const near = open.map((is, i) => is || (open[i - 1] ?? false) || (open[i + 1] ?? false));
  const follows = (a: P | undefined, b: P) =>
    a?.old?.number === (b.old?.number ?? 0) - 1 && a.now?.number === (b.now?.number ?? 0) - 1;
  const sections: Section<P>[] = [];
  let run: P[] = [];
  const close = () => {
    const [first] = run;
    if (first && run.length >= LEAST) sections.push({ kind: 'fold', id: first.id, pairs: run });
    else sections.push(...run.map((pair): Section<P> => ({ kind: 'step', pair })));
    run = [];
  };
  pairs.forEach((pair, i) => {
    if (run.length > 0 && !follows(run.at(-1), pair)) close();
    if (near[i]) {
      close();
      sections.push({ kind: 'step', pair });
    } else run.push(pair);
  });
  close();
  return sections;
}

/** The sections of the old text, in its own order. */
export function oldOrder<P extends Foldable>(sections: readonly Section<P>[]): Section<P>[] {
  const place = (section: Section<P>) => {
    const pair = section.kind === 'step' ? section.pair : section.pairs[0];
    return pair?.old ? (pair.old.number ?? 0) : null;
  };
  return sections
    .flatMap((section) => {
      const at = place(section);
      return at === null ? [] : [{ section, at }];
    })
    .sort((a, b) => a.at - b.at)
    .map(({ section }) => section);
}
