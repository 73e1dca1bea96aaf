import { describe, expect, it } from 'vitest';
import { convert, type Unit } from '@/domain/measure/convert';
import { torqueAtBolt, wrenchSetting } from '@/domain/measure/wrenchAdapter';
import { valueOf } from '../factories/measures';

const INCH = 0.0254;
const to = (value: number, from: Unit, unit: Unit) => {
  const made = convert(value, from, unit);
  if (!made.ok) throw new Error(made.message);
  return made.value;
};

describe('settings of a torque wrench with an adapter', () => {
  it.each<[string, number, Unit, number, number, number, number, number]>([
    ['TM 1-1500-204-23-9, 8-5 and figure 8-16 (seen)', 300, 'lbf·in', 10, 4, 0, 214, 0],
    ['Navy training manual, S = T·La/(La + Ea) (seen)', 100, 'lbf·in', 12, 6, 0, 66.7, 1],
    ['TM 9-2350-277-40&P p. 0004 (seen)', 40, 'lbf·ft', 12, 4, 0, 30, 0],
    ['the same rule in a secondary page (quoted)', 30, 'lbf·ft', 12, 6, 0, 20, 0],
    // No published number: TM 1-1500-204-23-9 (b) and TM 55-2815-574-24 give only the rule, L − E (seen).
    ['pointing back, computed here', 300, 'lbf·in', 10, 4, 180, 500, 0],
  ])('%s: %d %s, L %d in, E %d in at %d° is %d', (_source, atBolt, unit, length, adapter, angle, printed, digits) => {
    const wrench = { length: length * INCH, adapter: adapter * INCH, angle };
    const setting = valueOf(wrenchSetting(to(atBolt, unit, 'N·m'), wrench));
    expect(Number(to(setting, 'N·m', unit).toFixed(digits))).toBe(printed);
    expect(to(valueOf(torqueAtBolt(setting, wrench)), 'N·m', unit)).toBeCloseTo(atBolt, 9);
  });

  it.each([90, -90, 270])('at a right angle (%d°) the setting is the torque (NAVEDTRA 14008, seen)', (angle) => {
    expect(valueOf(wrenchSetting(42, { length: 0.3, adapter: 0.1, angle }))).toBe(42);
  });

  it('gives the wrench no more than L + E·cos 60° (rule of TM 9-254, figure 4-6, seen; number computed here)', () => {
    // 10 in and 4 in at 60° reach 12 in along the wrench.
    expect(valueOf(wrenchSetting(120, { length: 10 * INCH, adapter: 4 * INCH, angle: 60 }))).toBeCloseTo(100, 9);
  });
});
