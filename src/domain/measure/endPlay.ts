import { optionalBandProblems, placeInIfAny, type Band, type Judged } from './band';
import { OFFSET } from './reach';
import { largestOf, listProblems, meanOf, rangeOf } from './readings';
import { work, type Worked } from './worked';

export interface EndPlay {
  /** What the dial shows with the shaft pushed one way and then the other, m, one pair or several in a list. */
  forward: readonly number[];
  back: readonly number[];
  band?: Band;
}

/**
 * End play of a crankshaft: how far the dial moves between the shaft pushed back and pushed forward, whichever way the
 * dial counts. Of several pairs the mean counts and `range` tells how well they repeat. Common practice, no source.
 *
 * Errors name `forward.<place>`, `back.<place>`, the list whose length does not match, or `band`.
 */
export function crankEndPlay({
  forward,
  back,
  band,
}: EndPlay): Worked<{ play: number; range: number; judged: Judged | null }> {
  const dial = (field: string, one: string, values: readonly number[]) =>
    listProblems(field, { list: `The readings ${one}`, one: `Reading ${one}` }, values, OFFSET, { atMost: 12 });
  const problems = [
    ...dial('forward', 'forward', forward),
    ...dial('back', 'back', back),
    ...optionalBandProblems('band', 'The end play allowed', band, OFFSET),
  ];
  if (problems.length === 0 && forward.length !== back.length)
    problems.push({ field: 'back', message: 'There must be as many readings back as forward.' });
  return work(problems, 'forward', () => {
    const plays = forward.map((value, place) => Math.abs(value - (back[place] ?? NaN)));
    const play = meanOf(plays);
    const size = largestOf([...forward, ...back].map(Math.abs));
    return { play, range: rangeOf(plays), judged: placeInIfAny(play, band, size) };
  });
}
