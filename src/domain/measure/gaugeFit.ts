import { type Worked, numberProblem, work } from './worked';

/** Tolerance to tool, at best and at least. */
export const IDEAL_RATIO = 10;
export const LEAST_RATIO = 4;

/** Said with every ratio, because sources differ. */
export const WHOLE_BAND = 'The ratio uses the whole tolerance band, from least to most; some sources take half of it.';

/** Ratios that miss a bound by less than this only through binary fractions count as reaching it. */
const SLIP = 1e-9;

export interface GaugeFit {
  /** Band over resolution: 10 is 10:1. */
  ratio: number;
  verdict: 'ideal' | 'enough' | 'too coarse';
  /** One sentence for the screen; it says what the ratio was taken of. */
  why: string;
}

/**
 * Whether a tool is fine enough for a tolerance: 10:1 is what to aim at, 4:1 the least.
 *
 * @param band whole width of the tolerance, most less least, in any unit
 * @param tool resolution of the tool, or its uncertainty where that is known and larger; in the same unit
 * @returns problems name `band` or `tool`, which must be more than zero
 *
 * Source: National Physical Laboratory, FAQ on ISO 14253-1, and MIL-M-45945A §4 (10:1); MIL-STD-1839 ¶5.4.3 as
 * quoted in MIL-HDBK-1839 (4:1).
 */
export function gaugeFit(band: number, tool: number): Worked<GaugeFit> {
  const problems = [
    ...numberProblem('band', 'The tolerance band', band, { above: 0 }),
    ...numberProblem('tool', 'The resolution of the tool', tool, { above: 0 }),
  ];
  return work(problems, 'tool', () => {
    const ratio = band / tool;
    const reaches = (bound: number) => ratio >= bound * (1 - SLIP);
    if (reaches(IDEAL_RATIO))
      return { ratio, verdict: 'ideal', why: `Ten or more steps of the tool fit into the tolerance. ${WHOLE_BAND}` };
    if (reaches(LEAST_RATIO))
      return {
        ratio,
        verdict: 'enough',
        why: `Four or more steps of the tool fit into the tolerance, but not ten. ${WHOLE_BAND}`,
      };
    return {
      ratio,
      verdict: 'too coarse',
      why: `Fewer than four steps of the tool fit into the tolerance; a reading near a limit is a guess. ${WHOLE_BAND}`,
    };
  });
}

export interface UsualGauge {
  /** In m. */
  resolution: number;
  /** As it is marked on the tool: "0.01 mm". */
  text: string;
}

const gauges = (unit: 'mm' | 'in', metres: number, texts: readonly string[]): UsualGauge[] =>
  texts.map((text) => ({ resolution: Number(text) * metres, text: `${text} ${unit}` }));

/** Resolutions that length tools are sold in, coarsest first. Common practice, no source. */
const USUAL: Readonly<Record<'mm' | 'in', UsualGauge[]>> = {
  mm: gauges('mm', 1e-3, ['1', '0.5', '0.1', '0.05', '0.02', '0.01', '0.005', '0.002', '0.001', '0.0005', '0.0001']),
  in: gauges('in', 0.0254, ['0.01', '0.005', '0.001', '0.0005', '0.0001', '0.00005', '0.00001']),
};

export interface GaugeChoice {
  /** The coarsest usual tool that gives 10:1; null where none is fine enough. */
  ideal: UsualGauge | null;
  /** The coarsest that gives 4:1. */
  least: UsualGauge | null;
}

/**
 * Which tool to reach for: the coarsest usual resolution that gives 10:1, and the coarsest that gives 4:1.
 *
 * @param band whole width of a length tolerance, in m
 * @param marked in which unit the tools are marked
 * @returns problems name `band` or `marked`
 */
export function gaugeFor(band: number, marked: 'mm' | 'in'): Worked<GaugeChoice> {
  const problems = [
    ...numberProblem('band', 'The tolerance band', band, { above: 0 }),
    ...(Object.hasOwn(USUAL, marked) ? [] : [{ field: 'marked', message: 'The tools must be marked in mm or in.' }]),
  ];
  const coarsest = (ratio: number) =>
    USUAL[marked].find(({ resolution }) => band / resolution >= ratio * (1 - SLIP)) ?? null;
  return work(problems, 'band', () => ({ ideal: coarsest(IDEAL_RATIO), least: coarsest(LEAST_RATIO) }));
}
