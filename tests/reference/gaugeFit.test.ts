import { describe, expect, it } from 'vitest';
import { gaugeFit, gaugeFor } from '@/domain/measure/gaugeFit';
import { valueOf } from '../factories/measures';

const MM = 1e-3;

describe('tolerance against tool', () => {
  it.each([
    // 10:1 by the National Physical Laboratory (seen) and MIL-M-45945A (seen), 4:1 by MIL-STD-1839 as quoted in
    // MIL-HDBK-1839 (seen); the numbers are computed from those ratios.
    [0.025, 0.0025, 10, 'ideal'],
    [0.025, 0.00625, 4, 'enough'],
    [0.025, 0.01, 2.5, 'too coarse'],
  ])('a band of %d mm and a tool of %d mm: %d to 1, %s', (band, tool, ratio, verdict) => {
    const fit = valueOf(gaugeFit(band * MM, tool * MM));
    expect(fit.ratio).toBeCloseTo(ratio, 9);
    expect(fit.verdict).toBe(verdict);
  });

  it('20 ± 0.05 mm is a band of 0.1 mm and asks for 0.01 mm (1:10 rule in a secondary page, quoted)', () => {
    expect(valueOf(gaugeFor(0.1 * MM, 'mm')).ideal).toEqual({ resolution: expect.closeTo(1e-5, 15), text: '0.01 mm' });
  });
});
