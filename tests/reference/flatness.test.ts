import { describe, expect, it } from 'vitest';
import { bestFitPlane } from '@/domain/measure/bestFitPlane';
import { MM, valueOf } from '../factories/measures';

/** No published flatness example was found; C: worked here by another road than the code's. */
describe('best-fit plane (C)', () => {
  it('a square plate with one corner of four raised by h is out of flat by h / 2', () => {
    // By symmetry: fitting z = c + a·x + b·y to corners (0, 0, 0, h) leaves ±h/4 at the corners.
    const h = 0.08 * MM;
    const corners = [
      { x: 0, y: 0, height: 0 },
      { x: 0.2, y: 0, height: 0 },
      { x: 0, y: 0.2, height: 0 },
      { x: 0.2, y: 0.2, height: h },
    ];
    const found = valueOf(bestFitPlane(corners));
    expect(found.flatness / MM).toBeCloseTo(0.04, 6);
    expect(found.deviations.map((one) => Math.round((one / h) * 1e6) / 1e6)).toEqual([0.25, -0.25, -0.25, 0.25]);
    expect(found.slope.x).toBeCloseTo(h / 0.4, 12);
  });

  it('nine places in a bow of h along one edge direction are out of flat by h', () => {
    const h = 0.05 * MM;
    const places = [0, 1, 2].flatMap((j) => [0, h, 0].map((height, i) => ({ x: i * 0.1, y: j * 0.1, height })));
    expect(valueOf(bestFitPlane(places)).flatness / MM).toBeCloseTo(0.05, 9);
  });
});
