import { type ProofLoad, proofLoad } from './fasteners';
import { formatNumber } from './format';
import { type Condition, NUT_FACTORS, type NutFactor } from './nutFactor';
import { NO_CLAMP_IN_PIPE, readThread, type ThreadRead } from './threads';
import { type FieldProblem, type Worked, numberProblem, refused, work } from './worked';

const positive = (field: string, called: string, value: unknown) => numberProblem(field, called, value, { above: 0 });

/**
 * Clamp load in N that a torque in N·m gives a thread of `diameter` in m: F = T/(K·d).
 * Source: Shigley's Mechanical Engineering Design, equation 8-27. Refuses what is not more than zero.
 */
export function clampLoadOf(torque: number, diameter: number, k: number): Worked<number> {
  const problems = [
    ...positive('torque', 'The torque', torque),
    ...positive('diameter', 'The diameter', diameter),
    ...positive('k', 'The nut factor', k),
  ];
  return work(problems, 'torque', () => torque / (k * diameter));
}

/** Torque in N·m that gives a clamp load in N: T = K·d·F; the other way round of `clampLoadOf`. */
export function torqueFor(clampLoad: number, diameter: number, k: number): Worked<number> {
  const problems = [
    ...positive('clampLoad', 'The clamp load', clampLoad),
    ...positive('diameter', 'The diameter', diameter),
    ...positive('k', 'The nut factor', k),
  ];
  return work(problems, 'clampLoad', () => k * diameter * clampLoad);
}

/** A torque as a sheet keeps it. */
export interface ClampInput {
  /** In N·m; before `angles`, where there are any. */
  nm: number;
  thread: string;
  /** Of a metric thread, in mm. */
  pitch?: number;
  class?: string;
  condition: Condition;
  /** Turns after the torque, in degrees. */
  angles?: readonly number[];
}

export interface ClampCheck {
  /** 'unknown' where nothing can be said: no class, a pipe thread, a joint that is finished by angle. */
  verdict: 'over' | 'low' | 'ok' | 'unknown';
  /** One sentence on the verdict, for the screen. */
  why: string;
  /** What the numbers are about: the whole of the tightening, or only the torque before the angles. */
  about: 'final torque' | 'snug torque';
  /** As it was read. */
  thread: ThreadRead;
  nutFactor: NutFactor | null;
  /** In N. Null for a pipe thread. */
  clampLoad: number | null;
  /** Proof load in N with the stress and area it comes from. Null where the class is not known. */
  proof: ProofLoad | null;
  /** Clamp load as a share of proof load: 0.75 is 75 %. */
  share: number | null;
}

/** Below this share of proof a joint is called low. Common practice, no source; soft gaskets clamp at a third. */
export const LOW_SHARE = 0.3;

const perCent = (share: number) => `${formatNumber(share * 100, share < 0.1 ? 1 : 0)} %`;

function judge(share: number, about: ClampCheck['about'], low: number): Pick<ClampCheck, 'verdict' | 'why'> {
  const reached = `The ${about} clamps to ${perCent(share)} of proof load`;
  if (share > 1) return { verdict: 'over', why: `${reached}: the bolt would stay longer, or break.` };
  if (about === 'snug torque')
    return {
      verdict: 'unknown',
      why: `${reached}; the angle then takes the bolt into yield on purpose, where T = K·d·F says nothing.`,
    };
  if (share < low) return { verdict: 'low', why: `${reached}, less than the ${perCent(low)} that is usual.` };
  return { verdict: 'ok', why: `${reached}.` };
}

/** The inputs that no number can be worked out without. */
function problemsOf({ nm, condition, angles = [] }: ClampInput, low: number): FieldProblem[] {
  return [
    ...positive('nm', 'The torque', nm),
    ...(Object.hasOwn(NUT_FACTORS, condition)
      ? []
      : [{ field: 'condition', message: `The condition must be one of ${Object.keys(NUT_FACTORS).join(', ')}.` }]),
    ...angles.flatMap((angle, i) => positive(`angles.${i}`, `Angle ${i + 1}`, angle)),
    ...numberProblem('low', 'The share that counts as low', low, { least: 0, most: 1 }),
  ];
}

/**
 * Whether a torque is plausible for its fastener: the clamp load by T = K·d·F against the proof load S_p·A_s.
 * A plausibility check within the scatter of K, never a torque to work to.
 *
 * @param low share of proof below which the verdict is 'low'
 * @returns loads in N; a number that cannot be given is null and `why` says so. Problems name `nm`, `thread`,
 *   `pitch`, `condition`, `angles.n` or `low`; a class that is not known is no problem but the verdict 'unknown'
 *
 * Source: Shigley, equation 8-27; ISO 898-1; SAE J429; the nut factors name their own.
 */
export function clampCheck(input: ClampInput, low = LOW_SHARE): Worked<ClampCheck> {
  const thread = readThread(input.thread, input.pitch);
  const problems = [...problemsOf(input, low), ...(thread.ok ? [] : thread.problems)];
  if (!thread.ok || problems.length > 0) return refused(...problems);
  const about = input.angles?.length ? 'snug torque' : 'final torque';
  const nothing = {
    verdict: 'unknown',
    about,
    thread: thread.value,
    nutFactor: null,
    clampLoad: null,
    proof: null,
    share: null,
  } as const;
  if (thread.value.kind === 'pipe') return work([], 'nm', () => ({ ...nothing, why: NO_CLAMP_IN_PIPE }));

  const nutFactor = NUT_FACTORS[input.condition];
  const load = clampLoadOf(input.nm, thread.value.diameter, nutFactor.k);
  if (!load.ok) return refused({ field: 'nm', message: load.problems[0]?.message ?? '' });
  const proof = proofLoad(thread.value, input.class ?? '');
  const clampLoad = load.value;
  if (!proof.ok) {
    const why = `${proof.problems[0]?.message ?? ''} Without a proof load, the clamp load cannot be judged.`;
    return work([], 'nm', () => ({ ...nothing, nutFactor, clampLoad, why }));
  }
  const share = clampLoad / proof.value.load;
  return work([], 'nm', () => ({
    about,
    thread: thread.value,
    nutFactor,
    clampLoad,
    proof: proof.value,
    share,
    ...judge(share, about, low),
  }));
}
