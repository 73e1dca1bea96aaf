import type { SourceProblem } from '../../procedure/types';

/**
 * Where a problem is underlined: from its column to the end of its line's words, or the whole line where the column is past
 * them. Offsets in the text; empty only on an empty line. What lies beyond the text is put at its end.
 */
export function problemSpan(
  text: string,
  { line, column }: Pick<SourceProblem, 'line' | 'column'>,
): { from: number; to: number } {
  const lines = text.split('\n');
  const place = Math.min(Math.max(line, 1), lines.length) - 1;
  const words = lines[place] ?? '';
  const start = lines.slice(0, place).reduce((sum, one) => sum + one.length + 1, 0);
  const end = words.trimEnd().length;
  const first = words.length - words.trimStart().length;
  const at = column - 1 < end ? Math.max(column - 1, first, 0) : first;
  return { from: start + Math.min(at, end), to: start + end };
}
