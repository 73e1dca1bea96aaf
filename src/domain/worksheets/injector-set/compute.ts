import type { InjectorSetFound } from '../../measure/injectors';
import type { Worked } from '../../measure/worked';
import { said } from '../../measure/said';
import type { BarsChart } from '../charts';
import { measured, outcomeOf, verdictOf } from '../findings';
import type { Outcome, Result } from '../outcome';
import { judgeSet, type Inputs, type JudgedBy } from './judge';
import { powerResults } from './power';
import { findingsOf, FINE, flowOf, percentOf, shareFine } from './words';

const RUNS = [
  { run: 'before', words: 'before cleaning' },
  { run: 'after', words: 'after cleaning' },
] as const;

/** Judges a set as a set; see `measure/injectors.ts` and `injectorFlow.ts`. */
export function compute(inputs: Inputs): Worked<Outcome> {
  const judged = judgeSet(inputs);
  if (!judged.ok) return judged;
  const { found, by } = judged.value;
  const power = powerResults(inputs, found[found.judgedRun]?.mean ?? 0);
  if (!power.ok) return power;
  return outcomeOf(findingsOf(inputs, found, by), [...resultsOf(found), ...power.value], [chartOf(inputs, found, by)]);
}

function resultsOf(found: InjectorSetFound): Result[] {
  const spreads = RUNS.flatMap(({ run, words }) => {
    const set = found[run];
    if (!set) return [];
    const isJudged = run === found.judgedRun;
    const flows = found.injectors.flatMap((one) => one[run]?.flow ?? []);
    const [low, high] = [flows[set.lowest] ?? 0, flows[set.highest] ?? 0];
    return [
      measured(`spread-${run}`, `Spread of the set, ${words}`, set.spreadPercent, '%', 0.1, {
        formula: said`(highest − lowest) / mean = (${flowOf(high)} − ${flowOf(low)}) / ${flowOf(set.mean)} = ${percentOf(set.spreadPercent)}`,
        source: 'Spread and what it may be: common practice, no published source.',
        ...(isJudged && { verdict: verdictOf(found.spread), main: true }),
      }),
      measured(`mean-${run}`, `Mean flow, ${words}`, set.mean, 'cc/min', FINE),
    ];
  });
  const each = found.injectors.flatMap((one, place) =>
    RUNS.flatMap(({ run, words }) => {
      const flow = one[run];
      if (!flow) return [];
      const key = `deviation-${place + 1}-${run}`;
      return measured(key, `Injector ${place + 1}, from nominal, ${words}`, flow.deviationPercent, '%', 0.1, {
        // Readings before cleaning are on record; once there is a run after, only that is judged.
        verdict: run === found.judgedRun ? (one.passes ? 'pass' : 'fail') : undefined,
      });
    }),
  );
  return [
    ...spreads,
    ...each,
    measured('share', 'Share of the power, each', found.sharePercent, '%', shareFine(found.sharePercent)),
  ];
}

function chartOf({ injectors, nominal }: Inputs, found: InjectorSetFound, by: JudgedBy): BarsChart {
  const runs = RUNS.filter(({ run }) => found[run] !== null);
  return {
    kind: 'bars',
    title:
      runs.length > 1 ? 'Flow before and after cleaning, by injector' : `Flow ${runs[0]?.words ?? ''}, by injector`,
    unit: 'cc/min',
    fineness: FINE,
    items: injectors.map((_, place) => String(place + 1)),
    series: runs.map(({ run }) => ({
      label: run === 'before' ? 'Before' : 'After',
      values: injectors.map((one) => one[run] ?? null),
    })),
    band: by.flow,
    nominal,
  };
}
