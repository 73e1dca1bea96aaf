/** Edit distance of two short words (Levenshtein; insert, delete and replace cost 1 each). */
function distance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i += 1) {
    const next = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const replaced = (row[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1);
      next.push(Math.min(replaced, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
    }
    row = next;
  }
  return row[b.length] ?? 0;
}

/** The word of `known` that was probably meant by `word`, or null where none comes near. */
export function nearest(word: string, known: readonly string[]): string | null {
  if (word.length > 60) return null;
  const near = known
    .map((candidate) => ({ candidate, far: distance(word.toLowerCase(), candidate.toLowerCase()) }))
    .filter(({ candidate, far }) => far <= Math.max(1, Math.floor(candidate.length / 3)))
    .sort((a, b) => a.far - b.far);
  return near[0]?.candidate ?? null;
}

/** `. Did you mean "x"?` or a plain list of what there is; ready to follow a sentence. */
export function suggestion(word: string, known: readonly string[]): string {
  const near = nearest(word, known);
  if (near) return `Did you mean "${near}"?`;
  if (known.length === 0) return 'There is none yet.';
  return known.length <= 12 ? `There is ${known.join(', ')}.` : 'Look for the right one among them.';
}
