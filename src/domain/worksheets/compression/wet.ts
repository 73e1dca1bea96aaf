import { said } from '../../measure/said';
import { wetTest, type WetFound } from '../../measure/wetTest';
import type { Worked } from '../../measure/worked';
import { inBoxes, lookAgain, type Finding } from '../findings';
import { kPa, percent, type GaugeReadings, type Inputs } from './readings';

/**
 * The repeat with oil; see `measure/wetTest.ts`. Only two that are low and stand side by side can share a leak.
 *
 * @param low places from 0 of the cylinders that are low
 */
export function wetOf({ layout, rise }: Inputs, { dry, wet }: GaugeReadings, low: readonly number[]): Worked<WetFound> {
  const beside = low.flatMap((place): [number, number][] => (low.includes(place + 1) ? [[place, place + 1]] : []));
  const found = wetTest({ dry, wet, risePercent: rise, neighbours: layout === 'line' ? beside : [] });
  return found.ok ? found : inBoxes(found, { risePercent: 'rise', dry: 'cylinders', wet: 'cylinders' });
}

/** What oil says about the cylinders that are low; one that is well has nothing to tell. */
export function wetFindings(
  { cylinders, gasketBetween }: WetFound,
  { wet }: GaugeReadings,
  low: readonly number[],
): Finding[] {
  const each = low.flatMap((place) => {
    const one = cylinders[place];
    if (!one?.pointsAt || one.rise === null) return [];
    const rises =
      one.rise <= 0
        ? 'does not rise'
        : one.risePercent === null
          ? said`rises from nothing to ${kPa(wet[place] ?? 0)}`
          : said`rises by ${percent(one.risePercent)}`;
    const leaks = one.pointsAt === 'rings' ? 'the rings leak' : 'a valve or the gasket leaks';
    return [lookAgain(said`Cylinder ${place + 1} ${rises} with oil: ${leaks}.`)];
  });
  const between = gasketBetween.map(([one, other]) => {
    const both = said`Cylinders ${one + 1} and ${other + 1} are low side by side`;
    return lookAgain(said`${both} and neither rises: suspect the gasket between them.`);
  });
  return [...each, ...between];
}
