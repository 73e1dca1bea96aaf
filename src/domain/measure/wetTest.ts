import { sameWithin } from './band';
import { PRESSURE } from './reach';
import { countProblem, listProblems } from './readings';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

export interface WetTest {
  /** Dry readings of all cylinders, Pa gauge. */
  dry: readonly number[];
  /** With oil on the rings; null for a cylinder that was not repeated. */
  wet: readonly (number | null)[];
  /** From how much of a rise over the dry reading the rings are blamed, per cent. Common practice, no published number. */
  risePercent: number;
  /** Pairs of cylinders that share a piece of gasket, by their places from 0. */
  neighbours?: readonly (readonly [number, number])[];
}

export type Leak = 'rings' | 'valves or gasket';

export interface WetFound {
  cylinders: {
    /** Wet less dry, Pa; null where it was not repeated. */
    rise: number | null;
    /** Of the dry reading, per cent; null where there is no wet one, or the dry one was nothing. */
    risePercent: number | null;
    pointsAt: Leak | null;
  }[];
  /** Neighbours of which neither rose: the gasket between them, until shown otherwise. */
  gasketBetween: [number, number][];
}

function wetProblems({ dry, wet, risePercent, neighbours = [] }: WetTest): FieldProblem[] {
  const problems = listProblems('dry', { list: 'The dry readings', one: 'Dry reading' }, dry, PRESSURE, { atMost: 64 });
  if (!Array.isArray(wet) || (problems.length === 0 && wet.length !== dry.length))
    problems.push({ field: 'wet', message: 'There must be a place for a wet reading for each dry one.' });
  else
    problems.push(
      ...Array.from(wet as readonly (number | null)[]).flatMap((value, place) =>
        value === null ? [] : numberProblem(`wet.${place}`, `Wet reading ${place + 1}`, value, PRESSURE),
      ),
    );
  problems.push(
    ...numberProblem('risePercent', 'The rise that tells', risePercent, {
      above: 0,
      most: 1000,
      say: (bound) => `${bound} %`,
    }),
  );
  problems.push(...pairProblems(neighbours, dry));
  return problems;
}

function pairProblems(pairs: readonly (readonly [number, number])[], dry: readonly number[]): FieldProblem[] {
  const count = countProblem('neighbours', { list: 'The neighbours', one: 'Pair' }, pairs, { atLeast: 0, atMost: 64 });
  if (count.length > 0) return count;
  const known = (pair: readonly number[]) =>
    Array.isArray(pair) &&
    pair.length === 2 &&
    pair[0] !== pair[1] &&
    pair.every((one: number) => Number.isInteger(one) && one >= 0 && one < dry.length);
  return Array.from(pairs).flatMap((pair, place) =>
    known(pair) ? [] : [{ field: `neighbours.${place}`, message: `Pair ${place + 1} must name two cylinders.` }],
  );
}

/**
 * What a repeat with oil on the rings says: a clear rise is the rings, because oil seals them for a moment; no rise is a
 * valve or the gasket. It tells little on an engine with dished or flat-lying pistons. Common practice, no source.
 *
 * Errors name `dry.<place>`, `wet.<place>`, the list whose length does not match, `risePercent` or `neighbours.<place>`.
 */
export const wetTest = (test: WetTest): Worked<WetFound> => work(wetProblems(test), 'dry', () => found(test));

function found({ dry, wet, risePercent, neighbours = [] }: WetTest): WetFound {
  const cylinders = dry.map((before, place) => {
    const after = wet[place] ?? null;
    if (after === null) return { rise: null, risePercent: null, pointsAt: null };
    const rise = after - before;
    const needed = (before * risePercent) / 100;
    const clear = rise > 0 && (rise >= needed || sameWithin(rise, needed, after));
    return {
      rise,
      risePercent: before === 0 ? null : (100 * rise) / before,
      pointsAt: clear ? ('rings' as const) : ('valves or gasket' as const),
    };
  });
  const stayed = (place: number) => cylinders[place]?.pointsAt === 'valves or gasket';
  return {
    cylinders,
    gasketBetween: neighbours.filter(([a, b]) => stayed(a) && stayed(b)).map(([a, b]) => [a, b]),
  };
}
