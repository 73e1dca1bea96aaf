import { describe, expect, it } from 'vitest';
import { bearingClearance } from '@/domain/worksheets/bearing-clearance/worksheet';
import { bore } from '@/domain/worksheets/bore/worksheet';
import { refusedBoxes, seen } from '../../factories/workedSheet';

describe('a bore', () => {
  const barrel = {
    'heights.0.thrust': '82.000',
    'heights.0.along': '82.000',
    'heights.1.thrust': '82.020',
    'heights.1.along': '82.018',
    'heights.2.thrust': '82.000',
    'heights.2.along': '82.000',
    'taper.max': '0.015',
  };

  it('passes its example and draws it', () => {
    const { verdict, reasons, outcome } = seen(bore, bore.example);
    expect(verdict).toBe('pass');
    expect(reasons).toContain('Piston clearance is 0.032 mm; 0.025 to 0.055 mm is allowed.');
    expect(outcome.charts[0]).toMatchObject({ kind: 'shape', heights: ['Top', 'Middle', 'Bottom'] });
  });

  it('judges a barrel by the way taper is taken', () => {
    expect(seen(bore, barrel)).toMatchObject({
      verdict: 'fail',
      reasons: ['Taper is 0.020 mm, too much: the most allowed is 0.015 mm.'],
    });
    expect(seen(bore, { ...barrel, taperRule: 'ends' })).toMatchObject({
      verdict: 'pass',
      reasons: ['Taper is 0.000 mm; the most allowed is 0.015 mm.'],
    });
  });

  it('names the smallest diameter where that is what fails', () => {
    const found = seen(bore, { ...barrel, 'taper.max': undefined, 'diameter.min': '82.005', 'diameter.max': '82.03' });
    expect(found.reasons).toEqual(['The smallest diameter is 82.000 mm, too little: 82.005 to 82.030 mm is allowed.']);
    expect(found.verdicts).toMatchObject({ smallest: 'fail', largest: undefined });
  });

  it('looks again at a piston that does not go in, and wants the piston where its clearance is judged', () => {
    expect(seen(bore, { ...barrel, 'taper.max': undefined, piston: '82.01' })).toMatchObject({
      verdict: 'look',
      reasons: ['The piston is larger than the smallest reading by 0.010 mm.'],
    });
    expect(refusedBoxes(bore, { ...barrel, 'clearance.min': '0.02' })).toEqual({
      piston: 'The piston clearance needs the diameter of the piston.',
    });
  });

  it('says what it found where there is no limit', () => {
    expect(seen(bore, { ...barrel, 'taper.max': undefined }).reasons).toEqual([
      'Taper is 0.020 mm, out-of-round 0.002 mm; no limit was given.',
    ]);
  });
});

describe('bearings', () => {
  const { example } = bearingClearance;

  it('names the bearing that fails, and why', () => {
    const found = seen(bearingClearance, example);
    expect(found.reasons).toEqual([
      'The oil clearance of bearing 3 is 0.050 mm, too much: 0.022 to 0.048 mm is allowed.',
      'The journal of bearing 3 is 51.978 mm, too little: 51.982 to 51.994 mm is allowed.',
      'End play is 0.13 mm; 0.06 to 0.20 mm is allowed.',
    ]);
    expect(found.results).toMatchObject({ 'sizes-least': '0.022 mm', 'sizes-greatest': '0.048 mm' });
  });

  it('says so in one sentence where all pass', () => {
    const found = seen(bearingClearance, { ...example, 'bearings.2.journal': '51.990' });
    expect(found).toMatchObject({ verdict: 'pass' });
    expect(found.reasons[0]).toBe('Every bearing is within its limits.');
  });

  it('forecasts by housing and shells, and judges the bore that they will make', () => {
    const built = {
      'bearings.0.bore': '56.022',
      'bearings.0.shell': '2',
      'bearings.0.journal': '51.990',
      'bore.max': '52.02',
    };
    const found = seen(bearingClearance, built);
    expect(found.results).toMatchObject({ 'clearance-1': '0.032 mm' });
    expect(found.reasons).toEqual(['The bore of bearing 1 is 52.022 mm, too much: the most allowed is 52.020 mm.']);
    expect(refusedBoxes(bearingClearance, { ...built, 'bearings.0.shell': '30' })).toEqual({
      'bearings.0.shell': 'The shell walls fill the whole housing bore.',
    });
  });

  it('wants both positions of the dial', () => {
    expect(refusedBoxes(bearingClearance, { ...example, back: undefined })).toEqual({
      back: 'End play needs the dial with the crankshaft pushed both ways.',
    });
    expect(seen(bearingClearance, { ...example, 'play.min': undefined, 'play.max': undefined }).reasons).toContain(
      'End play is 0.13 mm.',
    );
  });
});
