import {
  bandProblems,
  nothingFails,
  optionalBandProblems,
  placeIn,
  placeInIfAny,
  type Band,
  type Judged,
} from './band';
import { FLOW, TOLERANCE_PERCENT } from './reach';
import { countProblem, largestOf, meanOf, rangeOf, smallestOf } from './readings';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

/** What is seen when an injector pulses: a mist all round, heavier to one side, solid streams, or nothing. */
export const SPRAYS = ['even', 'one-sided', 'streams', 'none'] as const;
export type Spray = (typeof SPRAYS)[number];

export interface Injector {
  /** Flow as it came out, m³/s, held open. */
  before?: number;
  /** Flow after cleaning, or that of the injector that took its place, m³/s, in the same conditions. */
  after?: number;
  /** Drops counted while it was held shut under pressure. */
  drops?: number;
  spray?: Spray;
}

export interface InjectorLimits {
  /** What each one must flow, m³/s; `bandAround(nominal, 3)` for a tolerance in per cent. */
  flow: Band;
  /** Spread of the set, in per cent of its mean. */
  spread?: Band;
  /** Drops in the hold; needed where drops were counted. */
  drops?: Band;
}

export interface InjectorSet {
  /** Flow of a good injector of this number at the pressure of the test, m³/s. */
  nominal: number;
  /** In the order of the cylinders. All have a flow before, or none; and so for after. */
  injectors: readonly Injector[];
  /** The shop's or the maker's; there is no published tolerance that would do for every set. */
  limits: InjectorLimits;
}

export type InjectorFault = 'flows too little' | 'flows too much' | 'drips' | 'sprays badly';

export interface FlowFound {
  flow: number;
  /** From nominal, in per cent; negative where it flows less. */
  deviationPercent: number;
  judged: Judged;
}

/** One run of the whole set on the bench. */
export interface SetRun {
  mean: number;
  /** (highest − lowest) / mean, in per cent; 0 where nothing flows at all. */
  spreadPercent: number;
  /** Places of the lowest and the highest in the list, from 0. */
  lowest: number;
  highest: number;
}

export interface InjectorSetFound {
  /** The run that the verdict is about: after cleaning where there is one. */
  judgedRun: 'before' | 'after';
  /** What each cylinder answers for, in per cent. */
  sharePercent: number;
  injectors: { before: FlowFound | null; after: FlowFound | null; faults: InjectorFault[]; passes: boolean }[];
  before: SetRun | null;
  after: SetRun | null;
  /** The spread of the judged run in per cent; null where no limit was given. */
  spread: Judged | null;
  /** Every injector passes and the spread is in. */
  passes: boolean;
  /** Why not: each fault with the places (from 0) of those that have it; the spread with the lowest and the highest. */
  reasons: { fault: InjectorFault | 'spread too wide'; injectors: number[] }[];
}

type RunName = 'before' | 'after';
/** Counted through a minute or so; a number beyond is a stream. */
const DROPS = { least: 0, most: 1e6 };
const FAULTS: readonly InjectorFault[] = ['flows too little', 'flows too much', 'drips', 'sprays badly'];

/** All of a run or none of it: a spread over three of four would flatter the set. */
function runProblems(injectors: readonly Injector[], run: RunName): FieldProblem[] {
  const inWords = run === 'before' ? 'before cleaning' : 'after cleaning';
  if (injectors.every((one) => one?.[run] === undefined)) return [];
  return injectors.flatMap((one, place) => {
    const field = `injectors.${place}.${run}`;
    if (one?.[run] === undefined)
      return [{ field, message: `Injector ${place + 1} has no flow ${inWords}, and others have.` }];
    return numberProblem(field, `The flow of injector ${place + 1} ${inWords}`, one[run], FLOW);
  });
}

function findingProblems(injectors: readonly Injector[], limits: InjectorLimits): FieldProblem[] {
  const counted = injectors.some((one) => one?.drops !== undefined);
  const problems = injectors.flatMap((one, place) => [
    ...(one?.drops === undefined
      ? []
      : numberProblem(`injectors.${place}.drops`, `The drops of injector ${place + 1}`, one.drops, DROPS)),
    ...(one?.spray === undefined || SPRAYS.includes(one.spray)
      ? []
      : [
          { field: `injectors.${place}.spray`, message: `The spray of injector ${place + 1} must be one of the list.` },
        ]),
  ]);
  if (counted && limits?.drops === undefined)
    problems.push({ field: 'limits.drops', message: 'Drops were counted; say how many are allowed.' });
  return [...problems, ...optionalBandProblems('limits.drops', 'The drops allowed', limits?.drops, DROPS)];
}

function problemsOf({ nominal, injectors, limits }: InjectorSet): FieldProblem[] {
  const count = countProblem('injectors', { list: 'The set', one: 'Injector' }, injectors, { atMost: 64 });
  if (count.length > 0) return count;
  const set = Array.from(injectors);
  const neither = set.every((one) => one?.before === undefined && one?.after === undefined);
  return [
    ...numberProblem('nominal', 'The nominal flow', nominal, { ...FLOW, above: 0 }),
    ...(neither ? [{ field: 'injectors', message: 'The set needs a flow for each injector, before or after.' }] : []),
    ...runProblems(set, 'before'),
    ...runProblems(set, 'after'),
    ...findingProblems(set, limits),
    ...bandProblems('limits.flow', 'The flow allowed', limits?.flow, FLOW),
    ...optionalBandProblems('limits.spread', 'The spread allowed', limits?.spread, TOLERANCE_PERCENT),
  ];
}

function runOf(flows: readonly number[]): SetRun {
  const mean = meanOf(flows);
  return {
    mean,
    spreadPercent: mean === 0 ? 0 : (100 * rangeOf(flows)) / mean,
    lowest: flows.indexOf(smallestOf(flows)),
    highest: flows.indexOf(largestOf(flows)),
  };
}

/**
 * Judges a set of injectors as a set: each flow against its limits, the leak and the spray, and the spread, which is
 * what the engine feels. An even spray passes, any other does not (common practice, no source). The verdict is on the
 * run after cleaning where there is one; before it, a set as it came out is judged by the same limits.
 *
 * Errors name `nominal`, `injectors`, `injectors.<place>.<before|after|drops|spray>` or `limits.<name>`.
 */
export const judgeInjectors = (set: InjectorSet): Worked<InjectorSetFound> =>
  work(problemsOf(set), 'injectors', () => found(set));

function found({ nominal, injectors, limits }: InjectorSet): InjectorSetFound {
  const flowFound = (flow: number | undefined): FlowFound | null =>
    flow === undefined
      ? null
      : { flow, deviationPercent: (100 * (flow - nominal)) / nominal, judged: placeIn(flow, limits.flow) };
  const run = (name: RunName) => {
    const flows = injectors.flatMap((one) => one[name] ?? []);
    return flows.length === 0 ? null : runOf(flows);
  };
  const before = run('before');
  const after = run('after');
  const judgedRun = after === null ? 'before' : 'after';

  const each = injectors.map((one) => {
    const flows = { before: flowFound(one.before), after: flowFound(one.after) };
    const at = flows[judgedRun]?.judged.at;
    const has: Record<InjectorFault, boolean> = {
      'flows too little': at === 'under',
      'flows too much': at === 'over',
      drips: one.drops !== undefined && !nothingFails([placeInIfAny(one.drops, limits.drops)]),
      'sprays badly': one.spray !== undefined && one.spray !== 'even',
    };
    const faults = FAULTS.filter((fault) => has[fault]);
    return { ...flows, faults, passes: faults.length === 0 };
  });

  const judged = after ?? before;
  const spread = placeInIfAny(judged?.spreadPercent ?? 0, limits.spread, 100);
  const reasons: InjectorSetFound['reasons'] = FAULTS.map((fault) => ({
    fault,
    injectors: each.flatMap((one, place) => (one.faults.includes(fault) ? [place] : [])),
  })).filter((reason) => reason.injectors.length > 0);
  if (judged && !nothingFails([spread]))
    reasons.push({ fault: 'spread too wide', injectors: [judged.lowest, judged.highest] });

  return {
    judgedRun,
    sharePercent: 100 / injectors.length,
    injectors: each,
    before,
    after,
    spread,
    passes: reasons.length === 0,
    reasons,
  };
}
