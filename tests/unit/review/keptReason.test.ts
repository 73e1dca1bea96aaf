import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { keepReason, keptReason } from '@/components/review/keptReason';

let stored: Map<string, string>;
beforeEach(() => {
  stored = new Map();
  vi.stubGlobal('sessionStorage', {
    getItem: (key: string) => stored.get(key) ?? null,
    setItem: (key: string, value: string) => void stored.set(key, value),
    removeItem: (key: string) => void stored.delete(key),
  });
});
afterEach(() => vi.unstubAllGlobals());

const written = { act: 'decline' as const, anchor: 'step:wipe', text: 'Which cloth?' };

it('gives back what was typed, of that proposal alone', () => {
  keepReason('one', written);
  expect(keptReason('one')).toEqual({ ...written, open: true });
  expect(keptReason('two')).toBeNull();
});

it('keeps it when its panel is closed, without opening it again', () => {
  keepReason('one', written, false);
  expect(keptReason('one')).toEqual({ ...written, open: false });
});

it('keeps what was typed before publishing was chosen, as the reason of a return', () => {
  keepReason('one', { ...written, act: 'publish' }, false);
  expect(keptReason('one')).toMatchObject({ act: 'return', text: 'Which cloth?' });
});

it('forgets it once it was sent, and never keeps blanks', () => {
  keepReason('one', written);
  keepReason('one', null);
  keepReason('two', written);
  keepReason('two', { ...written, text: ' \n' });
  expect(stored.size).toBe(0);
});

it.each(['', '{', 'null', '[]', '"text"', '{"act":"publish","text":"x"}', '{"act":"return","text":7}'])(
  'reads nothing out of %j',
  (text) => {
    stored.set('review.one', text);
    expect(keptReason('one')).toBeNull();
  },
);

it('reads a lost place as the whole', () => {
  stored.set('review.one', '{"act":"return","text":"Why","anchor":4}');
  expect(keptReason('one')).toEqual({ act: 'return', text: 'Why', anchor: '', open: true });
});

it('does without storage that is full or forbidden', () => {
  vi.stubGlobal('sessionStorage', {
    getItem: () => {
      throw new Error('forbidden');
    },
    setItem: () => {
      throw new Error('full');
    },
  });
  expect(() => keepReason('one', written)).not.toThrow();
  expect(keptReason('one')).toBeNull();
});
