import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convert, type Unit } from '@/domain/measure/convert';
import { agreement, readQuantities, sayQuantity, type ReadMeasure } from '@/domain/search/quantities';

const only = (text: string): ReadMeasure => {
  const read = readQuantities(text);
  expect(read, text).toHaveLength(1);
  const [first] = read;
  if (first?.kind !== 'measure') throw new Error(`${text} is no measure`);
  return first;
};

describe('reading measures', () => {
  it.each<[string, number, Unit]>([
    ['89 lbf·in', 89, 'lbf·in'],
    ['89 lbf in', 89, 'lbf·in'],
    ['89 in-lb', 89, 'lbf·in'],
    ['89 in lbs', 89, 'lbf·in'],
    ['89 inch pounds', 89, 'lbf·in'],
    ['89lb-in', 89, 'lbf·in'],
    ['7.4 ft lb', 7.4, 'lbf·ft'],
    ['7.4 lb-ft', 7.4, 'lbf·ft'],
    ['7.4 lbf.ft', 7.4, 'lbf·ft'],
    ['7.4 foot-pounds', 7.4, 'lbf·ft'],
    ['10nm', 10, 'N·m'],
    ['10 N·m', 10, 'N·m'],
    ['10 N m', 10, 'N·m'],
    ['10 newton metres', 10, 'N·m'],
    ['10,5 Nm', 10.5, 'N·m'],
    ['1.02 kgf m', 1.02, 'kgf·m'],
    ['1.02 kg-m', 1.02, 'kgf·m'],
    ['102 kgf·cm', 1.02, 'kgf·m'],
    ['0.35 mm', 0.35, 'mm'],
    ['.35mm', 0.35, 'mm'],
    ['14 thou', 14, 'thou'],
    ['.014"', 0.014, 'in'],
    ['0.014 in', 0.014, 'in'],
    ['35 µm', 35, 'µm'],
    ['35 microns', 35, 'µm'],
    ['43 psi', 43, 'psi'],
    ['3 bar', 3, 'bar'],
    ['300 kPa', 300, 'kPa'],
    ['82°C', 82, '°C'],
    ['180 deg f', 180, '°F'],
    ['90 degrees', 90, '°'],
    ['4.2 litres', 4.2, 'L'],
    ['4 quarts', 4, 'US qt'],
    ['250 cc/min', 250, 'cc/min'],
    ['850 rpm', 850, 'rpm'],
    ['12.6 V', 12.6, 'V'],
    ['24 h', 24, 'h'],
    ['2 %', 2, '%'],
  ])('reads %s', (text, value, unit) => {
    const read = only(`cover ${text} bolt`);
    expect(read.unit).toBe(unit);
    expect(read.value).toBeCloseTo(value, 9);
    expect(only(text)).toMatchObject({ unit });
  });

  it('reads threads, with and without a pitch', () => {
    expect(readQuantities('m6 bolt')).toMatchObject([{ kind: 'thread', thread: 'M6' }]);
    expect(readQuantities('M6x1')).toMatchObject([{ thread: 'M6×1.0' }]);
    expect(readQuantities('M10×1.25 head')).toMatchObject([{ thread: 'M10×1.25' }]);
    expect(readQuantities('1/4-20 unc')).toMatchObject([{ thread: '1/4-20 UNC' }]);
  });

  it('reads a span as both ends', () => {
    expect(only('8-10 Nm')).toMatchObject({ low: 8, high: 10, unit: 'N·m' });
    expect(only('0.20 to 0.30 mm')).toMatchObject({ low: 0.2, high: 0.3, unit: 'mm' });
  });

  it('leaves words, part numbers and procedure numbers alone', () => {
    for (const text of [
      'valve cover',
      'p142',
      'P-0142',
      'TN-4102',
      't18f',
      '4 cylinder',
      'b3',
      '3 inlet valves',
      'fit in 2 goes',
    ])
      expect(readQuantities(text), text).toEqual([]);
  });

  it('reads several in one query', () => {
    expect(readQuantities('10 Nm M6 cover 0.35 mm').map((read) => sayQuantity(read, 'metric'))).toEqual([
      '10 N·m',
      'M6',
      '0.35 mm',
    ]);
  });
});

describe('agreement with a value of the book', () => {
  it.each([
    ['89 lbf·in', 10, 'N·m'],
    ['7.4 ft lb', 10, 'N·m'],
    ['7 ft lb', 10, 'N·m'],
    ['1.02 kgf m', 10, 'N·m'],
    ['14 thou', 0.35, 'mm'],
    ['.014"', 0.35, 'mm'],
    ['43.5 psi', 300, 'kPa'],
  ] as const)('%s is %d %s', (text, value, unit) => {
    expect(agreement(only(text), value, unit)).toBeGreaterThan(0);
  });

  it.each([
    ['10 Nm', 10.4, 'N·m'],
    ['89 lbf·in', 12, 'N·m'],
    ['89 lbf·ft', 10, 'N·m'],
    ['10 Nm', 10, 'mm'],
    ['14 thou', 0.4, 'mm'],
  ] as const)('%s is not %d %s', (text, value, unit) => {
    expect(agreement(only(text), value, unit)).toBe(0);
  });

  it('prefers the nearer value', () => {
    const read = only('7 ft lb');
    expect(agreement(read, 9.5, 'N·m')).toBeGreaterThan(agreement(read, 10, 'N·m'));
  });

  it('finds any torque again from its text in any unit, to three digits', () => {
    const units: Unit[] = ['N·m', 'lbf·ft', 'lbf·in', 'kgf·m'];
    const written: Partial<Record<Unit, string[]>> = {
      'N·m': ['N·m', 'Nm', 'n m'],
      'lbf·ft': ['ft lb', 'lb-ft', 'lbf·ft'],
      'lbf·in': ['in-lb', 'lbf in', 'lb.in'],
      'kgf·m': ['kgf·m', 'kgm', 'kg-m'],
    };
    fc.assert(
      fc.property(
        fc.integer({ min: 4, max: 8000 }),
        fc.constantFrom(...units),
        fc.integer({ min: 0, max: 2 }),
        (quarter, unit, spelling) => {
          const nm = quarter / 4;
          const there = convert(nm, 'N·m', unit);
          if (!there.ok) throw new Error(there.message);
          const read = only(`${String(Number(there.value.toPrecision(3)))} ${written[unit]?.[spelling] ?? unit}`);
          expect(read.unit).toBe(unit);
          expect(agreement(read, nm, 'N·m')).toBeGreaterThan(0);
          expect(agreement(read, nm * 1.08 + 1, 'N·m')).toBe(0);
        },
      ),
    );
  });
});

describe('saying what was read', () => {
  it('speaks the reader’s units to the digits typed', () => {
    expect(sayQuantity(only('89 lbf in'), 'metric')).toBe('10 N·m');
    expect(sayQuantity(only('7.4 ft lb'), 'metric')).toBe('10 N·m');
    expect(sayQuantity(only('10 Nm'), 'metric')).toBe('10 N·m');
    expect(sayQuantity(only('10 Nm'), 'inch')).toBe('89 lbf·in');
    expect(sayQuantity(only('14 thou'), 'metric')).toBe('0.36 mm');
    expect(sayQuantity(only('8-10 Nm'), 'metric')).toBe('8 to 10 N·m');
  });
});
