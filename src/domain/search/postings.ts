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
  /** Tokens of the field in a sheet, by the sheet's place. */
  tokensOf: (document: number) => readonly string[];
}

const FLATTEN = 1.2;
const LENGTH_MATTERS = 0.6;

/** A list of numbers that grows without making an object of each: a book of ten thousand sheets has a million of them. */
class Growing<A extends Uint32Array | Float32Array> {
  length = 0;
  array: A;
  readonly #make: (size: number) => A;

  constructor(make: (size: number) => A) {
    this.#make = make;
    this.array = make(1024);
  }

  push(value: number): void {
    if (this.length === this.array.length) {
      const larger = this.#make(2 * this.length);
      larger.set(this.array);
      this.array = larger;
    }
    this.array[this.length] = value;
    this.length += 1;
  }
}

const whole = (size: number): Uint32Array => new Uint32Array(size);
const real = (size: number): Float32Array => new Float32Array(size);

export class Postings {
  readonly size: number;
  readonly #terms = new SearchableMap<Posting>();

  /** @param size how many sheets there are; each field is asked once for every one */
  constructor(size: number, fields: readonly Field[]) {
    this.size = size;
    const ids = new Map<string, number>();
    // One entry for each time a term stands in a field of a sheet, in the order of the sheets.
    const terms = new Growing(whole);
    const places = new Growing(whole);
    const fieldOf = new Growing(whole);
    const lengths = fields.map(() => whole(size));
    for (let document = 0; document < size; document += 1)
      fields.forEach(({ tokensOf }, f) => {
        const tokens = tokensOf(document);
        (lengths[f] as Uint32Array)[document] = tokens.length;
        for (const token of tokens) {
          let id = ids.get(token);
          if (id === undefined) ids.set(token, (id = ids.size));
          terms.push(id);
          places.push(document);
          fieldOf.push(f);
        }
      });

    const average = lengths.map((list) => list.reduce((sum, length) => sum + length, 0) / Math.max(1, size) || 1);
    const worth = (entry: number): number => {
      const f = fieldOf.array[entry] as number;
      const length = (lengths[f] as Uint32Array)[places.array[entry] as number] as number;
      const long = 1 - LENGTH_MATTERS + (LENGTH_MATTERS * length) / (average[f] as number);
      return (fields[f] as Field).boost / long;
    };

    // Sorted by term, which keeps the sheets of each in order.
    const starts = whole(ids.size + 1);
    for (let i = 0; i < terms.length; i += 1) (starts[(terms.array[i] as number) + 1] as number) += 1;
    for (let id = 0; id < ids.size; id += 1) (starts[id + 1] as number) += starts[id] as number;
    const next = starts.slice();
    const sorted = whole(terms.length);
    for (let i = 0; i < terms.length; i += 1) {
      const id = terms.array[i] as number;
      sorted[next[id] as number] = i;
      (next[id] as number) += 1;
    }

    const documents = new Growing(whole);
    const weights = new Growing(real);
    const slices: [from: number, to: number][] = [];
    for (let id = 0; id < ids.size; id += 1) {
      const from = documents.length;
      for (let i = starts[id] as number; i < (starts[id + 1] as number); i += 1) {
        const entry = sorted[i] as number;
        const document = places.array[entry] as number;
        const last = documents.length - 1;
        if (last >= from && documents.array[last] === document) (weights.array[last] as number) += worth(entry);
        else {
          documents.push(document);
          weights.push(worth(entry));
        }
      }
      slices.push([from, documents.length]);
    }
    for (const [token, id] of ids) {
      const [from, to] = slices[id] as [number, number];
      const posting = { documents: documents.array.subarray(from, to), weights: weights.array.subarray(from, to) };
      const held = to - from;
      const rarity = Math.log(1 + (size - held + 0.5) / (held + 0.5));
      for (let i = 0; i < held; i += 1) {
        const count = posting.weights[i] as number;
        posting.weights[i] = rarity * (count / (FLATTEN + count));
      }
      this.#terms.set(token, posting);
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
