import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { WHOLE_BAND, gaugeFit, gaugeFor } from '@/domain/measure/gaugeFit';
import { valueOf } from '../../factories/measures';
import { EXTREMES, NO_NUMBERS, expectRefused, expectSound } from './sweep';

const size = fc.double({ min: 1e-7, max: 1, noNaN: true });
const RANK = { 'too coarse': 0, enough: 1, ideal: 2 };

describe('gaugeFit', () => {
  it('never gets worse as the tolerance widens or the tool gets finer', () => {
    fc.assert(
      fc.property(size, size, fc.double({ min: 1, max: 50, noNaN: true }), (band, tool, times) => {
        const rank = (b: number, t: number) => RANK[valueOf(gaugeFit(b, t)).verdict];
        expect(rank(band * times, tool)).toBeGreaterThanOrEqual(rank(band, tool));
        expect(rank(band, tool / times)).toBeGreaterThanOrEqual(rank(band, tool));
      }),
    );
  });

  it('counts exactly ten and exactly four steps, whatever binary fractions make of them', () => {
    for (const tool of [0.1, 0.05, 0.02, 0.01, 0.005, 0.002, 0.001, 0.0025].map((mm) => mm / 1000)) {
      expect(valueOf(gaugeFit(tool * 10, tool)).verdict).toBe('ideal');
      expect(valueOf(gaugeFit(tool * 4, tool)).verdict).toBe('enough');
      expect(valueOf(gaugeFit(tool * 9.99, tool)).verdict).toBe('enough');
      expect(valueOf(gaugeFit(tool * 3.99, tool)).verdict).toBe('too coarse');
    }
  });

  it('always says what the ratio was taken of', () => {
    for (const tool of [0.001, 0.2, 1]) expect(valueOf(gaugeFit(1, tool)).why).toContain(WHOLE_BAND);
  });

  it('never throws, and never answers with what is no number', () => {
    for (const bad of [...EXTREMES, ...NO_NUMBERS]) {
      expectSound(gaugeFit(bad, 1), /^(band|tool)$/);
      expectSound(gaugeFit(1, bad), /^tool$/);
    }
    for (const bad of [NaN, Infinity, 0, -1]) {
      expectRefused(gaugeFit(bad, 1), 'band');
      expectRefused(gaugeFit(1, bad), 'tool');
    }
    expectRefused(gaugeFit(1e308, 5e-324), 'tool');
  });
});

describe('gaugeFor', () => {
  it.each<[number, 'mm' | 'in', string | null, string | null]>([
    [0.02e-3, 'mm', '0.002 mm', '0.005 mm'],
    [0.05e-3, 'mm', '0.005 mm', '0.01 mm'],
    [0.2e-3, 'mm', '0.02 mm', '0.05 mm'],
    [1e-3, 'mm', '0.1 mm', '0.1 mm'],
    [0.002 * 0.0254, 'in', '0.0001 in', '0.0005 in'],
    [0.01 * 0.0254, 'in', '0.001 in', '0.001 in'],
    [0.0005e-3, 'mm', null, '0.0001 mm'],
    [1e-9, 'mm', null, null],
  ])('a band of %d m, tools in %s: ideal %s, least %s', (band, marked, ideal, least) => {
    const choice = valueOf(gaugeFor(band, marked));
    expect([choice.ideal?.text ?? null, choice.least?.text ?? null]).toEqual([ideal, least]);
  });

  it('names tools that gaugeFit then finds good, and the least is never finer than the ideal', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-8, max: 0.1, noNaN: true }),
        fc.constantFrom('mm' as const, 'in' as const),
        (band, marked) => {
          const { ideal, least } = valueOf(gaugeFor(band, marked));
          if (ideal) expect(valueOf(gaugeFit(band, ideal.resolution)).verdict).toBe('ideal');
          if (least) expect(valueOf(gaugeFit(band, least.resolution)).verdict).not.toBe('too coarse');
          if (ideal) expect(least?.resolution).toBeGreaterThanOrEqual(ideal.resolution);
        },
      ),
    );
  });

  it('never throws, and never answers with what is no number', () => {
    for (const bad of [...EXTREMES, ...NO_NUMBERS]) expectSound(gaugeFor(bad, 'mm'), /^band$/);
    for (const bad of ['', 'cm', 'toString', undefined]) expectRefused(gaugeFor(1, bad as 'mm'), 'marked');
    expectRefused(gaugeFor(0, 'mm'), 'band');
  });
});
