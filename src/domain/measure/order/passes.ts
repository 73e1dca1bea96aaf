import { type Worked, numberProblem, work } from '../worked';

/**
 * Shares of the final torque, pass by pass. 'flange': 30, 60, 100 %, then one pass round in order, quoted in secondary
 * works. 'two': 70 and 100 % above 30 lbf·ft (41 N·m), US Army TB 9-3950-253-13&P WP 0061, seen.
 */
export const PASS_SHARES = { flange: [0.3, 0.6, 1], two: [0.7, 1] } as const;

export interface Pass {
  share: number;
  /** In N·m. */
  torque: number;
}

/**
 * The torque of each pass over the bolts.
 *
 * @param final torque in N·m
 * @param shares of it, rising, the last one 1
 * @returns problems name `final`, `shares` or `shares.n`
 */
export function passTorques(final: number, shares: readonly number[] = PASS_SHARES.flange): Worked<Pass[]> {
  const list = Array.isArray(shares) ? shares : [];
  const rising = list.flatMap((share, i) => {
    const problems = numberProblem(`shares.${i}`, `Pass ${i + 1}`, share, {
      above: 0,
      most: 1,
      say: (v) => `${v * 100} %`,
    });
    const isRising = i === 0 || share > (list[i - 1] ?? 0);
    return problems.length > 0 || isRising
      ? problems
      : [{ field: `shares.${i}`, message: `Pass ${i + 1} must be more than the one before it.` }];
  });
  const problems = [
    ...numberProblem('final', 'The final torque', final, { above: 0 }),
    ...rising,
    ...(rising.length === 0 && list.at(-1) !== 1
      ? [{ field: 'shares', message: 'The last pass must be the whole torque, 100 %.' }]
      : []),
  ];
  return work(problems, 'final', () => list.map((share) => ({ share, torque: final * share })));
}
