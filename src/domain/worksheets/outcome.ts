import type { Unit } from '../measure/convert';
import type { BothUnits } from '../measure/format';
import type { Chart } from './charts';

/**
 * What a worksheet says. `pass` and `fail` are judged against a limit; `look` is worth a second look (a rule of thumb
 * missed, a reading that may be a slip); `none` is worked out without anything to judge it by.
 */
export const VERDICTS = ['pass', 'look', 'fail', 'none'] as const;
export type Verdict = (typeof VERDICTS)[number];

export const VERDICT_WORDS: Readonly<Record<Verdict, string>> = {
  pass: 'In limits',
  look: 'Look again',
  fail: 'Out of limits',
  none: 'Worked out',
};

export interface Result {
  /** Name in the API: `clearance`, `injector-2-deviation`. */
  key: string;
  label: string;
  /** In `unit`, not rounded; null where it is no number. */
  value: number | null;
  unit: Unit | null;
  /** As it is shown, rounded to what a tool can show. */
  text: BothUnits;
  verdict?: Verdict;
  /** The formula with the numbers in it: "T = K · d · F = 0.20 · 12 mm · 34.2 kN = 82 N·m". */
  formula?: BothUnits;
  /** Where the formula or the figures in it come from. */
  source?: string;
  /** The answer that people came for; shown largest. */
  main?: boolean;
}

export interface Outcome {
  verdict: Verdict;
  /** Why, each a sentence; the first is the one that decides. Never empty where the verdict is pass, look or fail. */
  reasons: BothUnits[];
  results: Result[];
  charts: Chart[];
}

const WORST: readonly Verdict[] = ['none', 'pass', 'look', 'fail'];

/** The gravest of several verdicts; `none` where there are none. */
export const worst = (verdicts: readonly (Verdict | undefined)[]): Verdict =>
  verdicts.reduce<Verdict>((found, one) => (one && WORST.indexOf(one) > WORST.indexOf(found) ? one : found), 'none');
