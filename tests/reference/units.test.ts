import { execFileSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { convert, type Unit } from '@/domain/measure/convert';
import { roundTo } from '@/domain/measure/round';

const value = (amount: number, from: Unit, to: Unit) => {
  const result = convert(amount, from, to);
  if (!result.ok) throw new Error(result.message);
  return result.value;
};
const relative = (got: number, want: number) => Math.abs(got - want) / Math.abs(want);

describe('NIST SP 811, appendix B.8 (as quoted in the R package NISTunits; seven digits)', () => {
  it.each<[number, Unit, Unit, number]>([
    [1, 'lbf·ft', 'N·m', 1.355818],
    [1, 'lbf·in', 'N·m', 0.1129848],
    [1, 'kgf·m', 'N·m', 9.80665],
    [1, 'in', 'mm', 25.4],
    [1, 'psi', 'kPa', 6.894757],
    [1, 'US qt', 'L', 0.9463529],
    [1, 'lb/h', 'g/s', 0.1259979],
    [1, 'lbf', 'N', 4.448222],
    [1, 'hp', 'kW', 0.7456999],
    // Printed as 1.689 659 E-07 kg/J.
    [1, 'lb/hp·h', 'g/kWh', 1.689659e-7 * 3.6e9],
  ])('%d %s = %s · %d', (amount, from, to, want) => {
    expect(relative(value(amount, from, to), want)).toBeLessThan(5e-7);
  });
});

describe('GNU units 2.22 (printed digits, quoted from Debian bookworm)', () => {
  it.each<[number, Unit, Unit, number]>([
    [1, 'lbf·ft', 'N·m', 1.35581794833],
    [1, 'lbf·in', 'N·m', 0.112984829028],
    [1, 'kgf·m', 'N·m', 9.80665],
    [1, 'kgf·cm', 'N·m', 0.0980665],
    [1, 'thou', 'mm', 0.0254],
    [1, 'psi', 'kPa', 6.89475729317],
    [1, 'bar', 'psi', 14.503773773],
    [1, 'bar', 'kPa', 100],
    [1, 'US qt', 'L', 0.946352946],
    [1, 'imp qt', 'L', 1.1365225],
    [1, 'lb/h', 'g/s', 0.125997880556],
    [1, 'lbf', 'N', 4.44822161526],
    [1, 'hp', 'kW', 0.745699871582],
    [1, 'lb/hp·h', 'g/kWh', 608.277387842],
    [212, '°F', '°C', 100],
  ])('%d %s = %s · %d', (amount, from, to, want) => {
    expect(relative(value(amount, from, to), want)).toBeLessThan(1e-11);
  });
});

const NAMES: Partial<Record<Unit, string>> = {
  mm: 'mm',
  µm: 'micrometer',
  cm: 'cm',
  in: 'inch',
  thou: 'mil',
  'N·m': 'N m',
  'lbf·ft': 'lbf ft',
  'lbf·in': 'lbf inch',
  'kgf·m': 'kgf m',
  'kgf·cm': 'kgf cm',
  N: 'N',
  kN: 'kN',
  lbf: 'lbf',
  kPa: 'kPa',
  bar: 'bar',
  psi: 'psi',
  MPa: 'MPa',
  mL: 'mL',
  L: 'L',
  'cm³': 'cm^3',
  'US qt': 'quart',
  'imp qt': 'brquart',
  'cc/min': 'cm^3/min',
  'L/min': 'L/min',
  'lb/h': 'lb/hour',
  'g/s': 'g/s',
  h: 'hour',
  min: 'min',
  s: 's',
  g: 'g',
  kg: 'kg',
  lb: 'lb',
  kW: 'kW',
  hp: 'hp',
  'g/kWh': 'g/(kW hour)',
  'lb/hp·h': 'lb/(hp hour)',
  'kg/m³': 'kg/m^3',
  'g/cm³': 'g/cm^3',
  'mm²/s': 'mm^2/s',
};

/** Asks the installed program for all pairs at once; null for a pair that it refuses. */
function gnuUnits(pairs: readonly [string, string][]): (number | null)[] {
  const input = pairs.map(([from, to]) => `7.3 ${from}\n${to}\n`).join('');
  const lines = execFileSync('units', ['-q', '-t', '-o', '%.15g'], { input, encoding: 'utf8' }).trim().split('\n');
  return pairs.map(() => {
    const line = lines.shift() ?? '';
    if (line !== 'conformability error') return Number(line);
    lines.splice(0, 2); // both sides in base units
    return null;
  });
}

function installed(): boolean {
  try {
    return gnuUnits([['m', 'm']])[0] === 7.3;
  } catch {
    return false;
  }
}

describe.runIf(installed())('the installed GNU units, as an independent converter', () => {
  it('agrees on every pair of units of one kind, and on which pairs are no pair', () => {
    const names = Object.entries(NAMES) as [Unit, string][];
    const pairs = names.flatMap((from) => names.map((to) => [from, to] as const));
    const theirs = gnuUnits(pairs.map(([from, to]) => [from[1], to[1]]));
    let compared = 0;
    pairs.forEach(([[from], [to]], i) => {
      const ours = convert(7.3, from, to);
      const reference = theirs[i] ?? null;
      expect(ours.ok, `${from} to ${to}`).toBe(reference !== null);
      if (!ours.ok || reference === null) return;
      compared += 1;
      expect(relative(ours.value, reference), `${from} to ${to}`).toBeLessThan(1e-12);
    });
    expect(compared).toBeGreaterThan(100);
  });
});

describe('published pairs in two units, to the printed digits', () => {
  it.each<[string, number, Unit, Unit, number, number]>([
    ['TM 5-3805-274-13&P WP 0051', 19, 'lbf·ft', 'N·m', 0.1, 25.8],
    ['TM 5-3805-274-13&P WP 0051', 22, 'in', 'cm', 0.1, 55.9],
    ['TM 5-3805-274-13&P WP 0051', 25, 'in', 'cm', 0.1, 63.5],
    ['TM 5-3805-298-23-2 WP 0176', 30, 'lbf·ft', 'N·m', 1, 41],
    ['TM 9-2815-260-24 p. 5-65', 0.0016, 'in', 'mm', 0.001, 0.041],
    ['TM 9-2815-260-24 p. 5-65', 0.0043, 'in', 'mm', 0.001, 0.109],
    ['TM 5-1940-277-34 p. 3-25', 0.016, 'in', 'mm', 0.001, 0.406],
    ['TM 5-1940-277-34 p. 3-25', 0.031, 'in', 'mm', 0.001, 0.787],
    ['TM 5-1940-277-34 p. 3-25', 0.012, 'in', 'mm', 0.001, 0.305],
    ['TM 5-1940-277-34 p. 3-25', 0.029, 'in', 'mm', 0.001, 0.737],
  ])('%s: %d %s = %s, to %d: %d', (_source, amount, from, to, resolution, printed) => {
    expect(roundTo(value(amount, from, to), resolution)).toBe(printed);
  });
});

describe('reverse check numbers (computed from the exact bases, no published source)', () => {
  it.each<[Unit, number]>([
    ['lbf·ft', 73.7562149],
    ['lbf·in', 885.0745791],
    ['kgf·m', 10.1971621],
    ['kgf·cm', 1019.71621],
  ])('100 N·m in %s is %d', (to, want) => {
    expect(relative(value(100, 'N·m', to), want)).toBeLessThan(5e-9);
  });

  it('0.50 lb/hp·h is 304.14 g/kWh', () => {
    expect(value(0.5, 'lb/hp·h', 'g/kWh')).toBeCloseTo(304.14, 2);
  });
});
