import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createSearch, type SearchBook } from '@/domain/search/engine';
import { VocabularyGroup } from '@/domain/search/vocabulary';
import { generatedDocuments, GENERATED_ENGINES } from '../../factories/generatedBook';
import { shippedVocabulary } from '../../factories/shippedBook';

const vocabulary = shippedVocabulary();
const [template] = generatedDocuments(1);
if (!template) throw new Error('no document');

/** A book of one sheet for each title, with nothing else to find it by. */
const bookOf = (titles: string[]): SearchBook => ({
  documents: titles.map((title, i) => ({
    ...template,
    number: `P-${String(9000 + i)}`,
    title,
    summary: 'Nothing to be found by.',
    steps: [],
    tools: [],
    parts: [],
    torques: [],
    limits: [],
    timers: [],
    engines: [],
  })),
  vocabulary,
  engines: GENERATED_ENGINES,
});

describe('the vocabulary that ships', () => {
  it('has at least 80 groups, of at least two names or spellings each', () => {
    expect(vocabulary.length).toBeGreaterThanOrEqual(80);
  });

  it('says no term twice in a group', () => {
    for (const { terms, misspelt = [] } of vocabulary) {
      const all = [...terms, ...misspelt].map((text) => text.toLowerCase());
      expect(new Set(all).size, all.join(', ')).toBe(all.length);
    }
  });

  it('refuses a group that joins nothing, and one with an empty name', () => {
    expect(VocabularyGroup.safeParse({ terms: ['sump'] }).success).toBe(false);
    expect(VocabularyGroup.safeParse({ terms: ['sump', ' '] }).success).toBe(false);
    expect(VocabularyGroup.safeParse({ terms: ['sump', '··'] }).success).toBe(false);
  });
});

describe('trade names', () => {
  const pairs = vocabulary.flatMap(({ terms }) => terms.flatMap((a) => terms.map((b) => [a, b] as const)));

  it('find each other both ways, whichever the sheet uses', () => {
    const names = vocabulary.flatMap(({ terms }) => terms);
    const book = bookOf(names);
    const search = createSearch(book);
    const found = new Map(
      names.map((name) => [
        name,
        new Set(search.query(`${name} `, undefined, { limit: 1000 }).hits.map((hit) => hit.title)),
      ]),
    );
    for (const [a, b] of pairs) {
      expect(found.get(a)?.has(b), `${a} finds ${b}`).toBe(true);
      expect(found.get(b)?.has(a), `${b} finds ${a}`).toBe(true);
    }
  });

  it('are found by their common misspellings', () => {
    for (const { terms, misspelt = [] } of vocabulary) {
      const search = createSearch(bookOf([...terms, 'Zeppelin']));
      for (const wrong of misspelt)
        expect(
          search.query(`${wrong} `).hits.map((hit) => hit.title),
          wrong,
        ).toContain(terms[0]);
    }
  });
});

describe('any query', () => {
  const search = createSearch({ documents: generatedDocuments(60), vocabulary, engines: GENERATED_ENGINES });

  it('is answered, whatever is typed', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 300, unit: 'binary' }), (text) => {
        const answer = search.query(text);
        expect(answer.hits.length).toBeLessThanOrEqual(20);
        expect(answer.total).toBeGreaterThanOrEqual(answer.hits.length);
      }),
    );
  });

  it('gives the same answer twice, and does not depend on what was asked before', () => {
    const word = fc.constantFrom(
      'oil',
      'pan',
      'cover',
      '10 Nm',
      'M8',
      'piston',
      'ring',
      'zeppelin',
      'inject',
      'P-0003',
    );
    fc.assert(
      fc.property(fc.array(word, { maxLength: 4 }), fc.array(word, { maxLength: 4 }), (one, other) => {
        const before = search.query(one.join(' '));
        search.query(other.join(' '));
        expect(search.query(one.join(' '))).toEqual(before);
      }),
      { numRuns: 40 },
    );
  });
});
