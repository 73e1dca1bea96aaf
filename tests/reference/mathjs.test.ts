import { unit as theirUnit } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { convert, type Unit } from '@/domain/measure/convert';

/**
 * mathjs as an independent converter. Its psi and hp are good to about 1e-10 only (its own rounded constants, tried
 * here); all else is held to 1e-12.
 */
const GROUPS: [string, number, Partial<Record<Unit, string>>][] = [
  ['length', 1e-12, { mm: 'mm', µm: 'um', cm: 'cm', in: 'inch', thou: 'mil' }],
  ['torque', 1e-12, { 'N·m': 'N m', 'lbf·ft': 'lbf ft', 'lbf·in': 'lbf inch' }],
  ['force', 1e-12, { N: 'N', kN: 'kN', lbf: 'lbf' }],
  ['pressure', 1e-10, { kPa: 'kPa', bar: 'bar', psi: 'psi', MPa: 'MPa' }],
  ['volume', 1e-12, { mL: 'ml', L: 'l', 'cm³': 'cm^3', 'US qt': 'quart' }],
  ['volume flow', 1e-12, { 'cc/min': 'cm^3/min', 'L/min': 'l/min' }],
  ['mass flow', 1e-12, { 'lb/h': 'lbm/hour', 'g/s': 'g/s' }],
  ['power', 1e-10, { kW: 'kW', hp: 'hp' }],
  ['mass', 1e-12, { g: 'g', kg: 'kg', lb: 'lbm' }],
];

describe('mathjs agrees on', () => {
  it.each(GROUPS)('%s, to %d', (_, tolerance, names) => {
    const entries = Object.entries(names) as [Unit, string][];
    for (const [from, theirFrom] of entries)
      for (const [to, theirTo] of entries)
        for (const amount of [0.014, 1, 89, 12_345.6]) {
          const ours = convert(amount, from, to);
          const reference = theirUnit(amount, theirFrom).toNumber(theirTo);
          expect(ours.ok && Math.abs(ours.value / reference - 1), `${amount} ${from} to ${to}`).toBeLessThan(tolerance);
        }
  });

  it.each([-40, 0, 20, 100])('%d °C on the other scale', (celsius) => {
    const ours = convert(celsius, '°C', '°F');
    expect(ours.ok && ours.value).toBeCloseTo(theirUnit(celsius, 'degC').toNumber('degF'), 9);
  });
});
