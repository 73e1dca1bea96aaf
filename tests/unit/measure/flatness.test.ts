import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bestFitPlane, type FacePoint } from '@/domain/measure/bestFitPlane';
import { judgeFlatness, type Direction, type EdgeGap, type FlatnessLimits } from '@/domain/measure/flatness';
import { sweep } from '../../factories/hostileNumbers';
import { between, MM, valueOf } from '../../factories/measures';

const gap = (direction: Direction, blade: number, span?: number): EdgeGap => ({
  direction,
  gap: blade * MM,
  ...(span === undefined ? {} : { span: span * MM }),
});
const limits: FlatnessLimits = {
  along: { max: 0.05 * MM },
  across: { max: 0.03 * MM },
  diagonal: { max: 0.05 * MM },
};
const local = { max: 0.05 * MM, over: 150 * MM };

describe('straightedge and feeler gauge', () => {
  it('holds each gap against the limit of its direction', () => {
    const found = valueOf(judgeFlatness([gap('along', 0.05), gap('across', 0.04), gap('diagonal', 0.02)], limits));
    expect(found.gaps.map((one) => one.judged?.at)).toEqual(['in', 'over', 'in']);
    expect(found.worst).toEqual({ along: 0.05 * MM, across: 0.04 * MM, diagonal: 0.02 * MM });
    expect(found).toMatchObject({ worstOfAll: 0.05 * MM, passes: false });
    expect(valueOf(judgeFlatness([gap('along', 0)], limits)).worst.across).toBeNull();
  });

  it('holds a limit in a length: short span fails, longer span cannot tell, and neither passes', () => {
    const verdicts = (...gaps: EdgeGap[]) => valueOf(judgeFlatness(gaps, { local })).gaps.map((one) => one.local);
    expect(verdicts(gap('along', 0.05, 400), gap('along', 0.06, 150), gap('along', 0.06, 400))).toEqual([
      'in',
      'over',
      'unsure',
    ]);
    expect(valueOf(judgeFlatness([gap('along', 0.06, 400)], { local })).passes).toBe(false);
    expect(valueOf(judgeFlatness([gap('along', 0.05, 100)], { local })).passes).toBe(true);
  });

  it('wants the span where the limit is for a length', () => {
    expect(judgeFlatness([gap('along', 0.02)], { local })).toEqual({
      ok: false,
      problems: [{ field: 'gaps.0.span', message: 'The span of gap 1 must be a number.' }],
    });
  });

  it('does not mind the order, and never passes with a larger gap what fails with a smaller', () => {
    const some = fc.array(fc.tuple(fc.constantFrom<Direction>('along', 'across', 'diagonal'), between(0, 0.1)), {
      minLength: 1,
      maxLength: 9,
    });
    fc.assert(
      fc.property(some, between(0, 0.1), (list, more) => {
        const gaps = list.map(([direction, blade]) => gap(direction, blade));
        const found = valueOf(judgeFlatness(gaps, limits));
        const { worst, worstOfAll, passes } = valueOf(judgeFlatness(gaps.toReversed(), limits));
        expect({ worst, worstOfAll, passes }).toEqual({
          worst: found.worst,
          worstOfAll: found.worstOfAll,
          passes: found.passes,
        });
        const wider = gaps.map((one) => ({ ...one, gap: one.gap + more * MM }));
        if (!passes) expect(valueOf(judgeFlatness(wider, limits)).passes).toBe(false);
      }),
    );
  });

  it('withstands odd input', () => {
    const good = { gaps: [gap('along', 0.04, 140), gap('across', 0.02, 100)], limits: { ...limits, local } };
    sweep((input: typeof good) => judgeFlatness(input.gaps, input.limits), good);
    const odd = gap('up' as Direction, 0.02);
    expect(judgeFlatness([odd], limits)).toMatchObject({
      problems: [{ field: 'gaps.0.direction', message: 'Gap 1 must lie along, across or diagonally.' }],
    });
    expect(judgeFlatness([null as unknown as EdgeGap]).ok).toBe(false);
  });
});

const face = (heights: number[][], pitch = 0.1): FacePoint[] =>
  heights.flatMap((row, j) => row.map((height, i) => ({ x: i * pitch, y: j * pitch, height: height * MM })));
const flat = face([
  [0.02, 0.01, 0.02],
  [0, -0.02, 0.01],
  [0.02, 0, 0.01],
]);

describe('best-fit plane', () => {
  it('finds the bow of a face whose heights are known', () => {
    // A saddle: two corners up, two down. The plane that fits is level, so nothing is taken off.
    const found = valueOf(
      bestFitPlane(
        face([
          [0.03, -0.03],
          [-0.03, 0.03],
        ]),
      ),
    );
    expect(found.flatness).toBeCloseTo(0.06 * MM, 12);
    expect(found.slope.x).toBeCloseTo(0, 12);
    expect(valueOf(bestFitPlane(flat, { max: 0.05 * MM })).judged?.at).toBe('in');
    expect(valueOf(bestFitPlane(flat, { max: 0.02 * MM })).judged?.at).toBe('over');
  });

  it('does not see how the face was levelled, nor the order of the places', () => {
    fc.assert(
      fc.property(between(-0.01, 0.01), between(-0.01, 0.01), between(-0.1, 0.1), (a, b, lift) => {
        const tilted = flat.map(({ x, y, height }) => ({ x, y, height: height + a * x + b * y + lift }));
        const once = valueOf(bestFitPlane(flat)).flatness;
        const { flatness, slope } = valueOf(bestFitPlane(tilted));
        expect(Math.abs(flatness - once)).toBeLessThan(once * 2e-4); // the tilt of up to 0.014 turns the zone
        const level = valueOf(bestFitPlane(flat)).slope;
        expect(slope.x - level.x).toBeCloseTo(a, 9);
        expect(slope.y - level.y).toBeCloseTo(b, 9);
        expect(Math.abs(valueOf(bestFitPlane(flat.toReversed())).flatness - once)).toBeLessThan(1e-15);
      }),
    );
  });

  it('fits places that lie anyhow', () => {
    const places = fc.array(fc.tuple(between(-0.2, 0.2), between(-0.2, 0.2)), { minLength: 4, maxLength: 12 });
    fc.assert(
      fc.property(places, between(-0.01, 0.01), between(-0.01, 0.01), (list, a, b) => {
        const found = bestFitPlane(list.map(([x, y]) => ({ x, y, height: a * x + b * y + 0.001 })));
        // Places that lie on one line, or nearly so, make no plane.
        fc.pre(found.ok);
        expect(found.value.flatness).toBeLessThan(1e-9);
      }),
    );
    const skewed = [
      [0, 0],
      [0.1, 0.02],
      [0.03, 0.2],
      [0.25, 0.15],
      [0.12, 0.11],
    ].map(([x = 0, y = 0]) => ({ x, y, height: 0.003 * x - 0.002 * y }));
    const { slope, flatness } = valueOf(bestFitPlane(skewed));
    expect([slope.x, slope.y]).toEqual([expect.closeTo(0.003, 12), expect.closeTo(-0.002, 12)]);
    expect(flatness).toBeLessThan(1e-15);
  });

  it('has deviations that sum to nothing, and about which no other plane is better', () => {
    const heights = fc.array(between(-0.05, 0.05), { minLength: 9, maxLength: 9 });
    fc.assert(
      fc.property(heights, between(-1e-3, 1e-3), between(-1e-3, 1e-3), (list, da, db) => {
        const points = flat.map((point, place) => ({ ...point, height: (list[place] ?? 0) * MM }));
        const { deviations, slope } = valueOf(bestFitPlane(points));
        const sum = deviations.reduce((total, one) => total + one, 0);
        expect(Math.abs(sum)).toBeLessThan(1e-12);
        const middle = { x: 0.1, y: 0.1, height: points.reduce((total, one) => total + one.height, 0) / 9 };
        const squares = (a: number, b: number) =>
          points.reduce(
            (total, one) => total + (one.height - middle.height - a * (one.x - middle.x) - b * (one.y - middle.y)) ** 2,
            0,
          );
        expect(squares(slope.x, slope.y)).toBeLessThanOrEqual(squares(slope.x + da, slope.y + db) + 1e-20);
      }),
    );
  });

  it('refuses places on one line, or too few', () => {
    const line = [0, 1, 2, 3, 4].map((i) => ({ x: i * 0.03, y: i * 0.07, height: i * MM }));
    expect(bestFitPlane(line)).toEqual({
      ok: false,
      problems: [{ field: 'points', message: 'The places lie on one line; a plane needs some beside it.' }],
    });
    expect(bestFitPlane(line.map(() => ({ x: 0.1, y: 0.1, height: 0 })))).toMatchObject({ ok: false });
    expect(bestFitPlane(flat.slice(0, 3))).toMatchObject({
      problems: [{ field: 'points', message: 'The places must hold 4 places or more.' }],
    });
  });

  it('withstands odd input', () => {
    const good = { points: flat, band: { min: 0, max: 0.05 * MM } };
    sweep((input: typeof good) => bestFitPlane(input.points, input.band), good);
  });
});
