/**
 * For each place the length of the longest rising run that ends there, and the place before it in one such run (-1 for
 * none). Patience sorting: n log n.
 */
function runsEnding(numbers: readonly number[]): { length: number[]; before: number[]; last: number } {
  const ends: number[] = [];
  const length: number[] = [];
  const before: number[] = [];
  numbers.forEach((number, i) => {
    let low = 0;
    let high = ends.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((numbers[ends[middle] ?? 0] ?? 0) < number) low = middle + 1;
      else high = middle;
    }
    before[i] = low > 0 ? (ends[low - 1] ?? -1) : -1;
    length[i] = low + 1;
    ends[low] = i;
  });
  return { length, before, last: ends.at(-1) ?? -1 };
}

/** Places of a longest rising run in `numbers`; what is not in it has moved. */
export function longestRising(numbers: readonly number[]): Set<number> {
  const { before, last } = runsEnding(numbers);
  const kept = new Set<number>();
  for (let i = last; i >= 0; i = before[i] ?? -1) kept.add(i);
  return kept;
}

/** Places that every longest rising run goes through: without one of them, the longest would be shorter. */
export function inEveryLongestRising(numbers: readonly number[]): Set<number> {
  const up = runsEnding(numbers).length;
  // The longest run that begins at a place is one that ends there, read from behind and upside down.
  const down = runsEnding([...numbers].reverse().map((number) => -number)).length.reverse();
  const longest = up.reduce((most, one) => Math.max(most, one), 0);
  const onLongest = up.flatMap((one, i) => (one + (down[i] ?? 0) - 1 === longest ? [i] : []));
  const sharing = new Map<number, number>();
  for (const i of onLongest) sharing.set(up[i] ?? 0, (sharing.get(up[i] ?? 0) ?? 0) + 1);
  return new Set(onLongest.filter((i) => sharing.get(up[i] ?? 0) === 1));
}
