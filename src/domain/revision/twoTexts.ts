import type { Caution, Frontmatter } from '../procedure/schema';
import { sideBlocks, sideLine, type Block, type Side, type Span } from './sideText';
import type { Comparison, StepChange, WordRun } from './types';
import { compareWords } from './words';

/** A caution ahead of a step, with the words that the other text has not. */
export interface CautionLine {
  key: string;
  signal: Caution['signal'];
  /** The signal word that it has in the other text, where that is another one. */
  otherSignal: Caution['signal'] | null;
  spans: Span[];
}

/** A step as one of the two texts has it. */
export interface StepSide {
  /** Null for the introduction. */
  number: number | null;
  title: Span[];
  cautions: CautionLine[];
  blocks: Block[];
}

/** A step that stands in one of two texts or in both, ready to be laid out side by side. */
export interface StepPair {
  id: string;
  kind: StepChange['kind'];
  moved: boolean;
  /** What it does at the bench beyond the words. */
  effects: string[];
  critical: string | null;
  old: StepSide | null;
  now: StepSide | null;
}

/** The introduction takes part under this id, which no step can have. */
export const INTRODUCTION = '(introduction)';

const words = ({ hazard, harm, avoid }: Caution) => {
  const stop = (text: string) => (/[.!?]$/.test(text) ? text : `${text}.`);
  return `${stop(`${hazard} ${harm}`)} ${stop(avoid)}`;
};

/** The cautions of one side; a text that stands before the step on both sides is compared word by word. */
function cautionLines(side: Side, here: string[], there: string[], head?: Frontmatter, other?: Frontmatter) {
  const find = (key: string, list?: Frontmatter) => list?.cautions.find((caution) => caution.key === key);
  return here.flatMap((key): CautionLine[] => {
    const caution = find(key, head);
    if (!caution) return [];
    const twin = there.includes(key) ? find(key, other) : undefined;
    const mine = words(caution);
    const theirs = twin ? words(twin) : '';
    const runs: WordRun[] = side === 'old' ? compareWords(mine, theirs) : compareWords(theirs, mine);
    const otherSignal = twin && twin.signal !== caution.signal ? twin.signal : null;
    return [{ key, signal: caution.signal, otherSignal, spans: sideLine(other ? runs : unmarked(runs), side) }];
  });
}

const isChanged = (lines: readonly CautionLine[]) =>
  lines.some(({ spans, otherSignal }) => otherSignal !== null || spans.some(({ changed }) => changed));

/** A text that nothing stands against has no words of its own: marking them all would mark none. */
const unmarked = (runs: readonly WordRun[]): WordRun[] => runs.map(({ text }) => ({ kind: 'same', text }));

/**
 * Both texts step by step, in the order of the new one. A step is told as edited also where only the words or the
 * signal word of a caution ahead of it changed, since whoever reads the step reads those.
 *
 * @param from front matter of the old text; null for a new procedure, whose words are not marked
 */
export function twoTexts(comparison: Comparison, from: Frontmatter | null, to: Frontmatter): StepPair[] {
  const own = from ? (runs: readonly WordRun[]) => runs : unmarked;
  const steps = comparison.steps.map((step): StepPair => {
    const sideOf = (side: Side, number: number | null): StepSide | null => {
      if (number === null) return null;
      const [here, there] = side === 'old' ? (['from', 'to'] as const) : (['to', 'from'] as const);
      const heads = side === 'old' ? ([from ?? undefined, to] as const) : ([to, from ?? undefined] as const);
      return {
        number,
        title: sideLine(own(step.title), side),
        cautions: cautionLines(side, step.cautions[here], step.cautions[there], ...heads),
        blocks: sideBlocks(own(step.body), side),
      };
    };
    const old = sideOf('old', step.fromNumber);
    const now = sideOf('new', step.toNumber);
    const reworded = step.kind === 'same' && (isChanged(old?.cautions ?? []) || isChanged(now?.cautions ?? []));
    return {
      id: step.id,
      kind: reworded ? 'edited' : step.kind,
      moved: step.moved,
      effects: step.effects,
      critical: step.critical,
      old,
      now,
    };
  });
  return comparison.intro.some(({ kind }) => kind !== 'same')
    ? [introduction(own(comparison.intro), from === null), ...steps]
    : steps;
}

function introduction(runs: readonly WordRun[], alone: boolean): StepPair {
  const sideOf = (side: Side): StepSide | null => {
    if (alone && side === 'old') return null;
    const blocks = sideBlocks(runs, side);
    return blocks.length === 0
      ? null
      : { number: null, title: [{ text: 'Introduction', changed: false }], cautions: [], blocks };
  };
  const old = sideOf('old');
  const now = sideOf('new');
  const kind = old && now ? 'edited' : now ? 'added' : 'removed';
  return { id: INTRODUCTION, kind, moved: false, effects: [], critical: null, old, now };
}

/** Whether anything about the step differs, its place included. */
export const isChange = ({ kind, moved }: Pick<StepPair, 'kind' | 'moved'>) => kind !== 'same' || moved;

/** "4 changes: 2 steps edited, 1 added, 1 moved". A step that was edited and moved is one change, told by both. */
export function changesInWords(pairs: readonly Pick<StepPair, 'kind' | 'moved'>[]): string {
  const changes = pairs.filter(isChange).length;
  if (changes === 0) return 'No step changes';
  const parts = [
    ['edited', pairs.filter(({ kind }) => kind === 'edited').length],
    ['added', pairs.filter(({ kind }) => kind === 'added').length],
    ['removed', pairs.filter(({ kind }) => kind === 'removed').length],
    ['moved', pairs.filter(({ moved }) => moved).length],
  ] as const;
  const told = parts.filter(([, n]) => n > 0).map(([what, n]) => `${n} ${what}`);
  return `${changes} ${changes === 1 ? 'change' : 'changes'} in the text: ${told.join(', ')}`;
}
