import { sideLine, type Span } from './sideText';
import type { ValueChange } from './types';
import { compareWords } from './words';

/** A changed value with its texts set for showing: a sentence word by word, a number as a whole. */
export interface ValueRow extends ValueChange {
  old: Span[] | null;
  now: Span[] | null;
  /** True for a sentence, which is set in smaller type than a number. */
  prose: boolean;
}

/** Longer texts are sentences: their words are compared. */
const LONGEST_VALUE = 30;

export const valueRows = (values: readonly ValueChange[]): ValueRow[] =>
  values.map((value) => {
    const { from, to } = value;
    const prose = Math.max(from?.length ?? 0, to?.length ?? 0) > LONGEST_VALUE;
    if (prose && from !== null && to !== null) {
      const runs = compareWords(from, to);
      return { ...value, prose, old: sideLine(runs, 'old'), now: sideLine(runs, 'new') };
    }
    const whole = (text: string | null) => (text === null ? null : [{ text, changed: true }]);
    return { ...value, prose, old: whole(from), now: whole(to) };
  });

/** Lists that hands act on; what else a sheet says stands apart from them. */
const AT_THE_BENCH = new Set<ValueChange['list']>([
  'torques',
  'limits',
  'cautions',
  'parts',
  'timers',
  'supplies',
  'tools',
]);
export const isAtTheBench = ({ list }: Pick<ValueChange, 'list'>) => AT_THE_BENCH.has(list);
