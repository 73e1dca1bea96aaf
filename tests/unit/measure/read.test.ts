import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { quantityOf, toBase, type Unit } from '@/domain/measure/convert';
import { formatNumber, withUnit } from '@/domain/measure/format';
import { UNITS_BY_QUANTITY } from '@/domain/measure/quantities';
import { readAny, readTyped, type ReadTyped, type Typed } from '@/domain/measure/read';
import { relative } from '../../factories/measures';

const UNITS: readonly Unit[] = [...Object.values(UNITS_BY_QUANTITY).flat(), 'lb'];
/** Quantities that can stand below zero. */
const SIGNED = ['length', 'angle', 'force', 'pressure', 'temperature', 'voltage', 'current', 'share'];

function valueOf(read: ReadTyped): Typed {
  if (!read.ok) throw new Error(read.message);
  return read.value;
}
const messageOf = (read: ReadTyped): string => {
  expect(read.ok).toBe(false);
  return read.ok ? '' : read.message;
};

describe('a measure as people type it', () => {
  // Amount and unit as they stand in the text; the factors themselves are checked against their source in convert.test.ts.
  it.each<[text: string, box: Unit, amount: number, unit: Unit, named: boolean]>([
    ['0.35 mm', 'mm', 0.35, 'mm', true],
    ['0.35mm', 'mm', 0.35, 'mm', true],
    ['0,35', 'mm', 0.35, 'mm', false],
    ['.35', 'mm', 0.35, 'mm', false],
    ['5.', 'mm', 5, 'mm', false],
    ['5. mm', 'mm', 5, 'mm', true],
    ['14 thou', 'mm', 14, 'thou', true],
    ['.014"', 'mm', 0.014, 'in', true],
    ['5 in.', 'mm', 5, 'in', true],
    ['1 3/8 in', 'mm', 1.375, 'in', true],
    ['1-3/8 in', 'mm', 1.375, 'in', true],
    ['1/4"', 'mm', 0.25, 'in', true],
    ['1½ in', 'mm', 1.5, 'in', true],
    ['⅜', 'in', 0.375, 'in', false],
    ['-1 1/2 mm', 'mm', -1.5, 'mm', true],
    ['5 cm', 'mm', 50, 'mm', true],
    ['35 µm', 'mm', 35, 'µm', true],
    ['35 microns', 'mm', 35, 'µm', true],
    ['−5 °C', '°C', -5, '°C', true],
    ['–5', '°C', -5, '°C', false],
    ['+5 c', '°C', 5, '°C', true],
    ['180 deg F', '°C', 180, '°F', true],
    ['89 in-lb', 'N·m', 89, 'lbf·in', true],
    ['7.4 ft lb', 'N·m', 7.4, 'lbf·ft', true],
    ['7.4 lb-ft', 'N·m', 7.4, 'lbf·ft', true],
    ['7.4 foot-pounds', 'N·m', 7.4, 'lbf·ft', true],
    ['10 nm', 'N·m', 10, 'N·m', true],
    ['102 kgf·cm', 'N·m', 1.02, 'kgf·m', true],
    ['12\u202f345 kPa', 'kPa', 12_345, 'kPa', true],
    ['12\u2009345.5 kPa', 'kPa', 12_345.5, 'kPa', true],
    ["1'250'000,5", 'kPa', 1_250_000.5, 'kPa', false],
    ['1 250', 'rpm', 1250, 'rpm', false],
    ['1250 r/min', 'rpm', 1250, 'rpm', true],
    ['\u00a0 12 \t psi ', 'kPa', 12, 'psi', true],
    ['1e3', 'mm', 1000, 'mm', false],
    ['10.4 cSt', 'mm²/s', 10.4, 'mm²/s', true],
    ['10.4 mm2/s', 'mm²/s', 10.4, 'mm²/s', true],
    ['745 kg/m3', 'kg/m³', 745, 'kg/m³', true],
    ['0.745 g/cc', 'kg/m³', 0.745, 'g/cm³', true],
    ['0.745 kg/L', 'kg/m³', 0.745, 'g/cm³', true],
    ['120 bhp', 'kW', 120, 'hp', true],
    ['90 kW', 'hp', 90, 'kW', true],
    ['0.5 lb/hp-h', 'g/kWh', 0.5, 'lb/hp·h', true],
    ['304 g/kWh', 'lb/hp·h', 304, 'g/kWh', true],
    ['2.5E-3 in', 'mm', 0.0025, 'in', true],
    ['9.5:1', ':1', 9.5, ':1', true],
    ['12 lb', 'N', 12, 'lbf', true],
    ['12 lb', 'kg', 12, 'lb', true],
    ['3 per cent', '%', 3, '%', true],
  ])('%s in a box for %s', (text, box, amount, unit, named) => {
    const read = valueOf(readTyped(text, box));
    expect(read).toMatchObject({ unit, named });
    expect(read.amount).toBeCloseTo(amount, 12);
    const base = toBase(amount, unit);
    expect(relative(read.base, base.ok ? base.value : NaN)).toBeLessThan(1e-12);
  });

  it.each<[text: string, box: Unit, message: string]>([
    ['', 'mm', '"" is no number. Write, for example, 0.35 mm or 14 thou.'],
    ['   ', 'kPa', '"" is no number. Write, for example, 12 kPa.'],
    ['about right', ':1', '"about right" is no number. Write, for example, 12:1.'],
    ['NaN', 'mm', '"NaN" is no number. Write, for example, 0.35 mm or 14 thou.'],
    ['∞', 'mm', '"∞" is no number. Write, for example, 0.35 mm or 14 thou.'],
    ['0x10', 'mm', '"x10" is no unit that the book knows. Write, for example, 0.35 mm or 14 thou.'],
    ['5-6 mm', 'mm', '"-6 mm" is no unit that the book knows. Write, for example, 0.35 mm or 14 thou.'],
    ['1,250', 'mm', '"1,250" can be read in two ways. Write 1250 or 1.250.'],
    ['12,500 psi', 'kPa', '"12,500" can be read in two ways. Write 12500 or 12.500.'],
    ['1/0', 'mm', 'A fraction cannot have zero below its line.'],
    ['1 1/0 in', 'mm', 'A fraction cannot have zero below its line.'],
    ['5 furlongs', 'mm', '"furlongs" is no unit that the book knows. Write, for example, 0.35 mm or 14 thou.'],
    ['5 psi', 'mm', 'psi measures pressure, and here goes length, for example in mm.'],
    ['-1', 'N·m', 'A torque cannot be less than zero.'],
    ['-300', '°C', 'A temperature cannot be below absolute zero, −273.15 °C.'],
    ['1e400', 'mm', 'The length must be a number.'],
    ['5 constructor', 'mm', '"constructor" is no unit that the book knows. Write, for example, 0.35 mm or 14 thou.'],
  ])('refuses %j in a box for %s in a sentence', (text, box, message) => {
    expect(messageOf(readTyped(text, box))).toBe(message);
  });

  it('takes 0,250 and 1,25 for decimals, which can be read in one way only', () => {
    expect(valueOf(readTyped('0,250', 'mm')).amount).toBe(0.25);
    expect(valueOf(readTyped('1,25', 'mm')).amount).toBe(1.25);
    expect(valueOf(readTyped('1,2500', 'mm')).amount).toBe(1.25);
  });

  it('quotes no more of a long text than a sentence can hold, and takes no time over it', () => {
    for (const one of ['9', 'a', ' ', '1 ', '1/', '.', ',', "1'", 'lb x', '5 lbf·', '½', '°', '-', '1e']) {
      const from = performance.now();
      const read = readTyped(one.repeat(500).slice(0, 500), 'N·m');
      expect(performance.now() - from, one).toBeLessThan(100);
      expect(messageOf(read).length, one).toBeLessThan(160);
    }
  });
});

describe('a measure of any kind', () => {
  it('knows its kind by its unit', () => {
    expect(valueOf(readAny('89 lbf·in'))).toMatchObject({ amount: 89, unit: 'lbf·in', named: true });
    expect(valueOf(readAny('2.5 bar')).base).toBeCloseTo(250_000, 6);
    expect(valueOf(readAny('12 lb')).unit).toBe('lbf');
  });

  it('asks for a unit where none stands', () => {
    expect(messageOf(readAny('89'))).toBe('Write the unit after the number, for example 89 lbf·in.');
    expect(messageOf(readAny('lbf'))).toBe('"lbf" is no number. Write, for example, 89 lbf·in.');
  });
});

const unit = fc.constantFrom(...UNITS);
const size = fc.tuple(fc.double({ min: 1, max: 10, noNaN: true }), fc.integer({ min: -6, max: 8 }));
const amountIn = (of: Unit) =>
  fc
    .tuple(size, fc.boolean())
    .map(([[digits, power], below]) =>
      below && SIGNED.includes(quantityOf(of)) && quantityOf(of) !== 'temperature'
        ? -digits * 10 ** power
        : digits * 10 ** power,
    );
const measure = unit.chain((of) => fc.tuple(fc.constant(of), amountIn(of)));

/** Every way that the product itself writes a number, and the one of a keyboard with a comma. */
const WAYS: Record<string, (amount: number) => string> = {
  'as a program writes it': String,
  'as the book prints it': (amount) => formatNumber(amount),
  'with a comma': (amount) => String(amount).replace('.', ','),
};

describe('whatever number and unit is written', () => {
  it.each(Object.entries(WAYS))('%s, is read back', (_, write) => {
    fc.assert(
      fc.property(measure, fc.constantFrom('', ' ', '\u202f'), ([of, amount], between) => {
        const number = write(amount);
        // A comma with an exponent is nobody's writing; a comma before three digits is refused on purpose.
        fc.pre(!/,.*e/.test(number) && !/^-?[1-9]\d{0,2},\d{3}$/.test(number));
        const texts = [withUnit(number, of), number + between + of];
        for (const text of texts) {
          const read = valueOf(readTyped(text, of));
          expect(read, text).toMatchObject({ unit: of, named: true });
          const base = toBase(amount, of);
          expect(relative(read.amount, amount), text).toBeLessThan(1e-12);
          expect(relative(read.base, base.ok ? base.value : NaN), text).toBeLessThan(1e-12);
        }
        expect(valueOf(readTyped(number, of))).toMatchObject({ unit: of, named: false });
      }),
      { numRuns: 500 },
    );
  });

  it('reads the same by any unit of its kind, but for a pound, which is a force first', () => {
    fc.assert(
      fc.property(measure, ([of, amount]) => {
        const text = withUnit(formatNumber(amount), of);
        const any = readAny(text);
        if (of === 'lb') expect(any).toMatchObject({ value: { unit: 'lbf' } });
        else expect(any).toEqual(readTyped(text, of));
      }),
    );
  });
});

describe('whatever is typed', () => {
  const wild = fc.oneof(
    fc.string({ maxLength: 500, unit: 'grapheme' }),
    fc.string({ maxLength: 500, unit: fc.constantFrom(...'0123456789.,/-+−eE \u202f½¼"\'°·mnlbfitCF%:'.split('')) }),
  );
  it('is read or refused in a sentence, never thrown, never a number that is none', () => {
    fc.assert(
      fc.property(wild, unit, (text, box) => {
        const [own, any] = [readTyped(text, box), readAny(text)];
        for (const read of [own, any])
          if (read.ok) expect(Number.isFinite(read.value.base) && Number.isFinite(read.value.amount)).toBe(true);
          else expect(read.message).toMatch(/^\S.* .*\.$/su);
        if (own.ok) expect(quantityOf(own.value.unit)).toBe(quantityOf(box));
      }),
      { numRuns: 2000 },
    );
  });
});
