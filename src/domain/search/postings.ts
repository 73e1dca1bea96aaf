import SearchableMap from 'minisearch/SearchableMap';

/**
 * The inverted index. Words live in MiniSearch's radix tree, which finds them by beginning and by slips of the
 * finger; for each word there are two flat arrays: the sheets that hold it and how much it weighs there. MiniSearch's
 * own scorer makes an object a sheet and a word, which took ten times the 16 ms of a keystroke at ten thousand sheets.
 *
 * Weights are BM25F (Robertson, Zaragoza, Taylor 2004), worked out once when the index is made: a word's occurrences are
 * weighted by field and by the field's length, added, and flattened, and a rare word weighs more.
 */
export interface Posting {
  /** Places of the sheets, rising. */
  documents: Uint32Array;
  /** Weight of the word in each, more than zero. */
  weights: Float32Array;
}

export interface Field {
  boost: number;
  /** Tokens of the field for each sheet. */
  tokens: readonly (readonly string[])[];
}

const FLATTEN = 1.2;
const LENGTH_MATTERS = 0.6;

interface Growing {
  documents: number[];
  counts: number[];
}

export class Postings {
  readonly size: number;
  readonly #terms = new SearchableMap<Posting>();

  /** @param size how many sheets there are; each field has tokens for every one */
  constructor(size: number, fields: readonly Field[]) {
    this.size = size;
    const average = fields.map(({ tokens }) => tokens.reduce((sum, list) => sum + list.length, 0) / Math.max(1, size));
    const growing = new Map<string, Growing>();
    const here = new Map<string, number>();
    for (let document = 0; document < size; document += 1) {
      here.clear();
      fields.forEach(({ boost, tokens }, f) => {
        const list = tokens[document] ?? [];
        const long = 1 - LENGTH_MATTERS + (LENGTH_MATTERS * list.length) / (average[f] || 1);
        for (const token of list) here.set(token, (here.get(token) ?? 0) + boost / long);
      });
      for (const [token, count] of here) {
        const known = growing.get(token);
        if (known) {
          known.documents.push(document);
          known.counts.push(count);
        } else growing.set(token, { documents: [document], counts: [count] });
      }
    }
    for (const [token, { documents, counts }] of growing) {
      const rarity = Math.log(1 + (size - documents.length + 0.5) / (documents.length + 0.5));
      const weights = Float32Array.from(counts, (count) => rarity * (count / (FLATTEN + count)));
      this.#terms.set(token, { documents: Uint32Array.from(documents), weights });
    }
  }

  has(term: string): boolean {
    return this.#terms.has(term);
  }

  get(term: string): Posting | undefined {
    return this.#terms.get(term);
  }

  /** Terms that begin with `start`, with a weight that falls with what is missing. */
  *beginning(start: string): Generator<[term: string, posting: Posting, weight: number]> {
    for (const [term, posting] of this.#terms.atPrefix(start))
      yield [
        term,
        posting,
        term === start ? 1 : (0.7 * term.length) / (term.length + 0.3 * (term.length - start.length)),
      ];
  }

  /** Terms within `slips` letters of `word`, with a weight that falls with each. */
  *near(word: string, slips: number): Generator<[term: string, posting: Posting, weight: number]> {
    for (const [term, [posting, distance]] of this.#terms.fuzzyGet(word, slips))
      yield [term, posting, distance === 0 ? 1 : (0.5 * word.length) / (word.length + distance)];
  }
}
