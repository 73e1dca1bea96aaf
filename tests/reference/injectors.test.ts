import { describe, expect, it } from 'vitest';
import { bandAround } from '@/domain/measure/band';
import { convert, type Unit } from '@/domain/measure/convert';
import { flowAtPressure, powerFed, sharePercent } from '@/domain/measure/injectorFlow';
import { judgeInjectors } from '@/domain/measure/injectors';
import { CC_PER_MINUTE, PSI, relative, valueOf } from '../factories/measures';

/** Marks: Q quoted in a secondary page, C computed here from the stated formula. */
const HORSEPOWER = 745.69987158227;
const POUND = 0.45359237;
const POUND_PER_HP_HOUR = POUND / (HORSEPOWER * 3600);

const inUnit = (amount: number, from: Unit, to: Unit, density?: number) => {
  const result = convert(amount, from, to, density);
  if (!result.ok) throw new Error(result.message);
  return result.value;
};
const atPressure = (flow: number, from: number, to: number) => valueOf(flowAtPressure({ flow, from, to }));

describe('flow at another pressure', () => {
  it('Q (secondary page, square-root law): Δp up by half gives 22.5 % more, down by 30 % about 16 % less', () => {
    expect(atPressure(1, 1e5, 1.5e5)).toBeCloseTo(1.225, 3);
    expect(atPressure(1, 1e5, 0.7e5)).toBeCloseTo(0.84, 2);
  });

  it.each([
    [440, 3, 4, 508.07],
    [440, 3, 3.5, 475.25],
    [250, 2.5, 3, 273.86],
  ])('C: %d cc/min from %d to %d bar is %d', (flow, from, to, want) => {
    const there = atPressure(flow * CC_PER_MINUTE, from * 1e5, to * 1e5) / CC_PER_MINUTE;
    expect(there).toBeCloseTo(want, 2);
  });

  it('C: 30 lb/h from 43.5 to 58 psi is 34.64, a mass flow by the same law', () => {
    const there = atPressure((30 * POUND) / 3600, 43.5 * PSI, 58 * PSI);
    expect((there * 3600) / POUND).toBeCloseTo(34.64, 2);
  });
});

describe('power that a set can feed', () => {
  it('Q (the same page): 19 lb/h, 4 injectors, 0.80, 0.50 lb/(hp·h) is 121.6 hp', () => {
    const density = 720;
    const flow = (19 * POUND) / 3600 / density;
    const supply = { density, count: 4, dutyPercent: 80, bsfc: 0.5 * POUND_PER_HP_HOUR };
    expect(valueOf(powerFed(flow, supply)) / HORSEPOWER).toBeCloseTo(121.6, 9);
  });

  it('C: 0.50 lb/(hp·h) is 304.14 g/kWh; Q (NIST SP 811): 1 lb/(hp·h) is 1.689 659·10⁻⁷ kg/J', () => {
    expect(0.5 * POUND_PER_HP_HOUR * 1000 * 3.6e6).toBeCloseTo(304.14, 2);
    expect(relative(POUND_PER_HP_HOUR, 1.689659e-7)).toBeLessThan(5e-7);
  });
});

describe('volume and mass', () => {
  it('Q (injector data sheet): 1785 cc/min at 0.72 g/cc is 170.003 lb/h', () => {
    expect(inUnit(1785, 'cc/min', 'lb/h', 720)).toBeCloseTo(170.003, 3);
  });

  it.each([
    [720, 10.4998, 4],
    [740, 10.216, 3],
    [745, 10.147, 3],
    [750, 10.08, 3],
  ])('C, the trap of 10.5: one lb/h at %d kg/m³ is %d cc/min', (density, want, digits) => {
    const factor = inUnit(1, 'lb/h', 'cc/min', density);
    expect(factor).toBeCloseTo(want, digits);
    if (density !== 720) expect(relative(factor, 10.5)).toBeGreaterThan(0.02);
  });

  it('Q (the same page): 210 cc/min is called 20 lb/h, which is 10.5 and so a density of 720 kg/m³', () => {
    expect(inUnit(210, 'cc/min', 'lb/h', 720)).toBeCloseTo(20, 2);
    expect(inUnit(210, 'cc/min', 'lb/h', 750)).toBeCloseTo(20.83, 2);
  });

  it('converts nothing without a density', () => {
    expect(convert(210, 'cc/min', 'lb/h').ok).toBe(false);
  });
});

describe('common practice, no source', () => {
  // Whatever a shop allows between 1 % and a quarter, these three come out the same.
  it.each([1, 2, 3, 5, 10, 25])('nominal 250 cc/min within %d %%: 248 passes, 186 and 131 fail', (percent) => {
    const nominal = 250 * CC_PER_MINUTE;
    const flow = valueOf(bandAround(nominal, percent));
    const injectors = [248, 186, 131].map((before) => ({ before: before * CC_PER_MINUTE }));
    const found = valueOf(judgeInjectors({ nominal, injectors, limits: { flow } }));
    expect(found.injectors.map((one) => one.passes)).toEqual([true, false, false]);
    expect(found.injectors.map((one) => one.before?.deviationPercent)).toEqual([
      expect.closeTo(-0.8, 9),
      expect.closeTo(-25.6, 9),
      expect.closeTo(-47.6, 9),
    ]);
    expect(found.reasons).toEqual([{ fault: 'flows too little', injectors: [1, 2] }]);
  });

  it('one of four injectors answers for 25 % of the power', () => {
    expect(valueOf(sharePercent(4))).toBe(25);
    expect(valueOf(sharePercent(3))).toBeCloseTo(33.333, 3);
  });
});
