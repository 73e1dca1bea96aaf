import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convert, type Unit } from '@/domain/measure/convert';
import { formatMeasure, formatNumber, inBothUnits } from '@/domain/measure/format';
import { UNITS_BY_QUANTITY } from '@/domain/measure/quantities';

describe('formatNumber', () => {
  it.each<[number, number | undefined, string]>([
    [10, undefined, '10'],
    [-0.5, undefined, '−0.5'],
    [0.1, 2, '0.10'],
    [1234, undefined, '1234'],
    [12345.5, undefined, '12\u202f345.5'],
    [1234567, 0, '1\u202f234\u202f567'],
    [1e-7, undefined, '0.0000001'],
    [-0.001, 2, '0.00'],
    [-0, undefined, '0'],
  ])('%d with %s places is %s', (value, places, text) => {
    expect(formatNumber(value, places)).toBe(text);
  });

  it('shows a number with all its digits where no places are asked for', () => {
    const number = fc.oneof(fc.double({ min: -1e9, max: 1e9, noNaN: true }), fc.constantFrom(0.1234567890123456, 1e9));
    fc.assert(
      fc.property(number, (value) => {
        fc.pre(value === 0 || Math.abs(value) > 1e-4);
        expect(
          Number(
            formatNumber(value)
              .replace(/\u202f/g, '')
              .replace('−', '-'),
          ),
        ).toBe(value + 0);
      }),
    );
  });

  it('refuses what is no number', () => {
    expect(() => formatNumber(NaN)).toThrow('The value to show must be a number.');
  });
});

describe('formatMeasure', () => {
  it.each<[number, Unit, number | undefined, string, string]>([
    [10, 'N·m', undefined, '10 N·m', '89 lbf·in'],
    [5, 'N·m', undefined, '5 N·m', '44 lbf·in'],
    [1.2, 'N·m', undefined, '1.2 N·m', '10.6 lbf·in'],
    [27, 'N·m', undefined, '27 N·m', '239 lbf·in'],
    [27.2, 'N·m', undefined, '27.2 N·m', '20 lbf·ft'],
    [28, 'N·m', undefined, '28 N·m', '20.5 lbf·ft'],
    [100, 'N·m', undefined, '100 N·m', '74 lbf·ft'],
    [1.5, 'kgf·m', undefined, '14.7 N·m', '130 lbf·in'],
    [15, 'lbf·ft', undefined, '20.5 N·m', '15 lbf·ft'],
    [0.041, 'mm', undefined, '0.041 mm', '0.0016 in'],
    [0.2, 'mm', 0.01, '0.20 mm', '0.0079 in'],
    [3, 'mm', 0.05, '3.00 mm', '0.118 in'],
    [58, 'mm', 1, '58 mm', '2.28 in'],
    [-0.1, 'mm', 0.01, '−0.10 mm', '−0.0039 in'],
    [20, 'µm', 1, '20 µm', '0.0008 in'],
    [0.0016, 'in', undefined, '0.041 mm', '0.0016 in'],
    [1.6, 'thou', 0.1, '0.041 mm', '1.6 thou'],
    [50, '°C', undefined, '50 °C', '122 °F'],
    [-5, '°C', 1, '−5 °C', '23 °F'],
    [88, '°C', 0.5, '88.0 °C', '190.4 °F'],
    [3, 'bar', undefined, '3 bar', '43.5 psi'],
    [1200, 'kPa', 50, '1200 kPa', '174 psi'],
    [4.2, 'L', undefined, '4.2 L', '4.4 US qt'],
    [350, 'mL', undefined, '350 mL', '350 mL'],
    [620, 'cc/min', undefined, '620 cc/min', '620 cc/min'],
    [90, '°', undefined, '90°', '90°'],
    [9.5, ':1', undefined, '9.5:1', '9.5:1'],
    [12000, 'rpm', undefined, '12\u202f000 rpm', '12\u202f000 rpm'],
    [-300, '°C', undefined, '−300 °C', '−300 °C'],
  ])('%d %s, tool %s: %s, %s', (value, unit, resolution, metric, inch) => {
    expect(formatMeasure(value, unit, resolution)).toEqual({ metric, inch });
  });

  it('gives values that stand together one unit and one fineness', () => {
    expect(inBothUnits([10, 1], 'N·m').inch).toEqual({ numbers: ['89', '9'], unit: 'lbf·in' });
    expect(inBothUnits([0.1, 0.15], 'mm').metric).toEqual({ numbers: ['0.10', '0.15'], unit: 'mm' });
    expect(inBothUnits([0.041, 0.109], 'mm').inch).toEqual({ numbers: ['0.0016', '0.0043'], unit: 'in' });
    expect(inBothUnits([25, 30], 'N·m').inch).toEqual({ numbers: ['18.5', '22'], unit: 'lbf·ft' });
  });

  it('rounds once, from the stored value, not from the text of the other system', () => {
    // 0.0445 mm reads 0.05 mm with a tool of 0.01; going on from 0.05 would give 0.0020 in.
    expect(formatMeasure(0.0455, 'mm', 0.01)).toEqual({ metric: '0.05 mm', inch: '0.0018 in' });
  });

  it('shows a number within half a step of the true one, for every unit', () => {
    const units = Object.values(UNITS_BY_QUANTITY).flat() as Unit[];
    fc.assert(
      fc.property(fc.constantFrom(...units), fc.double({ min: 0.01, max: 5000, noNaN: true }), (unit, value) => {
        const { metric, inch } = inBothUnits([value], unit);
        for (const text of [metric, inch]) {
          const exact = convert(value, unit, text.unit);
          const shown = Number(text.numbers[0]!.replace(/\u202f/g, '').replace('\u2212', '-'));
          // Degrees and lbf·in are read to the whole; the wrench in lbf·in has no finer marks.
          const finest = ['°F', '°C', 'lbf·in'].includes(text.unit) ? 0.5 : 0.05;
          expect(exact.ok && Math.abs(shown - exact.value)).toBeLessThanOrEqual(
            Math.max(finest, 0.0126 * (exact.ok ? Math.abs(exact.value) : 0)) + 1e-9,
          );
        }
      }),
    );
  });
});
