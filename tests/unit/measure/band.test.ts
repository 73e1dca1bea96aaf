import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bandAround, judge, placeIn, sameWithin, type Band } from '@/domain/measure/band';
import { convert, type Unit } from '@/domain/measure/convert';
import { between, valueOf } from '../../factories/measures';

const RANK = { under: -1, in: 0, over: 1 };

describe('judge', () => {
  it.each<[number, Band, string, number]>([
    [0.02, { min: 0.02, max: 0.05 }, 'in', 0],
    [0.05, { min: 0.02, max: 0.05 }, 'in', 0],
    [0.019, { min: 0.02, max: 0.05 }, 'under', 0.001],
    [0.053, { min: 0.02, max: 0.05 }, 'over', 0.003],
    [-4, { max: 0 }, 'in', 0],
    [1e9, { min: 3 }, 'in', 0],
    [1e-6, { max: 0 }, 'over', 1e-6],
    [0, { max: 0 }, 'in', 0],
    [0, { min: 0 }, 'in', 0],
    [-1e-6, { min: 0 }, 'under', 1e-6],
  ])('%d in %j: %s by %d', (value, band, at, by) => {
    expect(judge(value, band)).toEqual({ ok: true, value: { at, by: expect.closeTo(by, 12) } });
  });

  it('lets a value on the limit pass in whatever unit each was written', () => {
    const units: Unit[] = ['mm', 'µm', 'in', 'thou'];
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 99_999 }), fc.constantFrom(...units), (tenThousandths, unit) => {
        const inches = tenThousandths / 10_000;
        const there = convert(inches, 'in', unit);
        const back = there.ok ? convert(there.value, unit, 'mm') : there;
        if (!back.ok) throw new Error(back.message);
        const limit = inches * 25.4;
        expect(valueOf(judge(back.value, { min: limit, max: limit })).at).toBe('in');
      }),
    );
  });

  it('does not let through what a bench could read', () => {
    fc.assert(
      fc.property(between(1e-6, 1e3), (limit) => {
        expect(valueOf(judge(limit * (1 + 1e-6), { max: limit })).at).toBe('over');
        expect(valueOf(judge(limit * (1 - 1e-6), { min: limit })).at).toBe('under');
      }),
    );
  });

  it('never gets better as a value moves away', () => {
    fc.assert(
      fc.property(between(-1, 1), between(0, 1), between(-3, 3), between(0, 3), (min, width, value, further) => {
        const band = { min, max: min + width };
        const here = valueOf(judge(value, band));
        const higher = valueOf(judge(value + further, band));
        expect(RANK[higher.at]).toBeGreaterThanOrEqual(RANK[here.at]);
        if (here.at === 'over') expect(higher.by).toBeGreaterThanOrEqual(here.by);
      }),
    );
  });

  it('forgives a difference the rounding of what it is a difference of', () => {
    const clearance = 0.052022 - 0.051992; // 0.030 mm, and a hair
    expect(clearance).not.toBe(0.00003);
    expect(placeIn(clearance, { min: 0.00003, max: 0.00003 }, 0.052).at).toBe('in');
    expect(placeIn(0.0521 - 0.0521 + 1e-18, { max: 0 }, 0.0521).at).toBe('in');
  });

  it('never calls a value that is no number in', () => {
    for (const band of [{ min: 0 }, { max: 1 }, { min: 0, max: 1 }]) expect(placeIn(NaN, band).at).not.toBe('in');
  });

  it.each<[Band, string, string]>([
    [{}, 'band', 'The limit must have a least or a greatest value.'],
    [{ min: 2, max: 1 }, 'band.max', 'The greatest of the limit cannot be less than its least.'],
    [{ min: NaN }, 'band.min', 'The least of the limit must be a number.'],
  ])('refuses the limit %j', (band, field, message) => {
    expect(judge(1, band)).toEqual({ ok: false, problems: [{ field, message }] });
  });

  it('withstands odd input', () => {
    for (const value of [NaN, Infinity, -Infinity, '1' as unknown as number])
      expect(judge(value, { min: 0 })).toEqual({
        ok: false,
        problems: [{ field: 'value', message: 'The value must be a number.' }],
      });
    expect(judge(1.7e308, { max: -1.7e308 })).toMatchObject({ ok: false, problems: [{ field: 'value' }] });
    expect(judge(1, undefined as unknown as Band).ok).toBe(false);
  });
});

it('sameWithin forgives a rounding and nothing else', () => {
  expect(sameWithin(0.1 + 0.2, 0.3)).toBe(true);
  expect(sameWithin(1, 1.000001)).toBe(false);
  expect(sameWithin(-1, 1)).toBe(false);
  expect(sameWithin(1e-12, 2e-12)).toBe(false);
  expect(sameWithin(1e-12, 2e-12, 0.05)).toBe(true);
});

describe('bandAround', () => {
  it('lies the same share to both sides', () => {
    expect(valueOf(bandAround(250, 3))).toEqual({ min: 242.5, max: 257.5 });
    expect(valueOf(bandAround(250, 0))).toEqual({ min: 250, max: 250 });
  });

  it('withstands odd input', () => {
    for (const bad of [NaN, Infinity, -1, 101]) expect(bandAround(250, bad)).toMatchObject({ ok: false });
    for (const bad of [NaN, Infinity, -1, 0, 1e309]) expect(bandAround(bad, 3)).toMatchObject({ ok: false });
    expect(bandAround(1.7e308, 50)).toMatchObject({ ok: false, problems: [{ field: 'nominal' }] });
  });
});
