import { describe, expect, it } from 'vitest';
import { answerOf, reasonsOf, textOf } from '../../factories/workedCase';

describe('the viscosity grade', () => {
  it('names every grade that holds a viscosity, in any unit', () => {
    for (const viscosity of ['7', '7 cSt', '7.0 mm2/s']) {
      const made = answerOf('viscosity-grade', { viscosity });
      expect(made.verdict).toBe('none');
      expect(textOf(made, 'grades')?.metric).toBe('SAE 12, 16, 20');
    }
    expect(textOf(answerOf('viscosity-grade', { viscosity: '30' }), 'grades')?.metric).toBe('None');
  });

  it.each([
    ['10.4', '30', 'pass', '10.40 mm²/s is in SAE 30, which runs from 9.3 to below 12.5 mm²/s.'],
    ['9.3', '20', 'fail', '9.30 mm²/s is outside SAE 20, which runs from 6.9 to below 9.3 mm²/s.'],
    ['7', '16', 'pass', '7.00 mm²/s is in SAE 16, which runs from 6.1 to below 8.2 mm²/s.'],
  ])('%s and SAE %s: %s', (viscosity, grade, verdict, reason) => {
    const made = answerOf('viscosity-grade', { viscosity, grade });
    expect(made.verdict).toBe(verdict);
    expect(reasonsOf(made)[0]).toBe(reason);
  });

  it('says that it looks at one figure of several', () => {
    expect(reasonsOf(answerOf('viscosity-grade', { viscosity: '10' })).at(-1)).toContain('one figure of SAE J300');
  });
});
