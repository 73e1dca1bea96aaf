import { describe, expect, it } from 'vitest';
import { bucketShim } from '@/domain/worksheets/bucket-shim/worksheet';
import { ringGap } from '@/domain/worksheets/ring-gap/worksheet';
import { refusedBoxes, seen } from '../../factories/workedSheet';

describe('ring gaps', () => {
  const { example } = ringGap;

  it('says how much to file, and nothing of the rings that pass', () => {
    expect(seen(ringGap, example).reasons).toEqual([
      'The top ring of cylinder 3 has a gap of 0.21 mm, too little: file 0.04 mm or more off its ends; 0.25 to 0.40 mm is allowed.',
    ]);
    expect(seen(ringGap, { ...example, 'cylinders.2.top': '0.30' })).toMatchObject({
      verdict: 'pass',
      reasons: ['All 8 rings that have a limit pass.'],
    });
  });

  it('does not file a ring that is too wide already', () => {
    expect(seen(ringGap, { 'cylinders.0.upper': '0.9', 'rail.max': '0.7' }).reasons).toEqual([
      'The upper rail of cylinder 1 has a gap of 0.90 mm, too much: the most allowed is 0.70 mm. Check the bore before you blame the ring.',
    ]);
  });

  it('looks again at a top ring under the factor of its maker, and lets a limit go before it', () => {
    const byFactor = { 'cylinders.0.top': '0.35', bore: '4 in', factor: '0.0040' };
    const found = seen(ringGap, byFactor);
    expect(found).toMatchObject({ verdict: 'look', results: { 'by-factor': '0.41 mm' } });
    expect(found.reasons).toEqual([
      'The top ring of cylinder 1 has a gap of 0.35 mm; by the factor it should have 0.41 mm or more.',
    ]);
    expect(seen(ringGap, { ...byFactor, 'top.min': '0.3' }).verdict).toBe('pass');
    expect(refusedBoxes(ringGap, { ...byFactor, bore: undefined })).toEqual({ bore: 'The factor needs the bore.' });
  });

  it('takes a gap to the bore it will run in', () => {
    const elsewhere = { 'cylinders.0.top': '0.30', measuredIn: '82.00', bore: '82.05', 'top.max': '0.4' };
    const found = seen(ringGap, elsewhere);
    expect(found).toMatchObject({ verdict: 'fail', results: { 'top-1': '0.46 mm' } });
    expect(seen(ringGap, { ...elsewhere, bore: '81.9', 'cylinders.0.top': '0.2' }).reasons).toEqual([
      'The ends of the top ring of cylinder 1 would meet: its gap of 0.20 mm loses 0.31 mm in the smaller bore.',
    ]);
    expect(refusedBoxes(ringGap, { ...elsewhere, bore: undefined })).toEqual({
      bore: 'Say which bore the rings will run in.',
    });
  });

  it('judges nothing without a limit', () => {
    expect(seen(ringGap, { 'cylinders.0.second': '0.45' })).toMatchObject({
      verdict: 'none',
      reasons: ['Worked out; no limit was given for these rings.'],
    });
  });
});

describe('bucket shims', () => {
  const { example } = bucketShim;
  const one = (side: string, lash: string, shim?: string) => ({
    ...Object.fromEntries(Object.entries(example).filter(([box]) => !box.startsWith('valves'))),
    'valves.0.side': side,
    'valves.0.lash': lash,
    ...(shim && { 'valves.0.shim': shim }),
  });

  it('names the shim to fit for each valve that is out, with the lash it gives', () => {
    const found = seen(bucketShim, example);
    expect(found.reasons).toEqual([
      'Valve 2, intake: the lash is 0.12 mm, too little; 0.17 to 0.23 mm is allowed. Fit 2.600 mm in place of 2.700 mm; the lash becomes 0.22 mm.',
      'Valve 3, exhaust: the lash is 0.35 mm, too much; 0.25 to 0.31 mm is allowed. Fit 2.750 mm in place of 2.700 mm; the lash becomes 0.30 mm.',
    ]);
    expect(found.results).toMatchObject({
      'thinner-lash-2': '0.22 mm',
      'thicker-lash-2': '0.17 mm',
      'exact-2': '2.620 mm',
    });
  });

  it('leaves a valve alone that passes', () => {
    expect(seen(bucketShim, one('intake', '0.20'))).toMatchObject({
      verdict: 'pass',
      reasons: ['Every lash that has a limit is within it.'],
    });
  });

  it('asks for the shim that is in where the valve is out', () => {
    expect(seen(bucketShim, one('intake', '0.12')).reasons).toEqual([
      'Valve 1, intake: the lash is 0.12 mm, too little; 0.17 to 0.23 mm is allowed. Give the shim that is in, the lash wanted and the stock to be told which shim to fit.',
    ]);
  });

  it('takes the middle of the limits where nobody says what is wanted', () => {
    const found = seen(bucketShim, { ...one('intake', '0.12', '2.70'), intakeWanted: undefined, 'intake.max': '0.25' });
    expect(found.results['exact-1']).toBe('2.610 mm');
  });

  it('sends an answer outside the stock back to the valve', () => {
    expect(seen(bucketShim, one('exhaust', '0.02', '2.25')).reasons[0]).toMatch(
      /It asks for 1\.990 mm, thinner than the stock: look for a sunk valve or a cut stem, and neither stack nor grind shims\.$/,
    );
  });

  it('says when the stock steps over the limits', () => {
    const coarse = { ...one('intake', '0.42', '2.70'), step: '0.2', 'stock.min': '2.2' };
    expect(seen(bucketShim, coarse).reasons[0]).toMatch(
      /which is still out of limits: the stock has no shim between\.$/,
    );
  });

  it('refuses a lash that leaves no shim, in the box that asks for it', () => {
    expect(refusedBoxes(bucketShim, { ...one('intake', '0.12', '0.05'), intakeWanted: '0.2' })).toEqual({
      intakeWanted: 'The lash wanted leaves no thickness for a shim.',
    });
  });
});
