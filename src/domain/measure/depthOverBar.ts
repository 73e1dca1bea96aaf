import { optionalBandProblems, placeInIfAny, type Band, type Judged } from './band';
import { OFFSET, SIZE } from './reach';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

/**
 * What the gauge reads from.
 *
 * - `bar-top`: it stands on the bar, so that the reading runs through the bar: the bar comes off.
 * - `face`: the bar has no part in the reading, because the gauge was zeroed standing on the bar over a flat plate,
 *   or because it was measured from the underside of the bar: nothing comes off.
 */
export type ReadFrom = 'bar-top' | 'face';

export interface BarReading {
  /** What the gauge shows, m; only a zeroed gauge can show less than zero. */
  reading: number;
  /** Thickness of the bar, m; asked for in both cases, so that it is on record. */
  bar: number;
  readFrom: ReadFrom;
  /**
   * What the gauge shows on its master where it should show zero, m. It comes off; one that shows −0.02 mm adds 0.02 mm.
   */
  zeroOffset?: number;
}

export interface DepthOverBar extends BarReading {
  /**
   * Which way the wanted distance is counted from the face. `below`: oil under a flange, a recessed valve. `above`: a
   * piston or a liner standing proud; there the bar counts with a plus: above = bar − reading.
   */
  direction: 'below' | 'above';
  /** Limit of the wanted distance, counted in `direction`. */
  band?: Band;
}

export interface DepthFound {
  /** The true distance in `direction`, m; negative where the part lies on the other side of the face. */
  distance: number;
  /** The same, always counted downward from the face. */
  below: number;
  judged: Judged | null;
  /** What the classic mistake would answer: the bar left in, or taken off a reading that does not hold it. */
  mistaken: { distance: number; judged: Judged | null };
  /** The mistake would pass where the truth does not: say so before anybody signs. */
  onlyMistakePasses: boolean;
}

const SENSES = { below: 1, above: -1 } as const;

function readingProblems({ reading, bar, readFrom, zeroOffset }: BarReading, at = ''): FieldProblem[] {
  if (readFrom !== 'bar-top' && readFrom !== 'face')
    return [
      { field: `${at}readFrom`, message: 'Say whether the gauge reads from the top of the bar or from the face.' },
    ];
  return [
    ...numberProblem(`${at}bar`, 'The thickness of the bar', bar, SIZE),
    ...numberProblem(`${at}reading`, 'The reading', reading, readFrom === 'face' ? OFFSET : { ...OFFSET, least: 0 }),
    ...(zeroOffset === undefined
      ? []
      : numberProblem(`${at}zeroOffset`, 'The zero offset of the gauge', zeroOffset, OFFSET)),
  ];
}

/** Distance below the face, and the same with the bar treated the wrong way round. */
function belowFace({ reading, bar, readFrom, zeroOffset = 0 }: BarReading): { below: number; mistaken: number } {
  const without = reading - zeroOffset;
  return readFrom === 'bar-top'
    ? { below: without - bar, mistaken: without }
    : { below: without, mistaken: without - bar };
}

function foundOf(distance: number, mistakenDistance: number, band: Band | undefined, size: number) {
  const judged = placeInIfAny(distance, band, size);
  const mistaken = { distance: mistakenDistance, judged: placeInIfAny(mistakenDistance, band, size) };
  return { distance, judged, mistaken, onlyMistakePasses: mistaken.judged?.at === 'in' && judged?.at !== 'in' };
}

/**
 * The true distance of a part from a face, read with a depth gauge over a bar laid across it:
 * `below = reading − zero offset − bar` from the top of the bar, `reading − zero offset` from the face; `above` is the
 * same with the sign turned. Geometry; no source found. A bar of 25.4 mm that is forgotten makes the part look exactly
 * 25.4 mm deeper than it is, so the answer of the mistake is handed back too.
 *
 * Errors name `reading`, `bar`, `readFrom`, `zeroOffset`, `direction` or `band`.
 */
export function depthOverBar(input: DepthOverBar): Worked<DepthFound> {
  const { direction, band, ...gauge } = input;
  const sense = Object.hasOwn(SENSES, direction) ? SENSES[direction] : undefined;
  const problems = [
    ...(sense ? [] : [{ field: 'direction', message: 'Say whether the distance is counted below or above the face.' }]),
    ...readingProblems(gauge),
    ...optionalBandProblems('band', 'The distance allowed', band, OFFSET),
  ];
  return work(problems, 'reading', () => {
    const { below, mistaken } = belowFace(gauge);
    // "+ 0" so that a part flush with the face is 0 and never −0.
    const along = (distance: number) => (sense ?? 1) * distance + 0;
    const size = Math.max(Math.abs(gauge.reading), gauge.bar);
    return { ...foundOf(along(below), along(mistaken), band, size), below: below + 0 };
  });
}

export interface AcrossJoint {
  /** One reading down from each of two faces that meet when the joint is closed. */
  first: BarReading;
  second: BarReading;
  band?: Band;
}

export interface AcrossJointFound {
  /** First and second depth below their faces, m. */
  depths: [number, number];
  /** Their sum: what lies between the two parts when the joint is closed, m. */
  distance: number;
  judged: Judged | null;
  /** The sums that come of getting one bar or both of them wrong. */
  mistaken: { distance: number; judged: Judged | null }[];
  onlyMistakePasses: boolean;
}

/**
 * What lies between two parts that face each other over a joint, such as oil and the lowest rod: the two true depths
 * added. Two readings, so two bars. A gasket between the faces is not counted; it only adds.
 *
 * Errors name `first.<name>`, `second.<name>` or `band`.
 */
export function depthAcrossJoint({ first, second, band }: AcrossJoint): Worked<AcrossJointFound> {
  const problems = [
    ...readingProblems(first, 'first.'),
    ...readingProblems(second, 'second.'),
    ...optionalBandProblems('band', 'The distance allowed', band, OFFSET),
  ];
  return work(problems, 'first.reading', () => {
    const a = belowFace(first);
    const b = belowFace(second);
    const size = Math.max(Math.abs(first.reading), first.bar, Math.abs(second.reading), second.bar);
    const judgeSum = (distance: number) => ({ distance, judged: placeInIfAny(distance, band, size) });
    const truth = judgeSum(a.below + b.below);
    const mistaken = [a.mistaken + b.below, a.below + b.mistaken, a.mistaken + b.mistaken].map(judgeSum);
    const mistakePasses = mistaken.some((one) => one.judged?.at === 'in');
    return {
      depths: [a.below, b.below] as [number, number],
      ...truth,
      mistaken,
      onlyMistakePasses: mistakePasses && truth.judged?.at !== 'in',
    };
  });
}
