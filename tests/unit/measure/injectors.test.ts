import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bandAround } from '@/domain/measure/band';
import { flowAtPressure, flowForPower, powerFed, sharePercent, type Supply } from '@/domain/measure/injectorFlow';
import { judgeInjectors, type Injector, type InjectorSet } from '@/domain/measure/injectors';
import { sweep } from '../../factories/hostileNumbers';
import { between, CC_PER_MINUTE, relative, valueOf } from '../../factories/measures';

const cc = (flow: number) => flow * CC_PER_MINUTE;
const limits = { flow: valueOf(bandAround(cc(250), 3)), spread: { max: 2 }, drops: { max: 1 } };
const set = (injectors: Injector[], more: Partial<InjectorSet> = {}): InjectorSet => ({
  nominal: cc(250),
  injectors,
  limits,
  ...more,
});
const good: Injector = { before: cc(246), after: cc(249), drops: 0, spray: 'even' };
const flows = fc.array(between(cc(100), cc(400)), { minLength: 1, maxLength: 8 });

describe('a set of injectors', () => {
  it('judges the run after cleaning and says why one fails', () => {
    const found = valueOf(
      judgeInjectors(
        set([
          { before: cc(248), after: cc(249), drops: 0, spray: 'even' },
          { before: cc(186), after: cc(247), drops: 1, spray: 'even' },
          { before: cc(131), after: cc(221), drops: 0, spray: 'one-sided' },
          { before: cc(252), after: cc(262), drops: 2, spray: 'even' },
        ]),
      ),
    );
    expect(found.judgedRun).toBe('after');
    expect(found.injectors.map((one) => one.faults)).toEqual([
      [],
      [],
      ['flows too little', 'sprays badly'],
      ['flows too much', 'drips'],
    ]);
    expect(found.injectors.map((one) => one.passes)).toEqual([true, true, false, false]);
    expect(found.passes).toBe(false);
    expect(found.reasons).toEqual([
      { fault: 'flows too little', injectors: [2] },
      { fault: 'flows too much', injectors: [3] },
      { fault: 'drips', injectors: [3] },
      { fault: 'sprays badly', injectors: [2] },
      { fault: 'spread too wide', injectors: [2, 3] },
    ]);
    expect(found.after?.spreadPercent).toBeCloseTo((100 * (262 - 221)) / 244.75, 9);
    expect(found.injectors[2]?.before?.deviationPercent).toBeCloseTo(-47.6, 9);
  });

  it('fails a set of good injectors that do not match', () => {
    const found = valueOf(judgeInjectors(set([{ after: cc(244) }, { after: cc(256) }])));
    expect(found.injectors.every((one) => one.passes)).toBe(true);
    expect(found).toMatchObject({ passes: false, reasons: [{ fault: 'spread too wide', injectors: [0, 1] }] });
  });

  it('judges a set as it came out where there is no run after', () => {
    expect(valueOf(judgeInjectors(set([{ before: cc(249) }])))).toMatchObject({
      judgedRun: 'before',
      after: null,
      passes: true,
    });
  });

  it('takes a set that is blocked altogether', () => {
    expect(valueOf(judgeInjectors(set([{ after: 0 }, { after: 0 }])))).toMatchObject({
      after: { mean: 0, spreadPercent: 0 },
      passes: false,
    });
  });

  it('has a spread that does not depend on the order, nor on the unit', () => {
    fc.assert(
      fc.property(flows, fc.array(fc.nat(), { minLength: 8, maxLength: 8 }), between(0.1, 10), (all, keys, scale) => {
        const shuffled = all
          .map((flow, place) => ({ flow, key: keys[place] ?? 0 }))
          .sort((a, b) => a.key - b.key)
          .map(({ flow }) => flow);
        const spreadOf = (some: number[]) =>
          valueOf(judgeInjectors(set(some.map((after) => ({ after }))))).after!.spreadPercent;
        expect(spreadOf(shuffled)).toBe(spreadOf(all));
        expect(Math.abs(spreadOf(all.map((flow) => flow * scale)) - spreadOf(all))).toBeLessThan(1e-9);
      }),
    );
  });

  it('never passes one that lies further from nominal than one that fails', () => {
    fc.assert(
      fc.property(between(0.5, 1.5), between(0, 0.5), (share, further) => {
        const passes = (factor: number) =>
          valueOf(judgeInjectors(set([{ after: cc(250) * factor }]))).injectors[0]!.passes;
        const away = share < 1 ? share - further : share + further;
        if (!passes(share)) expect(passes(away)).toBe(false);
      }),
    );
  });

  it('refuses a run that is not complete, and drops without a limit', () => {
    expect(judgeInjectors(set([{ after: cc(250) }, { before: cc(240) }]))).toEqual({
      ok: false,
      problems: [
        { field: 'injectors.0.before', message: 'Injector 1 has no flow before cleaning, and others have.' },
        { field: 'injectors.1.after', message: 'Injector 2 has no flow after cleaning, and others have.' },
      ],
    });
    expect(judgeInjectors(set([{}, {}]))).toMatchObject({
      problems: [{ field: 'injectors', message: 'The set needs a flow for each injector, before or after.' }],
    });
    expect(judgeInjectors(set([{ after: 1e-6, drops: 2 }], { limits: { flow: { min: 0 } } }))).toMatchObject({
      problems: [{ field: 'limits.drops', message: 'Drops were counted; say how many are allowed.' }],
    });
    const spray = 'fine' as unknown as 'even';
    expect(judgeInjectors(set([{ after: 1e-6, spray }]))).toMatchObject({
      problems: [{ field: 'injectors.0.spray', message: 'The spray of injector 1 must be one of the list.' }],
    });
    expect(judgeInjectors(set([good, null as unknown as Injector])).ok).toBe(false);
    expect(judgeInjectors(set([good], { limits: undefined as unknown as InjectorSet['limits'] })).ok).toBe(false);
  });

  it('withstands odd input', () => sweep(judgeInjectors, set([good, good, good])));
});

const supply: Supply = { density: 745, count: 4, dutyPercent: 80, bsfc: 8.448e-8 };

describe('flow and power', () => {
  it('there and back again is where it started', () => {
    fc.assert(
      fc.property(between(cc(1), cc(5000)), between(1e5, 3e7), between(1e5, 3e7), (flow, from, to) => {
        const there = valueOf(flowAtPressure({ flow, from, to }));
        expect(relative(valueOf(flowAtPressure({ flow: there, from: to, to: from })), flow)).toBeLessThan(1e-12);
        expect(relative(valueOf(flowForPower(valueOf(powerFed(flow, supply)), supply)), flow)).toBeLessThan(1e-12);
      }),
    );
  });

  it('feeds more with more', () => {
    fc.assert(
      fc.property(between(cc(1), cc(5000)), between(1, 3), (flow, factor) => {
        expect(valueOf(powerFed(flow * factor, supply))).toBeGreaterThanOrEqual(valueOf(powerFed(flow, supply)));
        const thirsty = { ...supply, bsfc: supply.bsfc * factor };
        expect(valueOf(powerFed(flow, thirsty))).toBeLessThanOrEqual(valueOf(powerFed(flow, supply)));
      }),
    );
  });

  it('refuses what cannot be', () => {
    expect(flowAtPressure({ flow: 1e-6, from: 0, to: 3e5 })).toEqual({
      ok: false,
      problems: [{ field: 'from', message: 'The pressure of the test must be more than zero.' }],
    });
    expect(powerFed(1e-6, { ...supply, dutyPercent: 120 })).toMatchObject({
      problems: [{ field: 'dutyPercent', message: 'The duty must be 100 % or less.' }],
    });
    expect(sharePercent(2.5)).toMatchObject({
      problems: [{ field: 'count', message: 'The number of injectors must be a whole number.' }],
    });
  });

  it('withstands odd input', () => {
    sweep(flowAtPressure, { flow: cc(250), from: 3e5, to: 4e5 });
    sweep(({ flow, ...rest }: Supply & { flow: number }) => powerFed(flow, rest), { flow: cc(250), ...supply });
    sweep(({ power, ...rest }: Supply & { power: number }) => flowForPower(power, rest), { power: 9e4, ...supply });
    sweep(({ count }) => sharePercent(count), { count: 4 });
  });
});
