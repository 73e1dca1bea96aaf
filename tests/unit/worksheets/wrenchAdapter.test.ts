import { describe, expect, it } from 'vitest';
import { answerOf, problemsOf, reasonsOf, textOf } from '../../factories/workedCase';

const published = { atBolt: '300 lbf·in', length: '10 in', adapter: '4 in', angle: '0' };
const answer = (changes: Record<string, string> = {}) => answerOf('wrench-adapter', { ...published, ...changes });

describe('the wrench with an adapter', () => {
  it('sets what TM 1-1500-204-23-9, figure 8-16, sets (seen): 214 lbf·in', () => {
    expect(textOf(answer(), 'setting')).toEqual({ metric: '24.2 N·m', inch: '214 lbf·in' });
    expect(answer().verdict).toBe('none');
  });

  it('says what it would cost to forget the adapter', () => {
    expect(reasonsOf(answer())[1]).toBe(
      'Set to 33.9 N·m as if there were no adapter, the bolt would get 47.5 N·m, 40 % too much.',
    );
    expect(reasonsOf(answer({ angle: '180' }))[1]).toContain('40 % too little');
    expect(reasonsOf(answer({ angle: '90' }))[1]).toBe(
      'The adapter changes nothing, because it does not make the wrench longer or shorter.',
    );
  });

  it('goes to the step of the wrench, and says what the bolt then gets', () => {
    const stepped = answer({ step: '0.5 N·m' });
    expect(textOf(stepped, 'setting')?.metric).toBe('24 N·m');
    expect(textOf(stepped, 'at-bolt')?.metric).toBe('33.6 N·m');
    expect(stepped.verdict).toBe('none');
    const coarse = answer({ step: '5 N·m', atBolt: '24 N·m' });
    expect(coarse.verdict).toBe('look');
    expect(reasonsOf(coarse)[0]).toBe(
      'The steps of this wrench miss the torque by 13 %. Take one that can be set finer.',
    );
  });

  it.each([
    [{ step: '60 N·m' }, 'step', 'The setting is less than half a step of the wrench. Take a smaller wrench.'],
    [
      { angle: '180', adapter: '10 in' },
      'adapter',
      'The adapter points back as far as the grip or beyond it; the wrench cannot turn the bolt.',
    ],
  ])('refuses %j', (changes, field, message) => {
    expect(problemsOf('wrench-adapter', { ...published, ...changes })).toEqual([{ field, message }]);
  });
});
