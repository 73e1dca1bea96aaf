import { describe, expect, it } from 'vitest';
import { chosenPick, holdUp, progressOf, uploadedPick, type Pick } from '@/components/photos/picks';
import { LARGEST_FILE } from '@/domain/photos/photos';

const photo = { id: 'a', url: '/photos/a', small: '/photos/a/small', width: 3, height: 2, bytes: 9, alt: 'The corner' };
const there = (more: Partial<Pick> = {}): Pick => ({ ...uploadedPick(photo), ...more });
const file = (bytes: number) => ({ name: 'a.jpg', size: bytes }) as File;

describe('a chosen photo', () => {
  it('waits for its turn, unless it is too large to be sent at all', () => {
    expect(chosenPick(file(LARGEST_FILE), 'k')).toMatchObject({ state: 'waiting', error: null });
    expect(chosenPick(file(LARGEST_FILE + 1), 'k')).toMatchObject({
      state: 'failed',
      again: false,
      error: 'It has more than 15 MB; 15 MB is the most. Choose a smaller one.',
    });
    expect(chosenPick(file(18.4 * 1024 * 1024), 'k').error).toMatch(/^It has 18 MB/);
  });

  it('says how far it has come, and never that it is there before it is', () => {
    expect(progressOf(there({ state: 'waiting', share: 0 }))).toBe('Waits for its turn');
    expect(progressOf(there({ state: 'sending', share: 0.456 }))).toBe('Sending, 45 %');
    expect(progressOf(there({ state: 'sending', share: 0.999 }))).toBe('Sending, 99 %');
    expect(progressOf(there({ state: 'sending', share: 1 }))).toBe('Sent, being prepared');
  });
});

it('what is missing holds the sending up, the gravest first', () => {
  expect(holdUp([])).toBeNull();
  expect(holdUp([there()])).toBeNull();
  expect(holdUp([there({ state: 'sending' }), there({ state: 'failed' })])?.said).toMatch(/could not be sent/);
  expect(holdUp([there({ alt: '' }), there({ state: 'waiting' })])?.said).toMatch(/still on its way/);
  expect(holdUp([there(), there({ key: 'b', alt: '  ' })])).toEqual({
    said: 'Say what the photo shows, for whoever cannot see it.',
    key: 'b',
  });
});
