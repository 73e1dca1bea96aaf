import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  chamberForRatio,
  compressionRatio,
  deckClearance,
  type CylinderVolumes,
} from '@/domain/measure/compressionRatio';
import { sweep } from '../../factories/hostileNumbers';
import { between, MM, relative, valueOf } from '../../factories/measures';

const cc = 1e-6;
const cylinder: CylinderVolumes = {
  bore: 82 * MM,
  stroke: 85 * MM,
  chamber: 42 * cc,
  gasketBore: 83 * MM,
  gasketThickness: 0.8 * MM,
  deckClearance: 0.2 * MM,
  pistonVolume: 3 * cc,
};
const any = fc.record({
  bore: between(0.05, 0.15),
  stroke: between(0.05, 0.15),
  chamber: between(20 * cc, 200 * cc),
  gasketBore: between(0.05, 0.15),
  gasketThickness: between(0, 2 * MM),
  deckClearance: between(0, 2 * MM),
  pistonVolume: between(-10 * cc, 20 * cc),
});

describe('compression ratio', () => {
  it('adds up what is left above the piston', () => {
    const found = valueOf(compressionRatio(cylinder));
    expect(found.swept / cc).toBeCloseTo(448.8863, 3);
    expect(found.gasket / cc).toBeCloseTo(4.3285, 3);
    expect(found.deck / cc).toBeCloseTo(1.0562, 3);
    expect(found.clearance / cc).toBeCloseTo(50.3847, 3);
    expect(found.ratio).toBeCloseTo(9.9092, 3);
    expect(found.squish / MM).toBeCloseTo(1, 9);
  });

  it('falls with a larger chamber, a thicker gasket, a lower piston, a deeper dish', () => {
    const names = ['chamber', 'gasketThickness', 'deckClearance', 'pistonVolume'] as const;
    fc.assert(
      fc.property(any, fc.constantFrom(...names), between(0, 1), (volumes, name, share) => {
        const more = { ...volumes, [name]: volumes[name] + share * (name.endsWith('e') ? 5 * MM : 5 * cc) };
        const before = valueOf(compressionRatio(volumes)).ratio;
        expect(valueOf(compressionRatio(more)).ratio).toBeLessThanOrEqual(before);
      }),
    );
  });

  it('gives the chamber back', () => {
    fc.assert(
      fc.property(any, (volumes) => {
        const { ratio } = valueOf(compressionRatio(volumes));
        fc.pre(ratio <= 100);
        const { chamber, ...rest } = volumes;
        const back = chamberForRatio(ratio, rest);
        expect(Math.abs(valueOf(back) - chamber)).toBeLessThan(1e-12);
        expect(relative(valueOf(compressionRatio({ ...rest, chamber: valueOf(back) })).ratio, ratio)).toBeLessThan(
          1e-12,
        );
      }),
    );
  });

  it('takes a piston that stands proud, and refuses a dome that fills the head', () => {
    const proud = valueOf(compressionRatio({ ...cylinder, deckClearance: -0.2 * MM }));
    expect(proud.deck).toBeLessThan(0);
    expect(proud.squish / MM).toBeCloseTo(0.6, 9);
    expect(compressionRatio({ ...cylinder, pistonVolume: -60 * cc })).toEqual({
      ok: false,
      problems: [{ field: 'pistonVolume', message: 'These volumes leave no room above the piston.' }],
    });
    expect(chamberForRatio(90, cylinder)).toEqual({
      ok: false,
      problems: [{ field: 'ratio', message: 'This ratio would need a combustion chamber of less than nothing.' }],
    });
    expect(chamberForRatio(1, cylinder)).toMatchObject({
      problems: [{ field: 'ratio', message: 'The compression ratio must be more than 1:1.' }],
    });
  });

  it('withstands odd input', () => {
    sweep(compressionRatio, cylinder);
    const { chamber: _, ...rest } = cylinder;
    sweep(({ ratio, ...others }: typeof rest & { ratio: number }) => chamberForRatio(ratio, others), {
      ratio: 9.5,
      ...rest,
    });
  });
});

describe('deck clearance', () => {
  const parts = { blockHeight: 220 * MM, stroke: 85 * MM, rodLength: 145 * MM, pinHeight: 32.3 * MM };

  it('is what the parts leave', () => {
    expect(valueOf(deckClearance(parts)) / MM).toBeCloseTo(0.2, 9);
    expect(valueOf(deckClearance({ ...parts, rodLength: 145.5 * MM })) / MM).toBeCloseTo(-0.3, 9);
  });

  it('withstands odd input', () => sweep(deckClearance, parts));
});
