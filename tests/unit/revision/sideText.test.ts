import { describe, expect, it } from 'vitest';
import { sideBlocks, type Block, type Side } from '@/domain/revision/sideText';
import { compareWords } from '@/domain/revision/words';

/** The words of a block, what the other text has not in brackets. */
const told = ({ kind, marker, cells }: Block) =>
  [
    kind,
    marker,
    cells.map((cell) => cell.map(({ text, changed }) => (changed ? `[${text}]` : text)).join('')).join(' | '),
  ]
    .filter(Boolean)
    .join(' ');
const side = (from: string, to: string, which: Side = 'new') => sideBlocks(compareWords(from, to), which);

describe('one of two texts, laid out', () => {
  it('tells its own words and keeps blanks out of a mark', () => {
    expect(side('First to 5 N·m, then stop.', 'First to 6 N·m, then stop.', 'old').map(told)).toEqual([
      'paragraph First to [5 N·m], then stop.',
    ]);
    expect(side('Wipe it.', 'Wipe it dry.').map(told)).toEqual(['paragraph Wipe it [dry].']);
  });

  it('reads lists, quotes, hold points and tables', () => {
    const text = [
      '- One',
      '  1. Deep',
      '',
      '> Said',
      '',
      'Hold point. Fetch somebody.',
      '',
      'Figure: From below',
      '',
      '| Bolt | Turn |',
      '| --- | --- |',
      '| 1 | a \\| b |',
    ].join('\n');
    const blocks = side(text, text);
    expect(blocks.map(told)).toEqual([
      'item • One',
      'item 1. Deep',
      'quote Said',
      'hold Hold point. Fetch somebody.',
      'aside Figure: From below',
      'row Bolt | Turn',
      'row 1 | a | b',
    ]);
    expect(blocks[1]?.depth).toBe(1);
  });

  it('shows no mark of Markdown as a character, and every escaped one', () => {
    const text = 'Keep **this** and *that*, `a*b`, 2 \\* 3, R\\&D &amp; [P-0101](/procedures/P-0101).';
    const [block] = side(text, text);
    expect(told(block!)).toBe('paragraph Keep this and that, a*b, 2 * 3, R&D & P-0101.');
    expect(block!.cells[0]!.find(({ text: t }) => t === 'this')).toMatchObject({ strong: true, changed: false });
    expect(block!.cells[0]!.find(({ text: t }) => t === 'P-0101')).toMatchObject({ href: '/procedures/P-0101' });
  });

  it('marks words whose setting or target changed though their letters did not', () => {
    expect(side('Do not pry.', 'Do **not** pry.').map(told)).toEqual(['paragraph Do [not] pry.']);
    expect(side('See [it](/procedures/P-0101).', 'See [it](/procedures/P-0102).').map(told)).toEqual([
      'paragraph See [it].',
    ]);
  });

  it('loses no letter of text that no rule fits', () => {
    const odd = 'a [b] (c) ` d < e _f_ | g';
    expect(told(side(odd, odd)[0]!)).toBe(`paragraph ${odd}`);
  });
});
