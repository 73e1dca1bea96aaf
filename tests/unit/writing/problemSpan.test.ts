import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { problemSpan } from '@/domain/writing/source/problemSpan';

const text = '---\ntitle: Seal  \n\n  nm: x\n';
const marked = (line: number, column: number) => {
  const { from, to } = problemSpan(text, { line, column });
  return text.slice(from, to);
};

describe('where a problem is underlined', () => {
  it.each([
    [2, 8, 'Seal'],
    [2, 1, 'title: Seal'],
    // Past the words the whole line is meant, and blanks at its edges are not.
    [2, 40, 'title: Seal'],
    [4, 1, 'nm: x'],
    [4, 7, 'x'],
    [3, 1, ''],
    [5, 1, ''],
    [99, 9, ''],
    [0, 0, '---'],
  ])('line %i, column %i: “%s”', (line, column, words) => expect(marked(line, column)).toBe(words));

  it('is always inside the text', () => {
    fc.assert(
      fc.property(fc.string(), fc.integer(), fc.integer(), (any, line, column) => {
        const { from, to } = problemSpan(any, { line, column });
        expect(0 <= from && from <= to && to <= any.length).toBe(true);
      }),
    );
  });
});
