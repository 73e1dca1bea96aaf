import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { factorOfGap, gapByFactor, gapChange, gapElsewhere, judgeRingGaps } from '@/domain/measure/rings';
import { sweep } from '../../factories/hostileNumbers';
import { between, MM, relative, valueOf } from '../../factories/measures';

const band = { min: 0.25 * MM, max: 0.4 * MM };
const mm = (...values: number[]) => values.map((value) => value * MM);

describe('ring gaps', () => {
  it('says which pass and how much is to be filed off one that is tight', () => {
    const found = valueOf(judgeRingGaps({ gaps: mm(0.3, 0.21, 0.25, 0.4, 0.45), band }));
    expect(found.gaps.map((one) => one.judged?.at)).toEqual(['in', 'under', 'in', 'in', 'over']);
    expect(found.gaps[1]?.judged?.by).toBeCloseTo(0.04 * MM, 12);
    expect(found).toMatchObject({ smallest: 0.21 * MM, largest: 0.45 * MM, passes: false });
  });

  it('judges nothing without a limit', () => {
    expect(valueOf(judgeRingGaps({ gaps: mm(0.3) }))).toMatchObject({ gaps: [{ judged: null }], passes: true });
  });

  it('never passes a gap that lies further out than one that fails', () => {
    const at = (gap: number) => valueOf(judgeRingGaps({ gaps: [gap], band })).passes;
    fc.assert(
      fc.property(between(0, 1e-3), between(0, 1e-3), (gap, further) => {
        if (gap > band.max && !at(gap)) expect(at(gap + further)).toBe(false);
        if (gap < band.min && !at(gap)) expect(at(Math.max(0, gap - further))).toBe(false);
      }),
    );
  });

  it('withstands odd input', () => sweep(judgeRingGaps, { gaps: mm(0.3, 0.35), band }));
});

describe('gaps by the bore', () => {
  it('there and back again is where it started', () => {
    fc.assert(
      fc.property(
        between(0.03, 0.3),
        between(0.001, 0.02),
        between(1e-4, 1e-3),
        between(-1e-4, 1e-4),
        (bore, f, gap, d) => {
          expect(relative(valueOf(factorOfGap(valueOf(gapByFactor(bore, f)), bore)), f)).toBeLessThan(1e-12);
          const there = valueOf(gapElsewhere({ gap, measuredIn: bore, runsIn: bore + d }));
          expect(Math.abs(there - gap - valueOf(gapChange(d)))).toBeLessThan(1e-15);
          fc.pre(there >= 0);
          const back = valueOf(gapElsewhere({ gap: there, measuredIn: bore + d, runsIn: bore }));
          expect(Math.abs(back - gap)).toBeLessThan(1e-12);
        },
      ),
    );
  });

  it('shows ends that meet as less than zero', () => {
    expect(valueOf(gapElsewhere({ gap: 0.1 * MM, measuredIn: 82 * MM, runsIn: 81.9 * MM }))).toBeCloseTo(-0.000214, 6);
  });

  it('refuses a factor in thousandths', () => {
    expect(gapByFactor(0.1016, 4)).toEqual({
      ok: false,
      problems: [{ field: 'factor', message: 'The factor must be 0.1 or less.' }],
    });
  });

  it('withstands odd input', () => {
    sweep(({ bore, factor }: { bore: number; factor: number }) => gapByFactor(bore, factor), {
      bore: 0.1,
      factor: 0.004,
    });
    sweep(({ gap, bore }: { gap: number; bore: number }) => factorOfGap(gap, bore), { gap: 4e-4, bore: 0.1 });
    sweep(({ boreChange }: { boreChange: number }) => gapChange(boreChange), { boreChange: -1e-5 });
    sweep(gapElsewhere, { gap: 3e-4, measuredIn: 0.082, runsIn: 0.08201 });
  });
});
