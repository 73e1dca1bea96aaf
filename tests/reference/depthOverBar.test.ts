import { describe, expect, it } from 'vitest';
import { depthOverBar } from '@/domain/measure/depthOverBar';
import { INCH, MM, valueOf } from '../factories/measures';

/** No published example was found. M: geometry from memory, depth = reading − bar − zero offset; C: numbers worked here. */
describe('depth over a bar (M: geometry; C)', () => {
  it.each([
    ['1 in bar, 2.104 in shown', 2.104 * INCH, 1 * INCH, 0, 1.104 * INCH],
    ['25.40 mm bar, 53.40 mm shown', 53.4 * MM, 25.4 * MM, 0, 28 * MM],
    ['the same, gauge 0.02 mm long on its master', 53.4 * MM, 25.4 * MM, 0.02 * MM, 27.98 * MM],
  ])('%s', (_, reading, bar, zeroOffset, want) => {
    const found = valueOf(depthOverBar({ reading, bar, zeroOffset, readFrom: 'bar-top', direction: 'below' }));
    expect(found.distance / MM).toBeCloseTo(want / MM, 9);
    expect((found.mistaken.distance - found.distance) / MM).toBeCloseTo(bar / MM, 9);
  });
});
