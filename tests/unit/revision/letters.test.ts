import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareLetters, isRevisionLetter, letterIndex, nextLetter } from '@/domain/revision/letters';

const chain: string[] = [];
for (let i = 0; i < 420; i += 1) chain.push(nextLetter(chain.at(-1) ?? null));

describe('revision letters', () => {
  // ASME Y14.35: I, O, Q, S, X and Z are not used (quoted in the Navy's Engineering Aid manual); after Y comes AA (quoted).
  it('runs through the twenty letters of ASME Y14.35', () => {
    expect(chain.slice(0, 20).join(' ')).toBe('A B C D E F G H J K L M N P R T U V W Y');
  });

  it.each([
    ['H', 'J'],
    ['N', 'P'],
    ['P', 'R'],
    ['R', 'T'],
    ['W', 'Y'],
    ['Y', 'AA'],
    ['AH', 'AJ'],
    ['AY', 'BA'],
    ['YW', 'YY'],
  ])('after %s comes %s', (letter, next) => {
    expect(nextLetter(letter)).toBe(next);
  });

  it('has 420 of them, each once, none with a letter that is misread', () => {
    expect(new Set(chain).size).toBe(420);
    expect(chain.at(-1)).toBe('YY');
    expect(chain.filter((letter) => /[^A-HJ-NPRT-WY]/.test(letter))).toEqual([]);
  });

  it('ends after YY and refuses what is no letter', () => {
    expect(() => nextLetter('YY')).toThrow('Revision YY is the last that ASME Y14.35 has a letter for.');
    for (const text of ['', 'I', 'a', 'AAA', 'A1', 'XA', '-']) {
      expect(isRevisionLetter(text), text).toBe(false);
      expect(() => nextLetter(text)).toThrow(`"${text}" is no revision letter.`);
    }
  });

  it('sorts a history as it was written', () => {
    const place = fc.integer({ min: 0, max: 419 });
    fc.assert(
      fc.property(place, place, (a, b) => {
        expect(Math.sign(compareLetters(chain[a]!, chain[b]!))).toBe(Math.sign(a - b));
        expect(letterIndex(chain[a]!)).toBe(a);
      }),
    );
    expect(['AA', 'B', 'Y', 'A'].sort(compareLetters)).toEqual(['A', 'B', 'Y', 'AA']);
  });
});
