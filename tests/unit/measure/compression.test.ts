import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { atSeaLevel, gaugeFromAbsolute, standardAltitude, standardPressure } from '@/domain/measure/atmosphere';
import { judgeCompression, type CompressionRules } from '@/domain/measure/compression';
import { wetTest, type WetTest } from '@/domain/measure/wetTest';
import { sweep } from '../../factories/hostileNumbers';
import { between, PSI, relative, valueOf } from '../../factories/measures';

const kPa = (...values: number[]) => values.map((value) => value * 1000);
const rules: CompressionRules = {
  band: { min: 1_050_000 },
  lowestOfHighest: { min: 75 },
  belowAverage: { max: 20 },
  difference: { max: 10 * PSI },
};
const readings = fc.array(between(1e5, 3e6), { minLength: 1, maxLength: 8 });

describe('compression', () => {
  it('holds readings against each rule that is given', () => {
    const found = valueOf(judgeCompression(kPa(1300, 1290, 930, 1280), rules));
    expect(found).toMatchObject({ lowest: 930_000, highest: 1_300_000, mean: 1_200_000, difference: 370_000 });
    expect(found.lowestOfHighest).toBeCloseTo(71.538, 3);
    expect(found.cylinders[2]).toMatchObject({
      belowAverage: 22.5,
      judged: { at: 'under', by: 120_000 },
      average: { at: 'over', by: 2.5 },
    });
    expect(found.judged).toMatchObject({ lowestOfHighest: { at: 'under' }, difference: { at: 'over' } });
    expect(found.passes).toBe(false);
  });

  it('judges nothing that no rule is given for', () => {
    const found = valueOf(judgeCompression(kPa(1300, 100)));
    expect(found.judged).toEqual({ lowestOfHighest: null, difference: null });
    expect(found.passes).toBe(true);
  });

  it('does not depend on the order of the cylinders, and shares do not depend on the unit', () => {
    fc.assert(
      fc.property(readings, between(0.1, 3), (list, scale) => {
        const { cylinders, ...set } = valueOf(judgeCompression(list, rules));
        const { cylinders: turned, ...again } = valueOf(judgeCompression(list.toReversed(), rules));
        expect(again).toEqual(set);
        expect(turned.toReversed()).toEqual(cylinders);
        const scaled = valueOf(judgeCompression(list.map((one) => one * scale)));
        expect(relative(scaled.lowestOfHighest, set.lowestOfHighest)).toBeLessThan(1e-12);
      }),
    );
  });

  it('never passes when the weakest cylinder grows weaker', () => {
    fc.assert(
      fc.property(readings, between(0, 1), (list, share) => {
        fc.pre(list.length > 1);
        const weakest = list.indexOf(Math.min(...list));
        const weaker = list.map((one, place) => (place === weakest ? one * share : one));
        if (!valueOf(judgeCompression(list, rules)).passes)
          expect(valueOf(judgeCompression(weaker, rules)).passes).toBe(false);
      }),
    );
  });

  it('takes a dead cylinder, but not an engine that shows nothing at all', () => {
    expect(valueOf(judgeCompression(kPa(1300, 0), rules)).lowestOfHighest).toBe(0);
    expect(judgeCompression([0, 0])).toEqual({
      ok: false,
      problems: [{ field: 'readings', message: 'No cylinder shows any compression; check the gauge first.' }],
    });
  });

  it('withstands odd input', () => {
    const good = { readings: kPa(1300, 1290, 1280), rules };
    sweep((input: typeof good) => judgeCompression(input.readings, input.rules), good);
  });
});

const wet = (dry: number[], repeated: (number | null)[], more: Partial<WetTest> = {}): WetTest => ({
  dry: kPa(...dry),
  wet: repeated.map((one) => (one === null ? null : one * 1000)),
  risePercent: 10,
  ...more,
});

describe('wet test', () => {
  it('points at the rings by a clear rise, at valves or gasket without one', () => {
    const found = valueOf(wetTest(wet([1300, 900, 880, 0, 0], [null, 1150, 890, 200, 0])));
    expect(found.cylinders.map((one) => one.pointsAt)).toEqual([
      null,
      'rings',
      'valves or gasket',
      'rings',
      'valves or gasket',
    ]);
    expect(found.cylinders[1]?.risePercent).toBeCloseTo(27.778, 3);
    expect(found.cylinders[3]).toMatchObject({ rise: 200_000, risePercent: null });
  });

  it('counts a rise that is the limit to the digit', () => {
    expect(valueOf(wetTest(wet([900], [990]))).cylinders[0]?.pointsAt).toBe('rings');
    expect(valueOf(wetTest(wet([900], [989]))).cylinders[0]?.pointsAt).toBe('valves or gasket');
  });

  it('names the gasket between two neighbours of which neither rose', () => {
    const neighbours: [number, number][] = [
      [0, 1],
      [1, 2],
      [2, 3],
    ];
    const found = valueOf(wetTest(wet([1300, 700, 690, 1300], [null, 705, 700, null], { neighbours })));
    expect(found.gasketBetween).toEqual([[1, 2]]);
    expect(valueOf(wetTest(wet([700, 690], [705, 900], { neighbours: [[0, 1]] }))).gasketBetween).toEqual([]);
  });

  it.each<[WetTest, string, string]>([
    [wet([900, 900], [950]), 'wet', 'There must be a place for a wet reading for each dry one.'],
    [wet([900], [null], { neighbours: [[0, 1]] }), 'neighbours.0', 'Pair 1 must name two cylinders.'],
    [wet([900], [null], { neighbours: [[0, 0]] }), 'neighbours.0', 'Pair 1 must name two cylinders.'],
    [wet([900], [null], { risePercent: 0 }), 'risePercent', 'The rise that tells must be more than zero.'],
  ])('refuses %j', (test, field, message) => {
    expect(wetTest(test)).toEqual({ ok: false, problems: [{ field, message }] });
  });

  it('withstands odd input', () => {
    sweep(wetTest, wet([900, 800], [990, 810]), { nulls: ['wet.0', 'wet.1'] });
    for (const pair of [[0], [0, 2], [0, -1], [0, NaN], [0, 0.5], [0, 1, 1], null, 'ab'])
      expect(wetTest(wet([900, 800], [990, 810], { neighbours: [pair as [number, number]] }))).toMatchObject({
        problems: [{ field: 'neighbours.0' }],
      });
  });
});

describe('altitude', () => {
  it('there and back again is where it started', () => {
    fc.assert(
      fc.property(between(-500, 6000), (altitude) => {
        const back = valueOf(standardAltitude(valueOf(standardPressure(altitude))));
        expect(Math.abs(back - altitude)).toBeLessThan(1e-8);
      }),
    );
  });

  it('corrects a gauge reading upward in thin air, by the same share as an absolute one', () => {
    fc.assert(
      fc.property(between(1e5, 3e6), between(6e4, 1.1e5), (reading, ambient) => {
        const corrected = valueOf(atSeaLevel(reading, ambient));
        // The long way: to absolute, by the ratio of the airs, back to gauge.
        expect(relative(corrected, ((reading + ambient) * 101325) / ambient - 101325)).toBeLessThan(1e-12);
        if (ambient < 101325) expect(corrected).toBeGreaterThan(reading);
        const gauge = valueOf(gaugeFromAbsolute(reading + ambient, ambient));
        expect(Math.abs(gauge - reading)).toBeLessThan(1e-12 * (reading + ambient));
      }),
    );
  });

  it('shows that shares of absolute readings flatter a weak cylinder', () => {
    const air = 100_000;
    const share = (list: number[]) => valueOf(judgeCompression(list, { lowestOfHighest: { min: 75 } }));
    const gauge = [1_200_000, 890_000];
    expect(share(gauge).passes).toBe(false);
    expect(share(gauge.map((one) => one + air)).passes).toBe(true);
  });

  it('refuses less than the air', () => {
    expect(gaugeFromAbsolute(90_000, 101_325)).toEqual({
      ok: false,
      problems: [{ field: 'absolute', message: 'The absolute pressure cannot be less than that of the air.' }],
    });
  });

  it('withstands odd input', () => {
    sweep(({ altitude }: { altitude: number }) => standardPressure(altitude), { altitude: 1500 });
    sweep(({ pressure }: { pressure: number }) => standardAltitude(pressure), { pressure: 84_000 });
    const reading = { reading: 1.2e6, ambient: 84_000 };
    sweep((input: typeof reading) => atSeaLevel(input.reading, input.ambient), reading);
    const absolute = { absolute: 1.2e6, ambient: 84_000 };
    sweep((input: typeof absolute) => gaugeFromAbsolute(input.absolute, input.ambient), absolute);
  });
});
