import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type ClampInput, LOW_SHARE, clampCheck, clampLoadOf, torqueFor } from '@/domain/measure/clampLoad';
import { CONDITIONS } from '@/domain/procedure/schema';
import { valueOf } from '../../factories/measures';
import { EXTREMES, NO_NUMBERS, ODD_TEXTS, expectRefused, expectSound } from './sweep';

const m6: ClampInput = { nm: 10, thread: 'M6', pitch: 1, class: '8.8', condition: 'dry' };
const check = (changes: Partial<ClampInput>, low?: number) => valueOf(clampCheck({ ...m6, ...changes }, low));

describe('clampCheck', () => {
  it('gives clamp load, proof load and share', () => {
    const made = check({});
    expect(made.clampLoad).toBeCloseTo(10 / (0.2 * 0.006), 9);
    expect(made.share).toBeCloseTo((made.clampLoad ?? 0) / (made.proof?.load ?? 0), 12);
    expect(made).toMatchObject({
      verdict: 'ok',
      about: 'final torque',
      why: 'The final torque clamps to 71 % of proof load.',
    });
  });

  it.each<[string, Partial<ClampInput>, string, string]>([
    [
      'over',
      { nm: 15 },
      'over',
      'The final torque clamps to 107 % of proof load: the bolt would stay longer, or break.',
    ],
    ['low', { nm: 3 }, 'low', 'The final torque clamps to 21 % of proof load, less than the 30 % that is usual.'],
    [
      'no class',
      { class: undefined },
      'unknown',
      'No property class is given; look at the head of the bolt. Without a proof load, the clamp load cannot be judged.',
    ],
    [
      'stainless',
      { class: 'A4-70' },
      'unknown',
      'A4-70 is stainless steel by ISO 3506-1; the book holds no proof stress for it. Without a proof load, the clamp load cannot be judged.',
    ],
    [
      'pipe thread',
      { thread: 'G 1/4', pitch: undefined },
      'unknown',
      'A pipe thread is tightened until it seals; it does not clamp, so no clamp load can be given.',
    ],
    [
      'angle',
      { nm: 5, angles: [90] },
      'unknown',
      'The snug torque clamps to 36 % of proof load; the angle then takes the bolt into yield on purpose, where T = K·d·F says nothing.',
    ],
    [
      'snug over proof',
      { nm: 20, angles: [90] },
      'over',
      'The snug torque clamps to 143 % of proof load: the bolt would stay longer, or break.',
    ],
  ])('says of %s', (_name, changes, verdict, why) => {
    expect(check(changes)).toMatchObject({ verdict, why });
  });

  it('gives no number where none can be given', () => {
    expect(check({ thread: 'G 1/4', pitch: undefined })).toMatchObject({
      clampLoad: null,
      proof: null,
      share: null,
      nutFactor: null,
    });
    const unclassed = check({ class: undefined });
    expect(unclassed).toMatchObject({ proof: null, share: null });
    expect(unclassed.clampLoad).toBeGreaterThan(0);
  });

  it('counts exactly 100 % as not over, and low as a parameter', () => {
    const { proof } = check({});
    const nm = valueOf(torqueFor(proof?.load ?? 0, 0.006, 0.2));
    expect(check({ nm: nm * (1 - 1e-12) }).verdict).toBe('ok');
    expect(check({ nm: nm * (1 + 1e-12) }).verdict).toBe('over');
    expect(check({}, 0.75).verdict).toBe('low');
    expect(check({ nm: 3 }, 0).verdict).toBe('ok');
  });

  it('never falls back from a worse verdict as the torque rises', () => {
    const rank = { unknown: -1, low: 0, ok: 1, over: 2 };
    const torque = fc.double({ min: 0.01, max: 2000, noNaN: true });
    fc.assert(
      fc.property(
        torque,
        torque,
        fc.constantFrom(...CONDITIONS),
        fc.constantFrom('M4', 'M6', 'M8', 'M10', 'M14', 'M20'),
        fc.constantFrom('4.6', '8.8', '10.9', '12.9'),
        (a, b, condition, thread, name) => {
          const verdict = (nm: number) => rank[valueOf(clampCheck({ nm, thread, class: name, condition })).verdict];
          expect(verdict(Math.min(a, b))).toBeLessThanOrEqual(verdict(Math.max(a, b)));
        },
      ),
    );
  });

  it('clamps harder the slicker the thread', () => {
    const loads = (['dry', 'oiled', 'anti-seize'] as const).map((condition) => check({ condition }).share ?? 0);
    expect(loads).toEqual([...loads].sort((a, b) => a - b));
    expect(loads[2]! / loads[0]!).toBeCloseTo(5 / 3, 9);
  });

  it.each<[Partial<ClampInput>, string]>([
    [{ nm: NaN }, 'nm'],
    [{ nm: 0 }, 'nm'],
    [{ thread: 'M6 × 1' }, 'thread'],
    [{ pitch: -1 }, 'pitch'],
    [{ condition: 'wet' as 'dry' }, 'condition'],
    [{ angles: [90, 0] }, 'angles.1'],
  ])('refuses %j at %s', (changes, field) => {
    expectRefused(clampCheck({ ...m6, ...changes }), field);
  });

  it('never throws, and never answers with what is no number', () => {
    const fields = /^(nm|thread|pitch|condition|low|angles\.0)$/;
    for (const bad of [...EXTREMES, ...NO_NUMBERS]) {
      expectSound(clampCheck({ ...m6, nm: bad }), fields);
      expectSound(clampCheck({ ...m6, pitch: bad }), fields);
      expectSound(clampCheck({ ...m6, angles: [bad] }), fields);
      expectSound(clampCheck(m6, bad), fields);
    }
    for (const text of [...ODD_TEXTS, ...(NO_NUMBERS as unknown as string[])]) {
      expectSound(clampCheck({ ...m6, thread: text }), fields);
      expectSound(clampCheck({ ...m6, class: text }), fields);
      expectSound(clampCheck({ ...m6, condition: text as 'dry' }), fields);
    }
  });

  it('calls a third of proof enough, for soft gaskets', () => {
    expect(LOW_SHARE).toBeLessThan(1 / 3);
  });
});

describe('clampLoadOf and torqueFor', () => {
  it('undo each other', () => {
    const positive = fc.double({ min: 1e-4, max: 1e4, noNaN: true });
    fc.assert(
      fc.property(positive, positive, fc.double({ min: 0.05, max: 0.5, noNaN: true }), (torque, diameter, k) => {
        const back = valueOf(torqueFor(valueOf(clampLoadOf(torque, diameter, k)), diameter, k));
        expect(Math.abs(back / torque - 1)).toBeLessThan(1e-12);
      }),
    );
  });

  it('never throw, and never answer with what is no number', () => {
    for (const bad of [...EXTREMES, ...NO_NUMBERS]) {
      expectSound(clampLoadOf(bad, 0.006, 0.2), /^torque$/);
      expectSound(clampLoadOf(10, bad, 0.2), /^(torque|diameter)$/);
      expectSound(clampLoadOf(10, 0.006, bad), /^(torque|k)$/);
      expectSound(torqueFor(bad, 0.006, 0.2), /^clampLoad$/);
      expectSound(torqueFor(10, bad, bad), /^(clampLoad|diameter|k)$/);
    }
  });
});
