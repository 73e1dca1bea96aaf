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
export const LONGEST_VALUE = 30;

/**
 * @param engines names of the engines by their keys; one that is not known keeps its key
 */
export const valueRows = (
  values: readonly ValueChange[],
  engines: ReadonlyMap<string, string> = new Map(),
): ValueRow[] =>
  values.map((change) => {
    const named = (text: string | null) =>
      text === null || change.list !== 'head' || change.path !== 'engines'
        ? text
        : text
            .split(', ')
            .map((key) => engines.get(key) ?? key)
            .join(', ');
    const [from, to] = [named(change.from), named(change.to)];
    const value = { ...change, from, to };
    const prose = Math.max(from?.length ?? 0, to?.length ?? 0) > LONGEST_VALUE;
    if (prose && from !== null && to !== null) {
      const runs = compareWords(from, to);
      return { ...value, prose, old: sideLine(runs, 'old'), now: sideLine(runs, 'new') };
    }
    const whole = (text: string | null) => (text === null ? null : [{ text, changed: true }]);
    return { ...value, prose, old: whole(from), now: whole(to) };
  });

/**
 * What an entry of a new sheet says beyond the name and the detail that stand beside it: "skins over in 10 min" of
 * "Silicone sealant, skins over in 10 min". Empty where that was all.
 */
export function beyondName({ label, detail, to }: Pick<ValueChange, 'label' | 'detail' | 'to'>): string {
  const text = to ?? '';
  const said = [`${detail ?? ''}: ${label}; `, `${label}, `, `${label}. `].find((start) => text.startsWith(start));
  const rest = text === label ? '' : text.slice(said?.length ?? 0);
  return rest === detail ? '' : rest;
}

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
