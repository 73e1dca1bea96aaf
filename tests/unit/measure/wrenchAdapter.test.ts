import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { torqueAtBolt, wrenchSetting } from '@/domain/measure/wrenchAdapter';
import { valueOf } from '../../factories/measures';
import { EXTREMES, NO_NUMBERS, expectRefused, expectSound } from './sweep';

const torque = fc.double({ min: 0.1, max: 2000, noNaN: true });
const length = fc.double({ min: 0.1, max: 2, noNaN: true });
const short = fc.double({ min: 0, max: 0.099, noNaN: true });
const angle = fc.integer({ min: -360, max: 360 });

describe('a torque wrench with an adapter', () => {
  it('delivers what it was set for', () => {
    fc.assert(
      fc.property(torque, length, short, angle, (wanted, long, adapter, degrees) => {
        const wrench = { length: long, adapter, angle: degrees };
        const back = valueOf(torqueAtBolt(valueOf(wrenchSetting(wanted, wrench)), wrench));
        expect(Math.abs(back / wanted - 1)).toBeLessThan(1e-12);
      }),
    );
  });

  it('is set lower while the adapter lengthens it, higher while it points back', () => {
    fc.assert(
      fc.property(torque, length, fc.double({ min: 0.01, max: 0.099, noNaN: true }), (wanted, long, adapter) => {
        const at = (degrees: number) => valueOf(wrenchSetting(wanted, { length: long, adapter, angle: degrees }));
        const settings = [0, 30, 60, 89, 90, 91, 120, 150, 180].map(at);
        expect(settings).toEqual([...settings].sort((a, b) => a - b));
        expect(at(90)).toBe(wanted);
        expect(at(0)).toBeLessThan(wanted);
        expect(at(180)).toBeGreaterThan(wanted);
      }),
    );
  });

  it('does not care to which side it is bent, or which way round the angle is counted', () => {
    fc.assert(
      fc.property(torque, length, short, fc.integer({ min: 0, max: 360 }), (wanted, long, adapter, degrees) => {
        const at = (turned: number) => valueOf(wrenchSetting(wanted, { length: long, adapter, angle: turned }));
        expect(at(-degrees)).toBeCloseTo(at(degrees), 9);
        expect(at(360 - degrees)).toBeCloseTo(at(degrees), 9);
      }),
    );
  });

  it('changes nothing without an adapter', () => {
    expect(valueOf(wrenchSetting(40, { length: 0.4, adapter: 0, angle: 0 }))).toBe(40);
  });

  it.each([
    [0.3, 0.3, 180],
    [0.3, 0.4, 180],
    [0.2, 0.4, 120],
  ])('refuses an adapter that reaches back to the grip (L %d, E %d, %d°)', (long, adapter, degrees) => {
    const wrench = { length: long, adapter, angle: degrees + (degrees === 120 ? 1 : 0) };
    const message = 'The adapter points back as far as the grip or beyond it; the wrench cannot turn the bolt.';
    expect(wrenchSetting(40, wrench)).toEqual({ ok: false, problems: [{ field: 'adapter', message }] });
    expect(torqueAtBolt(40, wrench)).toEqual({ ok: false, problems: [{ field: 'adapter', message }] });
  });

  it('says in m what is too long', () => {
    expect(wrenchSetting(40, { length: 250, adapter: 0.05, angle: 0 })).toEqual({
      ok: false,
      problems: [{ field: 'length', message: 'The length of the wrench must be 10 m or less.' }],
    });
  });

  it('never throws, and never answers with what is no number', () => {
    const wrench = { length: 0.3, adapter: 0.1, angle: 0 };
    for (const bad of [...EXTREMES, ...NO_NUMBERS])
      for (const act of [wrenchSetting, torqueAtBolt]) {
        expectSound(act(bad, wrench), /^(atBolt|setting)$/);
        for (const field of ['length', 'adapter', 'angle'] as const)
          expectSound(act(40, { ...wrench, [field]: bad }), /^(length|adapter|angle|atBolt|setting)$/);
      }
    for (const bad of [NaN, Infinity, 0, -1]) {
      expectRefused(wrenchSetting(bad, wrench), 'atBolt');
      expectRefused(torqueAtBolt(bad, wrench), 'setting');
      expectRefused(wrenchSetting(40, { ...wrench, length: bad }), 'length');
    }
    expectRefused(wrenchSetting(40, { ...wrench, adapter: -0.1 }), 'adapter');
    expectRefused(wrenchSetting(40, { ...wrench, angle: 361 }), 'angle');
  });
});
