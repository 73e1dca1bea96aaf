import { describe, expect, it } from 'vitest';
import { answerOf, problemsOf, reasonsOf, textOf } from '../../factories/workedCase';

const m8 = { thread: 'M8', pitch: '1.25 mm', propertyClass: '8.8', condition: 'dry', torque: '22 N·m' };
const answer = (changes: Record<string, string> = {}) => answerOf('clamp', { ...m8, ...changes });

describe('the clamp check', () => {
  it('gives share, loads and where each number comes from', () => {
    const made = answer();
    expect(made.verdict).toBe('pass');
    expect(textOf(made, 'share')?.metric).toBe('65 %');
    // ISO 898-1 prints 21 200 N for M8 in 8.8 (quoted).
    expect(textOf(made, 'proof-load')).toEqual({ metric: '21.2 kN', inch: '4770 lbf' });
    expect(made.results.find(({ key }) => key === 'clamp-load')?.formula).toEqual({
      metric: 'F = T / (K · d) = 22 N·m / (0.20 · 8 mm) = 13.8 kN',
      inch: 'F = T / (K · d) = 195 lbf·in / (0.20 · 0.3150 in) = 3090 lbf',
    });
    for (const key of ['clamp-load', 'nut-factor', 'proof-load', 'stress-area'])
      expect(made.results.find((one) => one.key === key)?.source, key).toBeTruthy();
  });

  it.each([
    [
      { torque: '40 N·m' },
      'fail',
      'The final torque clamps to 118 % of proof load: the bolt would stay longer, or break.',
    ],
    [{ torque: '8 N·m' }, 'look', 'The final torque clamps to 24 % of proof load, less than the 30 % that is usual.'],
    [{ torque: '8 N·m', low: '20' }, 'pass', 'The final torque clamps to 24 % of proof load.'],
    [
      { angle: '90' },
      'none',
      'The snug torque clamps to 65 % of proof load; the angle then takes the bolt into yield on purpose, where T = K·d·F says nothing.',
    ],
    [
      { thread: 'G 1/4', pitch: '' },
      'none',
      'A pipe thread is tightened until it seals; it does not clamp, so no clamp load can be given.',
    ],
    [
      { propertyClass: '' },
      'none',
      'No property class is given; look at the head of the bolt. Without a proof load, the clamp load cannot be judged.',
    ],
  ])('%j: %s', (changes, verdict, reason) => {
    const made = answer(changes);
    expect(made.verdict).toBe(verdict);
    expect(reasonsOf(made)[0]).toBe(reason);
  });

  it('leaves out what cannot be given', () => {
    expect(answer({ thread: 'G 1/4', pitch: '' }).results).toEqual([]);
    expect(answer({ propertyClass: '' }).results.map(({ key }) => key)).toEqual(['clamp-load', 'nut-factor']);
  });

  it('names a unit that was taken for another, by the change and by the size', () => {
    const changed = answer({ before: '16.2 N·m' });
    expect(changed.verdict).toBe('look');
    expect(reasonsOf(changed)[1]).toBe(
      'The torque rose by a factor near 1.36, as if a figure in N·m had been taken for lbf·ft.',
    );
    const sized = answer({ torque: '195 N·m' });
    expect(sized.verdict).toBe('fail');
    expect(reasonsOf(sized)[1]).toContain('the same figure in lbf·in would be sensible');
    expect(reasonsOf(answer({ before: '20 N·m' }))).toHaveLength(1);
  });

  it.each([
    [{ thread: 'M8x1.25' }, 'thread'],
    [{ thread: '3/8-16 UNC' }, 'pitch'],
    [{ pitch: '5 mm' }, 'pitch'],
  ])('refuses %j at its box', (changes, field) => {
    expect(problemsOf('clamp', { ...m8, ...changes }).map((problem) => problem.field)).toEqual([field]);
  });
});
