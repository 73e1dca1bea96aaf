import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { chooseShim, exactShim, lashWith, type ShimChoice } from '@/domain/measure/shims';
import { shimSizes } from '@/domain/measure/shimStock';
import { sweep } from '../../factories/hostileNumbers';
import { between, MM, valueOf } from '../../factories/measures';

const choice = (old: number, measured: number, target: number, more: Partial<ShimChoice> = {}): ShimChoice => ({
  old: old * MM,
  measured: measured * MM,
  target: target * MM,
  stock: { min: 2.2 * MM, max: 3 * MM, step: 0.05 * MM },
  ...more,
});
const mm = (metres: number) => Math.round(metres * 1e9) / 1e6;

describe('bucket shims', () => {
  it('takes the thinner of two that are equally near, which leaves more lash', () => {
    const found = valueOf(chooseShim(choice(2.6, 0.225, 0.2)));
    expect(mm(found.exact)).toBe(2.625);
    expect(found.neighbours.map((one) => mm(one.thickness))).toEqual([2.6, 2.65]);
    expect([mm(found.chosen.thickness), mm(found.chosen.lash)]).toEqual([2.6, 0.225]);
  });

  it('judges the lash that each neighbour gives', () => {
    const found = valueOf(chooseShim(choice(2.7, 0.12, 0.2, { band: { min: 0.17 * MM, max: 0.21 * MM } })));
    expect(found.neighbours.map((one) => one.judged?.at)).toEqual(['over', 'in']);
  });

  it('says when the answer lies outside the stock', () => {
    const thin = valueOf(chooseShim(choice(2.2, 0.05, 0.28)));
    expect(thin).toMatchObject({ outside: 'thinner than the stock' });
    expect(thin.neighbours.map((one) => mm(one.thickness))).toEqual([2.2]);
    expect(mm(thin.chosen.lash)).toBe(0.05);
    expect(valueOf(chooseShim(choice(3, 0.4, 0.2)))).toMatchObject({ outside: 'thicker than the stock' });
    expect(valueOf(chooseShim(choice(3, 0.2, 0.2))).outside).toBeNull();
  });

  it('takes a list of sizes in any order, each as often as it lies there', () => {
    const stock = [2.653, 2.598, 2.7, 2.653].map((size) => size * MM);
    const found = valueOf(chooseShim(choice(2.7, 0.15, 0.2, { stock })));
    expect(found.neighbours.map((one) => mm(one.thickness))).toEqual([2.598, 2.653]);
    expect(mm(found.chosen.thickness)).toBe(2.653);
    expect(valueOf(chooseShim(choice(2.7, 0.15, 0.2, { stock: stock.toReversed() })))).toEqual(found);
  });

  it('chooses the nearest of all, as a plain search would', () => {
    const sizes = fc.array(between(2, 3.5), { minLength: 1, maxLength: 30 });
    fc.assert(
      fc.property(between(2.2, 3), between(0, 0.6), between(0.05, 0.4), sizes, (old, measured, target, stock) => {
        const inMetres = stock.map((size) => size * MM);
        const { exact, chosen, neighbours } = valueOf(chooseShim(choice(old, measured, target, { stock: inMetres })));
        const nearest = Math.min(...inMetres.map((size) => Math.abs(size - exact)));
        expect(Math.abs(chosen.thickness - exact)).toBeLessThanOrEqual(nearest + 1e-11);
        expect(neighbours).toContain(chosen);
      }),
    );
  });

  it('gives back the lash that was asked for', () => {
    fc.assert(
      fc.property(between(2, 3.5), between(0, 0.6), between(0, 0.4), (old, measured, target) => {
        const reading = { old: old * MM, measured: measured * MM, target: target * MM };
        const lash = valueOf(lashWith(valueOf(exactShim(reading)), reading.old, reading.measured));
        expect(Math.abs(lash - reading.target)).toBeLessThan(1e-12);
      }),
    );
  });

  it('asks for a thicker shim the more lash there is', () => {
    fc.assert(
      fc.property(between(0, 0.6), between(0, 0.3), (measured, more) => {
        const at = (lash: number) => valueOf(chooseShim(choice(2.6, lash, 0.2))).chosen.thickness;
        expect(at(measured + more)).toBeGreaterThanOrEqual(at(measured));
      }),
    );
  });

  it('knows a range whose steps do not meet its end', () => {
    expect(shimSizes({ min: 2 * MM, max: 2.13 * MM, step: 0.05 * MM }).map(mm)).toEqual([2, 2.05, 2.1]);
    expect(shimSizes({ min: 2 * MM, max: 2 * MM, step: 0.05 * MM }).map(mm)).toEqual([2]);
  });

  it.each<[Partial<ShimChoice>, string, string]>([
    [{ stock: [] }, 'stock', 'The stock must hold 1 size or more.'],
    [{ stock: [2.5 * MM, 0] }, 'stock.1', 'Size 2 must be more than zero.'],
    [
      { stock: { min: 3 * MM, max: 2 * MM, step: 0.05 * MM } },
      'stock.max',
      'The thickest shim in stock cannot be thinner than the thinnest.',
    ],
    [
      { stock: { min: 2 * MM, max: 3 * MM, step: 1e-9 } },
      'stock.step',
      'The step between shims is too small for this range.',
    ],
    [{ stock: 5 as unknown as number[] }, 'stock', 'The stock must be a list of sizes, or a range with a step.'],
    [{ target: 4 * MM }, 'target', 'The lash wanted leaves no thickness for a shim.'],
    [{ measured: -0.1 * MM }, 'measured', 'The lash measured cannot be less than zero.'],
  ])('refuses %j', (more, field, message) => {
    expect(chooseShim(choice(2.6, 0.2, 0.2, more))).toEqual({ ok: false, problems: [{ field, message }] });
  });

  it('withstands odd input', () => {
    const band = { min: 0.17 * MM, max: 0.23 * MM };
    sweep(chooseShim, choice(2.7, 0.12, 0.2, { band }));
    sweep(chooseShim, choice(2.7, 0.12, 0.2, { stock: [2.5 * MM, 2.6 * MM] }));
    const lash = { shim: 2.6 * MM, old: 2.7 * MM, measured: 0.12 * MM };
    sweep(({ shim, old, measured }: typeof lash) => lashWith(shim, old, measured), lash);
    sweep(exactShim, { old: 2.7 * MM, measured: 0.12 * MM, target: 0.2 * MM });
  });
});
