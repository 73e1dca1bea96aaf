import { describe, expect, it } from 'vitest';
import { compressionRatio } from '@/domain/worksheets/compression-ratio/worksheet';
import { flatness } from '@/domain/worksheets/flatness/worksheet';
import { refusedBoxes, seen } from '../../factories/workedSheet';

describe('flatness', () => {
  it('holds each direction against its own limit, else against that for all', () => {
    const found = seen(flatness, flatness.example);
    expect(found.reasons).toEqual(['Gap 4, diagonally, is 0.06 mm, too much: the most allowed is 0.05 mm.']);
    expect(found.verdicts).toEqual({ along: 'pass', across: 'pass', diagonal: 'fail' });
    const across = { ...flatness.example, 'gaps.3.gap': '0.05', 'gaps.4.gap': '0.04' };
    expect(seen(flatness, across).reasons).toEqual([
      'Gap 5, across, is 0.04 mm, too much: the most allowed is 0.03 mm.',
    ]);
    expect(seen(flatness, { ...across, 'gaps.4.gap': '0.03' }).reasons).toEqual([
      'Every gap is within its limits; the largest is 0.05 mm.',
    ]);
  });

  it('tells a short dip from a long bow', () => {
    const local = { 'local.max': '0.05', over: '150', 'gaps.0.gap': '0.06' };
    expect(seen(flatness, { ...local, 'gaps.0.span': '120' })).toMatchObject({
      verdict: 'fail',
      reasons: ['Gap 1 is 0.06 mm between rests 120 mm apart, too much: 0.05 mm in 150 mm is the most allowed.'],
    });
    expect(seen(flatness, { ...local, 'gaps.0.span': '400' })).toMatchObject({
      verdict: 'look',
      reasons: [
        'Gap 1 is 0.06 mm between rests 400 mm apart; 0.05 mm in 150 mm is the most allowed. Go along it with a straightedge of 150 mm or less to tell.',
      ],
      verdicts: { along: 'look' },
    });
    expect(refusedBoxes(flatness, local)).toEqual({ 'gaps.0.span': 'The span of gap 1 must be a number.' });
    expect(refusedBoxes(flatness, { ...local, over: undefined })).toEqual({
      over: 'Say how long the stretch of the limit is.',
    });
    expect(refusedBoxes(flatness, { 'gaps.0.gap': '0.06', 'local.min': '0.1' })).toEqual({
      'local.max': 'Allowed in any stretch: give the most.',
    });
  });

  it('takes heights on a plate, however the face was levelled', () => {
    const corners = (heights: string[]) =>
      Object.fromEntries(
        heights.flatMap((height, place) => [
          [`points.${place}.x`, String((place % 2) * 200)],
          [`points.${place}.y`, String(Math.floor(place / 2) * 200)],
          [`points.${place}.height`, height],
        ]),
      );
    const found = seen(flatness, { ...corners(['0', '0', '0', '0.08']), 'whole.max': '0.05' });
    expect(found).toMatchObject({
      verdict: 'pass',
      results: { plane: '0.040 mm', 'point-1': '0.020 mm' },
      reasons: ['By the heights, the face is out of flat by 0.040 mm; the most allowed is 0.050 mm.'],
    });
    expect(seen(flatness, corners(['0', '1', '2', '3.08'])).results['plane']).toBe('0.040 mm');
    expect(refusedBoxes(flatness, corners(['0', '0', '0']))).toEqual({
      points: 'The places must hold 4 places or more.',
    });
  });

  it('wants one or the other', () => {
    expect(refusedBoxes(flatness, { 'every.max': '0.05' })).toEqual({
      'gaps.0.gap': 'Fill in a gap under the straightedge, or heights on a plate.',
    });
  });
});

describe('compression ratio', () => {
  const { example } = compressionRatio;

  it('works out the ratio, what is left above the piston, and the chamber for another ratio', () => {
    const found = seen(compressionRatio, example);
    expect(found).toMatchObject({
      verdict: 'none',
      results: { ratio: '9.91:1', clearance: '50.4 cm³', squish: '1.00 mm', 'chamber-wanted': '38.9 cm³' },
      reasons: [
        'The compression ratio is 9.91:1.',
        'For 10.5:1 the chamber must hold 38.9 cm³: 3.1 cm³ less than it does.',
      ],
    });
    expect(seen(compressionRatio, { ...example, wanted: '9.0:1' }).reasons[1]).toBe(
      'For 9:1 the chamber must hold 47.7 cm³: 5.7 cm³ more than it does.',
    );
    expect(seen(compressionRatio, { ...example, wanted: '9.9092' }).reasons[1]).toContain('42.0 cm³, as it does.');
  });

  it('judges by a limit where there is one', () => {
    expect(seen(compressionRatio, { ...example, wanted: undefined, 'ratio.max': '9.5' })).toMatchObject({
      verdict: 'fail',
      reasons: ['The compression ratio is 9.91:1, too much: the most allowed is 9.50:1.'],
    });
  });

  it('works the deck clearance out of the parts, and lets a measured one go before', () => {
    const parts = { blockHeight: '220', rodLength: '145', pinHeight: '32.3' };
    const found = seen(compressionRatio, { ...example, ...parts, deck: undefined });
    expect(found.results).toMatchObject({ ratio: '9.91:1', 'deck-by-parts': '0.20 mm' });
    expect(seen(compressionRatio, { ...example, ...parts, deck: '0.5' }).results['squish']).toBe('1.30 mm');
  });

  it('counts a dome against a dish, and a piston that stands proud with a minus', () => {
    const ratio = (typed: Record<string, string>) =>
      Number(seen(compressionRatio, { ...example, ...typed }).outcome.results[0]?.value);
    expect(ratio({ crown: 'dome' })).toBeGreaterThan(ratio({ crown: 'flat' }));
    expect(ratio({ crown: 'flat' })).toBeGreaterThan(ratio({ crown: 'dish' }));
    expect(ratio({ deck: '-0.2' })).toBeGreaterThan(ratio({ deck: '0.2' }));
  });

  it('looks again at a piston that would meet a flat head', () => {
    expect(seen(compressionRatio, { ...example, deck: '-0.9' })).toMatchObject({
      verdict: 'look',
      reasons: [
        'A flat crown would stand 0.10 mm above the face of the gasket and meet a flat head.',
        expect.any(String),
        expect.any(String),
      ],
    });
    expect(seen(compressionRatio, { ...example, deck: '-0.7' }).verdict).toBe('none');
  });

  it.each([
    [{ deck: undefined }, 'deck', 'Give the deck clearance, or block, rod and piston heights to work it out from.'],
    [{ crownVolume: undefined }, 'crownVolume', 'Say how large the dish is.'],
    [{ crown: 'dome', crownVolume: '60' }, 'crownVolume', 'These volumes leave no room above the piston.'],
    [{ wanted: '90' }, 'wanted', 'This ratio would need a combustion chamber of less than nothing.'],
  ])('refuses %j', (typed, box, message) => {
    expect(refusedBoxes(compressionRatio, { ...example, ...typed })).toEqual({ [box]: message });
  });
});
