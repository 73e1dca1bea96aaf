import { describe, expect, it } from 'vitest';
import { answerOf, problemsOf, reasonsOf, textOf } from '../../factories/workedCase';

const bore = { 'tolerance.min': '51.975', 'tolerance.max': '52' };

describe('the gauge fit', () => {
  it.each([
    ['0.0025 mm', 'pass', '10.0 to 1'],
    ['0.005 mm', 'pass', '5.0 to 1'],
    ['0.01 mm', 'look', '2.5 to 1'],
    ['0.001 mm', 'pass', '25 to 1'],
  ])('a tolerance of 0.025 mm and a tool of %s: %s, %s', (resolution, verdict, ratio) => {
    const made = answerOf('gauge-fit', { ...bore, resolution });
    expect(made.verdict).toBe(verdict);
    expect(textOf(made, 'ratio')?.metric).toBe(ratio);
    expect(reasonsOf(made)[0]).toContain('whole tolerance band');
  });

  it('takes the larger of step and uncertainty', () => {
    const made = answerOf('gauge-fit', { ...bore, resolution: '0.001 mm', uncertainty: '0.01 mm' });
    expect(textOf(made, 'ratio')?.metric).toBe('2.5 to 1');
  });

  it('names the tool to reach for in the reader’s own unit', () => {
    const made = answerOf('gauge-fit', { 'tolerance.min': '2 in', 'tolerance.max': '2.002 in' });
    expect(made.verdict).toBe('none');
    expect(textOf(made, 'ideal-tool')).toEqual({ metric: '0.005 mm', inch: '0.0001 in' });
    expect(textOf(made, 'least-tool')).toEqual({ metric: '0.01 mm', inch: '0.0005 in' });
    const fine = answerOf('gauge-fit', { 'tolerance.min': '1', 'tolerance.max': '1.0000001' });
    expect(textOf(fine, 'ideal-tool')?.metric).toBe('none that is usual');
  });

  it.each([
    [
      { 'tolerance.max': '0.05' },
      'tolerance.min',
      'The limit must have a least and a most; with one end open there is no tolerance to fit a tool to.',
    ],
    [
      { 'tolerance.min': '0.05' },
      'tolerance.max',
      'The limit must have a least and a most; with one end open there is no tolerance to fit a tool to.',
    ],
    [{ 'tolerance.min': '5', 'tolerance.max': '5' }, 'tolerance.max', 'The most must be more than the least.'],
  ])('refuses %j', (typed, field, message) => {
    expect(problemsOf('gauge-fit', typed)).toEqual([{ field, message }]);
  });
});
