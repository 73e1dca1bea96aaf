/**
 * A stencil alphabet for the demonstration's drawings: each letter is strokes on a field 4 wide and 6 high, as a plotter would
 * draw it. A server need not have a font, and a drawing then says the same on every machine.
 */
const LETTERS: Record<string, string> = {
  A: '0,6 2,0 4,6;0.7,4 3.3,4',
  D: '0,0 0,6 2.5,6 4,4.5 4,1.5 2.5,0 0,0',
  E: '4,0 0,0 0,6 4,6;0,3 3,3',
  F: '4,0 0,0 0,6;0,3 3,3',
  G: '4,1 3,0 1,0 0,1 0,5 1,6 3,6 4,5 4,3 2.2,3',
  H: '0,0 0,6;4,0 4,6;0,3 4,3',
  I: '2,0 2,6',
  L: '0,0 0,6 4,6',
  M: '0,6 0,0 2,3 4,0 4,6',
  N: '0,6 0,0 4,6 4,0',
  O: '1,0 3,0 4,1 4,5 3,6 1,6 0,5 0,1 1,0',
  P: '0,6 0,0 3,0 4,1 4,2.4 3,3.4 0,3.4',
  R: '0,6 0,0 3,0 4,1 4,2.2 3,3.2 0,3.2;2,3.2 4,6',
  S: '4,1 3,0 1,0 0,1 0,2 1,3 3,3 4,4 4,5 3,6 1,6 0,5',
  T: '0,0 4,0;2,0 2,6',
  W: '0,0 1,6 2,2.5 3,6 4,0',
  '1': '1,1.2 2,0 2,6',
  '.': '1.8,5.7 2.2,5.7 2.2,6 1.8,6 1.8,5.7',
  ' ': '',
};

/**
 * Words as an SVG path.
 *
 * @param size height of a capital, in units of the drawing
 * Throws where a letter is missing, so that no word is drawn with a gap.
 */
export function strokes(words: string, x: number, y: number, size: number): string {
  const unit = size / 6;
  const letters = [...words.toUpperCase()].map((letter, i) => {
    const drawn = LETTERS[letter];
    if (drawn === undefined) throw new Error(`The stencil has no "${letter}".`);
    return drawn
      .split(';')
      .filter(Boolean)
      .map((line) => {
        const points = line.split(' ').map((point) => {
          const [dx = 0, dy = 0] = point.split(',').map(Number);
          return `${(x + (i * 5.6 + dx) * unit).toFixed(1)},${(y + dy * unit).toFixed(1)}`;
        });
        return `M${points.join(' L')}`;
      })
      .join(' ');
  });
  return letters.filter(Boolean).join(' ');
}
