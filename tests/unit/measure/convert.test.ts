import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convert, isUnit, quantityOf, type Unit, unitsLike } from '@/domain/measure/convert';
import { UNITS_BY_QUANTITY } from '@/domain/measure/quantities';

const units = Object.values(UNITS_BY_QUANTITY).flat() as Unit[];
/** Units that only worksheets take, each with a value that is one of its partner. */
const ofWorksheets: readonly (readonly [Unit, Unit, number])[] = [
  ['cm', 'mm', 10],
  ['kgf·cm', 'kgf·m', 0.01],
  ['kW', 'hp', 1 / 0.74569987158227],
  ['g/kWh', 'lb/hp·h', 1 / 608.277387841811],
  ['g/cm³', 'kg/m³', 1000],
  ['mm²/s', 'mm²/s', 1],
];
const unit = fc.constantFrom(...units);
const kin = fc
  .constantFrom(...Object.values(UNITS_BY_QUANTITY))
  .chain((names) => fc.tuple(...[1, 2, 3].map(() => fc.constantFrom<Unit>(...names))));
const amount = fc.double({ min: 1e-6, max: 1e6, noNaN: true });

describe('convert', () => {
  it('knows every unit that a limit may be written in, under its quantity', () => {
    for (const [quantity, names] of Object.entries(UNITS_BY_QUANTITY))
      for (const name of names) {
        expect(isUnit(name), name).toBe(true);
        expect(quantityOf(name)).toBe(quantity);
      }
    expect(isUnit('furlong')).toBe(false);
    expect(isUnit('toString')).toBe(false);
  });

  it('knows the units of worksheets, which no limit is written in', () => {
    for (const [from, to, times] of ofWorksheets) {
      expect(units).not.toContain(from);
      expect(convert(1, from, to)).toEqual({ ok: true, value: expect.closeTo(times, 9) });
    }
    expect(quantityOf('hp')).toBe('power');
    expect(quantityOf('g/kWh')).toBe('fuel consumption');
    expect(unitsLike('lbf·in')).toEqual(['N·m', 'lbf·ft', 'lbf·in', 'kgf·m', 'kgf·cm']);
    expect(unitsLike('hp')).toEqual(['kW', 'hp']);
  });

  it('there and back is where it started', () => {
    fc.assert(
      fc.property(amount, kin, (value, [from, to]) => {
        const there = convert(value, from!, to!, 745);
        const back = there.ok ? convert(there.value, to!, from!, 745) : there;
        expect(back.ok && Math.abs(back.value - value)).toBeLessThan(1e-9 * Math.max(1, value));
      }),
    );
  });

  it('by way of a third unit is the same', () => {
    fc.assert(
      fc.property(amount, kin, (value, [a, b, c]) => {
        const direct = convert(value, a!, c!, 745);
        const first = convert(value, a!, b!, 745);
        const second = first.ok ? convert(first.value, b!, c!, 745) : first;
        expect(direct.ok && second.ok).toBe(true);
        if (direct.ok && second.ok)
          expect(Math.abs(second.value - direct.value)).toBeLessThan(1e-9 * Math.max(1, Math.abs(direct.value)));
      }),
    );
  });

  it('never lets one quantity become another', () => {
    fc.assert(
      fc.property(amount, unit, unit, (value, from, to) => {
        const result = convert(value, from, to);
        if (quantityOf(from) !== quantityOf(to)) expect(result.ok).toBe(false);
      }),
    );
  });

  it('converts temperatures as points on a scale', () => {
    expect(convert(50, '°C', '°F')).toEqual({ ok: true, value: expect.closeTo(122, 9) });
    expect(convert(-40, '°F', '°C')).toEqual({ ok: true, value: expect.closeTo(-40, 9) });
    expect(convert(-273.15, '°C', '°F')).toEqual({ ok: true, value: expect.closeTo(-459.67, 9) });
  });

  it('joins a volume flow and a mass flow by the density alone', () => {
    // 600 cc/min of 750 kg/m³ is 450 g/min, 7.5 g/s.
    expect(convert(600, 'cc/min', 'g/s', 750)).toEqual({ ok: true, value: expect.closeTo(7.5, 9) });
    expect(convert(7.5, 'g/s', 'mL/min', 750)).toEqual({ ok: true, value: expect.closeTo(600, 9) });
    expect(convert(1, 'g/s', 'lb/h').ok).toBe(true);
  });

  it.each<[number, Unit, Unit, number | undefined, string]>([
    [
      1,
      'cc/min',
      'lb/h',
      undefined,
      'cc/min to lb/h needs the density of the fluid, because one is a volume and the other a mass.',
    ],
    [1, 'cc/min', 'lb/h', 0, 'The density must be more than zero, in kg/m³.'],
    [NaN, 'N·m', 'lbf·in', undefined, 'The torque must be a number.'],
    [Infinity, 'mm', 'in', undefined, 'The length must be a number.'],
    [-1, 'N·m', 'lbf·in', undefined, 'A torque cannot be less than zero.'],
    [-274, '°C', '°F', undefined, 'A temperature cannot be below absolute zero, −273.15 °C.'],
    [1, 'N·m', 'mm', undefined, 'N·m measures torque and mm measures length; one cannot be turned into the other.'],
    [1, 'ell' as Unit, 'mm', undefined, '"ell" is no unit that the book knows.'],
    [1, 'mm', 'ell' as Unit, undefined, '"ell" is no unit that the book knows.'],
    [1e308, 'kN', 'lbf', undefined, 'The force is too large.'],
  ])('refuses %d %s to %s (density %s) in words', (value, from, to, density, message) => {
    expect(convert(value, from, to, density)).toEqual({ ok: false, message });
  });
});
