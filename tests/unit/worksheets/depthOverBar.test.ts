import { describe, expect, it } from 'vitest';
import { depthOverBar } from '@/domain/worksheets/depth-over-bar/worksheet';
import { refusedBoxes, seen } from '../../factories/workedSheet';

const { example } = depthOverBar;
const one = { bar: '25.4', reading: '53.4', 'distance.min': '24', 'distance.max': '32' };

describe('depth over a bar', () => {
  it('takes one bar off each reading, and adds what is left', () => {
    const found = seen(depthOverBar, example);
    expect(found.verdict).toBe('pass');
    expect(found.reasons).toEqual([
      'The distance is 13.00 mm; 12.00 to 14.00 mm is allowed.',
      'The distance from the other face is 28.00 mm; 24.00 to 32.00 mm is allowed.',
      'Both distances together are 41.00 mm; 36.00 to 46.00 mm is allowed.',
    ]);
    expect(found.results).toMatchObject({ 'distance-mistaken': '38.40 mm', 'facing-mistaken': '53.40 mm' });
  });

  it('says when only a forgotten bar would pass', () => {
    const found = seen(depthOverBar, { ...one, reading: '28' });
    expect(found.verdict).toBe('fail');
    expect(found.reasons).toEqual([
      'The distance is 2.60 mm, too little: 24.00 to 32.00 mm is allowed.',
      'With the bar left in, the distance would come to 28.00 mm and seem to pass.',
    ]);
  });

  it('says when only a bar taken off twice would pass', () => {
    expect(seen(depthOverBar, { ...one, from: 'face' }).reasons).toEqual([
      'The distance is 53.40 mm, too much: 24.00 to 32.00 mm is allowed.',
      'With the bar taken off a second time, the distance would come to 28.00 mm and seem to pass.',
    ]);
  });

  it('says when one bar left in would make the whole joint seem to pass', () => {
    const found = seen(depthOverBar, {
      bar: '25.4',
      reading: '38.4',
      facing: '28',
      'total.min': '36',
      'total.max': '46',
    });
    expect(found.reasons).toEqual([
      'Both distances together are 15.60 mm, too little: 36.00 to 46.00 mm is allowed.',
      'With the bar left in, both together would come to 41.00 mm and seem to pass.',
    ]);
  });

  it('counts upward for a part that stands proud, and takes the zero of the gauge off', () => {
    const proud = { bar: '25.4', reading: '25.15', direction: 'above' };
    const { results, outcome } = seen(depthOverBar, proud);
    expect(results['distance']).toBe('0.25 mm');
    expect(outcome.results[0]?.formula?.metric).toBe('bar − (reading) = 25.40 mm − (25.15 mm) = 0.25 mm');
    expect(seen(depthOverBar, { ...proud, zero: '0.02' }).results['distance']).toBe('0.27 mm');
    expect(seen(depthOverBar, { ...one, zero: '-0.02' }).results['distance']).toBe('28.02 mm');
  });

  it('judges the bar as well', () => {
    const found = seen(depthOverBar, { ...one, 'thickness.min': '25.38', 'thickness.max': '25.42', bar: '25.5' });
    expect(found.reasons[0]).toBe('The bar is 25.50 mm, too much: 25.38 to 25.42 mm is allowed.');
  });

  it('says what it did where there is no limit', () => {
    expect(seen(depthOverBar, { bar: '1 in', reading: '53.4' })).toMatchObject({
      verdict: 'none',
      reasons: ['The bar of 25.40 mm is taken off.'],
    });
  });

  it.each(['total.min', 'facingDistance.min'])(
    'judges one reading alone, but lets it not pass for the whole (%s)',
    (limit) => {
      expect(seen(depthOverBar, { ...one, [limit]: '20' })).toMatchObject({
        verdict: 'look',
        reasons: [
          'The reading from the face that meets it is missing, so what lies between the two is not known yet.',
          'The distance is 28.00 mm; 24.00 to 32.00 mm is allowed.',
        ],
      });
      expect(seen(depthOverBar, { ...one, reading: '28', [limit]: '20' }).verdict).toBe('fail');
    },
  );

  it.each([
    [
      { ...one, facing: '30', direction: 'above' },
      'direction',
      'Two depths add up over a joint only where both lie below their faces.',
    ],
    [{ ...one, reading: '-1' }, 'reading', 'The reading cannot be less than zero.'],
    [{ ...one, bar: undefined }, 'bar', 'Thickness of the bar is missing.'],
  ])('refuses %j', (filled, box, message) => {
    expect(refusedBoxes(depthOverBar, filled)).toMatchObject({ [box]: message });
  });
});
