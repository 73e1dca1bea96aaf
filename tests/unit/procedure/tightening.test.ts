import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { drawBolts } from '@/domain/procedure/tightening';

const paper = { width: 246, maxHeight: 200, margin: 20 };

describe('drawBolts', () => {
  it('draws to scale, centred, with each bolt its turn', () => {
    const drawing = drawBolts({ positions: [[0, 0], [200, 0], [200, 100], [0, 100]], order: [1, 3, 2, 4] }, paper); // prettier-ignore
    expect(drawing?.height).toBeCloseTo(143);
    expect(drawing?.bolts.map((b) => [b.bolt, b.place, b.x, b.y])).toEqual([
      [1, 1, 20, 20],
      [2, 3, 226, 20],
      [3, 2, 226, 123],
      [4, 4, 20, 123],
    ]);
  });

  it('draws a row, a column and a single bolt', () => {
    expect(drawBolts({ positions: [[0, 5], [10, 5]] }, paper)).toMatchObject({ height: 40, bolts: [{ x: 20, y: 20, place: null }, { x: 226 }] }); // prettier-ignore
    expect(drawBolts({ positions: [[5, 0], [5, 10]] }, paper)).toMatchObject({ height: 200, bolts: [{ x: 123, y: 20 }, { x: 123, y: 180 }] }); // prettier-ignore
    expect(drawBolts({ positions: [[7, 7]] }, paper)).toMatchObject({ height: 40, bolts: [{ x: 123, y: 20 }] });
    expect(drawBolts({}, paper)).toBeNull();
  });

  it('keeps every bolt on the paper', () => {
    const position = fc.tuple(fc.integer({ min: -5000, max: 5000 }), fc.integer({ min: -5000, max: 5000 }));
    fc.assert(
      fc.property(fc.array(position, { minLength: 1, maxLength: 40 }), (positions) => {
        const drawing = drawBolts({ positions }, paper)!;
        expect(drawing.height).toBeLessThanOrEqual(paper.maxHeight + 1e-9);
        for (const { x, y } of drawing.bolts) {
          expect(x).toBeGreaterThanOrEqual(paper.margin - 1e-9);
          expect(x).toBeLessThanOrEqual(paper.width - paper.margin + 1e-9);
          expect(y).toBeGreaterThanOrEqual(paper.margin - 1e-9);
          expect(y).toBeLessThanOrEqual(drawing.height - paper.margin + 1e-9);
        }
      }),
    );
  });
});
