import { type ClampInput, LOW_SHARE, clampCheck } from './clampLoad';
import { convert } from './convert';
import { type Worked, numberProblem, refused, work, worked } from './worked';

/** Torque units that get taken for one another. */
export const MIXED_UNITS = ['N·m', 'lbf·ft', 'lbf·in', 'kgf·m', 'kgf·cm'] as const;
export type MixedUnit = (typeof MIXED_UNITS)[number];

export interface MixUp {
  /** The unit the figure most likely stood in, and the one it was taken for. */
  was: MixedUnit;
  takenFor: MixedUnit;
  /** One sentence for the screen. */
  says: string;
}

const newtonMetres = (unit: MixedUnit): number => {
  const one = convert(1, unit, 'N·m');
  return one.ok ? one.value : NaN;
};

/** The pairs that leave a mark large enough to be told from a change that is meant; both ways of each are looked for. */
const PAIRS: readonly (readonly [MixedUnit, MixedUnit])[] = [
  ['N·m', 'lbf·ft'], // 1.356
  ['lbf·in', 'N·m'], // 8.85
  ['N·m', 'kgf·m'], // 9.81
  ['kgf·cm', 'N·m'], // 10.2
  ['lbf·in', 'lbf·ft'], // 12
];
const BOTH_WAYS = PAIRS.flatMap(([was, takenFor]) => [
  { was, takenFor, factor: newtonMetres(takenFor) / newtonMetres(was) },
  { was: takenFor, takenFor: was, factor: newtonMetres(was) / newtonMetres(takenFor) },
]);

/** How far a change may lie from a factor and still be told as a mix-up: figures get rounded, 7.376 lbf·ft to 7.5. */
export const MIX_UP_TOLERANCE = 0.03;

const figure = (factor: number) => String(Number((factor >= 1 ? factor : 1 / factor).toPrecision(3)));

/**
 * Which unit mix-ups a change of a torque looks like, nearest first; an empty list where it looks like none.
 * A slip of the decimal point, a factor of 10, is told as both of its neighbours, 9.81 and 10.2.
 *
 * @param before @param after in one unit, whichever
 * @param tolerance share by which the change may miss a factor; at most 0.05, so that no change of up to ±20 % is
 *   ever called a mix-up
 * @returns problems name `before`, `after` or `tolerance`. Source: the factors follow from the exact bases of
 *   `convert`; that torques get mixed up so is common practice, no source
 */
export function mixUpsOfChange(before: number, after: number, tolerance = MIX_UP_TOLERANCE): Worked<MixUp[]> {
  const problems = [
    ...numberProblem('before', 'The torque before', before, { above: 0 }),
    ...numberProblem('after', 'The torque after', after, { above: 0 }),
    ...numberProblem('tolerance', 'The tolerance', tolerance, { least: 0, most: 0.05 }),
  ];
  const ratio = after / before;
  if (problems.length === 0 && !(ratio > 0 && Number.isFinite(ratio)))
    return refused({ field: 'after', message: 'These values are too large or too small to work with.' });
  return work(problems, 'after', () =>
    BOTH_WAYS.map(({ was, takenFor, factor }) => ({ was, takenFor, factor, miss: Math.abs(ratio / factor - 1) }))
      .filter(({ miss }) => miss <= tolerance * (1 + 1e-9))
      .sort((a, b) => a.miss - b.miss)
      .map(({ was, takenFor, factor }) => ({
        was,
        takenFor,
        says: `The torque ${factor > 1 ? 'rose' : 'fell'} by a factor near ${figure(factor)}, as if a figure in ${was} had been taken for ${takenFor}.`,
      })),
  );
}

/** Below this share of proof a torque is far too low for any clamping joint. Common practice, no source. */
export const FAR_TOO_LOW = 0.1;
/** Up to this share of proof a torque is sensible: Shigley aims at 0.75 for joints opened again, 0.9 for permanent ones. */
const SENSIBLE_UP_TO = 0.9;

const READ_AS: readonly MixedUnit[] = ['N·m', 'lbf·ft', 'lbf·in', 'kgf·m'];

/**
 * Whether a torque that cannot be right for its fastener would be sensible in another unit: over proof, or
 * below a tenth of it, and between 30 and 90 % once its figure is read in that unit. Null where the torque is
 * plausible, where no other unit makes it so, or where the clamp check cannot tell.
 *
 * @param input as for `clampCheck`, torque in N·m; `enteredIn` is the unit its figure was typed in, N·m where left out
 * @returns the unit whose reading comes nearest to 75 % of proof; problems as `clampCheck` names them
 */
export function mixUpOfSize({
  enteredIn = 'N·m',
  ...input
}: ClampInput & { enteredIn?: MixedUnit }): Worked<MixUp | null> {
  if (!MIXED_UNITS.includes(enteredIn))
    return refused({ field: 'enteredIn', message: `The unit must be one of ${MIXED_UNITS.join(', ')}.` });
  const check = clampCheck(input);
  if (!check.ok) return check;
  const { share, about } = check.value;
  // A snug torque is low on purpose; only one that is over proof by itself is suspect.
  if (share === null || (share <= 1 && (share >= FAR_TOO_LOW || about === 'snug torque'))) return worked(null);

  const sensible = READ_AS.filter((unit) => unit !== enteredIn)
    .map((unit) => ({ unit, share: (share * newtonMetres(unit)) / newtonMetres(enteredIn) }))
    .filter((read) => read.share >= LOW_SHARE && read.share <= SENSIBLE_UP_TO)
    .sort((a, b) => Math.abs(a.share - 0.75) - Math.abs(b.share - 0.75))[0];
  if (!sensible) return worked(null);
  const was = sensible.unit;
  const says = `The torque is ${share > 1 ? 'over the proof load' : 'far too low'} for this fastener, but the same figure in ${was} would be sensible; it was entered in ${enteredIn}.`;
  return worked({ was, takenFor: enteredIn, says });
}
