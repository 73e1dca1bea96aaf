import { placeIn } from '../../measure/band';
import type { CompressionFound, CompressionRules } from '../../measure/compression';
import { said } from '../../measure/said';
import { judgedFinding, lookAgain, noted, type Finding } from '../findings';
import { kPa, percent, type Inputs } from './readings';

/** The sheet's share is a limit and goes before the rule of the shop. */
export function rulesOf(inputs: Inputs): CompressionRules {
  const { compression, share, rule, leastShare, mostBelow, mostDifference } = inputs;
  if (share || rule === 'share') return { band: compression, lowestOfHighest: share ?? { min: leastShare } };
  if (rule === 'average') return { band: compression, belowAverage: { max: mostBelow } };
  return { band: compression, difference: { max: mostDifference } };
}

/** Places from 0 of the cylinders that miss a limit or the rule: those that a repeat with oil can say something about. */
export function lowPlaces({ highest, cylinders }: CompressionFound, rules: CompressionRules): number[] {
  const least = rules.lowestOfHighest?.min;
  return cylinders.flatMap(({ reading, judged, average }, place) => {
    const low =
      judged?.at === 'under' ||
      average?.at === 'over' ||
      (least !== undefined && placeIn((100 * reading) / highest, { min: least }).at === 'under') ||
      (rules.difference !== undefined && placeIn(highest - reading, rules.difference, highest).at === 'over');
    return low ? [place] : [];
  });
}

/** How near the cylinders lie to each other: a limit is judged, a rule of thumb that is missed only asks to look again. */
export function comparison(inputs: Inputs, found: CompressionFound): Finding[] {
  const { cylinders, lowestOfHighest, difference, judged } = found;
  if (cylinders.length < 2) return [];
  if (inputs.share)
    return judgedFinding({
      subject: 'Lowest against highest is',
      value: lowestOfHighest,
      judged: judged.lowestOfHighest,
      band: inputs.share,
      unit: '%',
      fineness: 1,
    });
  if (inputs.rule === 'average') return belowAverage(inputs, found);
  const [words, at] =
    inputs.rule === 'difference'
      ? [
          said`Highest less lowest is ${kPa(difference)}; up to ${kPa(inputs.mostDifference)} is usual.`,
          judged.difference?.at,
        ]
      : [
          said`Lowest against highest is ${percent(lowestOfHighest)}; ${percent(inputs.leastShare)} or more is usual.`,
          judged.lowestOfHighest?.at,
        ];
  return [at === 'in' ? noted(words) : lookAgain(words)];
}

function belowAverage({ mostBelow }: Inputs, { cylinders }: CompressionFound): Finding[] {
  const usual = said`up to ${percent(mostBelow)} is usual`;
  const over = cylinders.flatMap(({ belowAverage, average }, place) =>
    average?.at === 'over'
      ? [lookAgain(said`Cylinder ${place + 1} lies ${percent(belowAverage)} below the average; ${usual}.`)]
      : [],
  );
  const most = Math.max(...cylinders.map((one) => one.belowAverage));
  return over.length > 0 ? over : [noted(said`The lowest lies ${percent(most)} below the average; ${usual}.`)];
}
