import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeBore, type Bore } from '@/domain/measure/bore';
import { judgeJournal, type Journal } from '@/domain/measure/journals';
import { sweep } from '../../factories/hostileNumbers';
import { between, MM, valueOf } from '../../factories/measures';

const grid = (...rows: [number, number][]) => rows.map((row) => row.map((value) => value * MM));
const microns = (metres: number) => Math.round(metres * 1e9) / 1e3;
const bore: Bore = {
  readings: grid([82.012, 82.006], [82.01, 82.006], [82.004, 82.002]),
  nominal: 82 * MM,
  piston: 81.97 * MM,
  limits: {
    diameter: { min: 82 * MM, max: 82.02 * MM },
    taper: { max: 0.015 * MM },
    outOfRound: { max: 0.012 * MM },
    cylindricity: { max: 0.015 * MM },
    clearance: { min: 0.025 * MM, max: 0.055 * MM },
  },
};
const diameter = between(81.9, 82.1);
const heights = fc.array(fc.tuple(diameter, diameter), { minLength: 2, maxLength: 3 });

describe('a bore', () => {
  it('finds taper, out-of-round, wear and clearance', () => {
    const found = valueOf(judgeBore(bore));
    expect(found.taper.map(microns)).toEqual([8, 4]);
    expect(found.outOfRound.map(microns)).toEqual([6, 4, 2]);
    expect([found.worstTaper, found.worstOutOfRound, found.cylindricity, found.wear].map((v) => microns(v!))).toEqual([
      8, 6, 8, 12,
    ]);
    expect([found.clearance!.least, found.clearance!.greatest].map(microns)).toEqual([32, 42]);
    expect(found.passes).toBe(true);
  });

  it('sees a barrel that taper between top and bottom does not', () => {
    const readings = grid([82, 82], [82.02, 82.018], [82, 82]);
    const found = valueOf(
      judgeBore({ readings, limits: { taper: { max: 0.01 * MM }, cylindricity: { max: 0.01 * MM } } }),
    );
    expect([found.worstTaper, found.cylindricity].map(microns)).toEqual([0, 20]);
    expect(found.judged).toMatchObject({
      taper: { at: 'in' },
      cylindricity: { at: 'over', by: expect.closeTo(1e-5, 9) },
      outOfRound: null,
      diameter: null,
    });
    expect(found.passes).toBe(false);
  });

  it('passes a difference that is the limit to the digit', () => {
    const readings = grid([82.015, 82.012], [82, 82]);
    const limits = { taper: { max: 0.015 * MM }, outOfRound: { max: 0.003 * MM } };
    expect(valueOf(judgeBore({ readings, limits })).passes).toBe(true);
  });

  it('names the end of the diameter that is worst off', () => {
    const readings = grid([81.995, 82.03], [82, 82]);
    expect(valueOf(judgeBore({ ...bore, readings })).judged.diameter).toMatchObject({ at: 'under' });
  });

  it('shows a piston that does not go in as a clearance under the limit', () => {
    const found = valueOf(judgeBore({ ...bore, piston: 82.01 * MM }));
    expect(microns(found.clearance!.least)).toBe(-8);
    expect(found.judged.clearance?.at).toBe('under');
  });

  it('does not mind which way up or on which axis it was read', () => {
    fc.assert(
      fc.property(heights, (rows) => {
        const facts = (some: [number, number][]) => {
          const found = valueOf(judgeBore({ readings: grid(...some) }));
          return [found.worstTaper, found.worstOutOfRound, found.cylindricity, found.smallest, found.largest];
        };
        const swapped = rows.map(([a, b]): [number, number] => [b, a]);
        expect(facts(swapped)).toEqual(facts(rows));
        expect(facts([...rows].reverse())).toEqual(facts(rows));
      }),
    );
  });

  it('has no taper larger than its cylindricity, and the same with two heights', () => {
    fc.assert(
      fc.property(heights, (rows) => {
        const found = valueOf(judgeBore({ readings: grid(...rows) }));
        expect(found.cylindricity).toBeGreaterThanOrEqual(found.worstTaper);
        if (rows.length === 2) expect(found.cylindricity).toBe(found.worstTaper);
      }),
    );
  });

  it('never passes more taper than it fails', () => {
    fc.assert(
      fc.property(between(0, 0.03), between(0, 0.03), (taper, more) => {
        const passes = (by: number) =>
          valueOf(judgeBore({ readings: grid([82 + by, 82], [82, 82]), limits: { taper: { max: 0.015 * MM } } }))
            .passes;
        if (!passes(taper)) expect(passes(taper + more)).toBe(false);
      }),
    );
  });

  it.each<[Partial<Bore>, string, string]>([
    [{ readings: grid([82, 82]) }, 'readings', 'The bore must hold 2 heights or more.'],
    [{ readings: [[0.082], [0.082, 0.082]] }, 'readings.0', 'Height 1 must hold 2 readings or more.'],
    [
      {
        readings: [
          [0.082, 0],
          [0.082, 0.082],
        ],
      },
      'readings.0.1',
      'Height 1, axis 2 must be more than zero.',
    ],
    [
      {
        readings: [
          [0.082, 82],
          [0.082, 0.082],
        ],
      },
      'readings.0.1',
      'Height 1, axis 2 must be 10 m or less.',
    ],
    [{ piston: undefined }, 'piston', 'The piston clearance needs the diameter of the piston.'],
  ])('refuses %j', (more, field, message) => {
    expect(judgeBore({ ...bore, ...more })).toEqual({ ok: false, problems: [{ field, message }] });
  });

  it('withstands odd input', () => sweep(judgeBore, bore));
});

const journal: Journal = {
  readings: grid([44.99, 44.988], [44.986, 44.987]),
  length: 25.4 * MM,
  limits: {
    diameter: { min: 44.98 * MM, max: 44.992 * MM },
    taper: { max: 0.005 * MM },
    outOfRound: { max: 0.005 * MM },
    cylindricity: { max: 0.005 * MM },
    taperPerLength: { max: 0.0045 / 25.4 },
  },
};

describe('a journal', () => {
  it('finds taper, also for its length, and out-of-round', () => {
    const found = valueOf(judgeJournal(journal));
    expect(found.taper.map(microns)).toEqual([4, 1]);
    expect(found.outOfRound.map(microns)).toEqual([2, 1]);
    expect(found.taperPerLength).toBeCloseTo(0.004 / 25.4, 12);
    expect(found.passes).toBe(true);
  });

  it('fails a short journal for a taper that a longer one may have', () => {
    const short = valueOf(judgeJournal({ ...journal, length: 20 * MM }));
    expect(short.judged).toMatchObject({ taperPerLength: { at: 'over' }, taper: { at: 'in' } });
    expect(short.passes).toBe(false);
  });

  it('works out the taper for a length also where nothing limits it', () => {
    const found = valueOf(judgeJournal({ readings: journal.readings, length: 25.4 * MM }));
    expect(found.taperPerLength).toBeCloseTo(0.004 / 25.4, 12);
    expect(found.judged.taperPerLength).toBeNull();
  });

  it('wants the length where a limit is for one', () => {
    expect(judgeJournal({ ...journal, length: undefined })).toEqual({
      ok: false,
      problems: [{ field: 'length', message: 'A taper for a length needs the length between the readings.' }],
    });
  });

  it('withstands odd input', () => sweep(judgeJournal, journal));
});
