import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inEveryLongestRising, longestRising } from '@/domain/revision/rising';

/** All longest rising runs, as places, found by trying every choice. */
function allLongest(numbers: readonly number[]): number[][] {
  let longest: number[][] = [[]];
  for (let set = 0; set < 1 << numbers.length; set += 1) {
    const places = numbers.flatMap((_, i) => ((set >> i) & 1 ? [i] : []));
    const rises = places.every((place, i) => i === 0 || numbers[place]! > numbers[places[i - 1]!]!);
    if (!rises || places.length < longest[0]!.length) continue;
    if (places.length > longest[0]!.length) longest = [];
    longest.push(places);
  }
  return longest;
}

const numbers = fc.uniqueArray(fc.nat(50), { maxLength: 10 });

describe('a longest rising run', () => {
  it('is one of those found by trying them all', () => {
    fc.assert(
      fc.property(numbers, (given) => {
        const kept = [...longestRising(given)].sort((a, b) => a - b);
        expect(allLongest(given)).toContainEqual(kept);
      }),
      { numRuns: 200 },
    );
  });

  it('goes through the places that all of those go through', () => {
    fc.assert(
      fc.property(numbers, (given) => {
        const runs = allLongest(given);
        const always = given.flatMap((_, i) => (runs.every((run) => run.includes(i)) ? [i] : []));
        expect([...inEveryLongestRising(given)].sort((a, b) => a - b)).toEqual(always);
      }),
      { numRuns: 200 },
    );
  });

  it('leaves out both of two neighbours that changed places, since either may have moved', () => {
    expect([...inEveryLongestRising([1, 3, 2, 4])]).toEqual([0, 3]);
    expect([...inEveryLongestRising([])]).toEqual([]);
  });
});
