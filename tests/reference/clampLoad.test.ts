import { describe, expect, it } from 'vitest';
import { clampCheck, torqueFor } from '@/domain/measure/clampLoad';
import { convert } from '@/domain/measure/convert';
import { NUT_FACTORS } from '@/domain/measure/nutFactor';
import { valueOf } from '../factories/measures';

const LBF = 4.448222; // NIST SP 811, quoted
const inLbfIn = (nm: number) => {
  const made = convert(nm, 'N·m', 'lbf·in');
  return made.ok ? made.value : NaN;
};

describe("nut factors of Shigley's table 8-15 (9th edition, p. 439, seen)", () => {
  it.each([
    ['oiled', 0.18, 'lubricated'],
    ['anti-seize', 0.12, 'with anti-seize'],
    ['dry', 0.2, 'zinc-plated; cleaned and dry 0.20 quoted'],
  ] as const)('%s: %d (%s)', (condition, k, _source) => {
    expect(NUT_FACTORS[condition].k).toBe(k);
  });

  it('says where each comes from, and where there is no source', () => {
    for (const { origin } of Object.values(NUT_FACTORS)) expect(origin.length).toBeGreaterThan(20);
    for (const wet of ['threadlocker', 'sealant'] as const) expect(NUT_FACTORS[wet].origin).toContain('no source');
  });
});

describe('T = K·d·F, worked', () => {
  it('Shigley example 8-3(b): 25 000 lbf in 3/4 in at K 0.2 is 3750 lbf·in (question seen, answer computed here)', () => {
    expect(inLbfIn(valueOf(torqueFor(25_000 * LBF, 0.75 * 0.0254, 0.2))) / 3750).toBeCloseTo(1, 6);
  });

  it('M12 class 8.8 at 70 % of proof, K 0.2: about 34 kN and 82 N·m (quoted)', () => {
    const load = 0.7 * 580e6 * 84.3e-6;
    expect(Math.round(load / 1000)).toBe(34);
    const torque = valueOf(torqueFor(load, 0.012, 0.2));
    expect(Math.round(torque)).toBe(82);
    const check = valueOf(clampCheck({ nm: torque, thread: 'M12', pitch: 1.75, class: '8.8', condition: 'dry' }));
    expect(check.share).toBeCloseTo(0.7, 2);
  });

  it.each([
    ['M6', 10.4, 15.0, 17.6],
    ['M8', 25.4, 36.5, 42.6],
    ['M10', 50.6, 72.2, 84.5],
    ['M12', 88.0, 126, 147],
    ['M14', 140, 201, 235],
  ])(
    '%s dry at %d, %d and %d N·m is 75 %% of proof in 8.8, 10.9 and 12.9 (computed from the table loads)',
    (thread, ...torques) => {
      ['8.8', '10.9', '12.9'].forEach((name, i) => {
        const check = valueOf(clampCheck({ nm: torques[i]!, thread, class: name, condition: 'dry' }));
        expect(Math.abs((check.share ?? 0) / 0.75 - 1)).toBeLessThan(0.01);
      });
    },
  );
});
