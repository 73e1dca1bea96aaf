import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { Gravity } from '@/components/review/Gravity';
import type { Severity } from '@/domain/revision/types';

/** Its lines, in words. */
const lines = (level: Severity['level'], ...because: string[]) =>
  renderToStaticMarkup(<Gravity severity={{ level, because }} />)
    .replace(/<\/(?:p|li)>/g, '\n')
    .replace(/<[^>]*>/g, '')
    .trim()
    .split('\n');

describe('how grave a change is, in the head of a proposal', () => {
  it('says nothing of an ordinary one, one reason in a sentence, more in a list', () => {
    expect(lines('ordinary')).toEqual(['']);
    expect(lines('serious', 'a torque changes (Cover bolt)')).toEqual(['Serious: a torque changes (Cover bolt).']);
    expect(lines('grave', 'the limit “Gap” is wider', 'a hold point is dropped')).toEqual([
      'Grave, for 2 reasons',
      'The limit “Gap” is wider',
      'A hold point is dropped',
    ]);
  });

  it('counts what does not fit, and never a rest of one', () => {
    const because = (many: number) => Array.from({ length: many }, (_, i) => `reason ${i + 1}`);
    expect(lines('grave', ...because(6)).at(-1)).toBe('Reason 6');
    expect(lines('grave', ...because(8)).slice(-2)).toEqual(['Reason 5', 'And 3 more']);
  });
});
