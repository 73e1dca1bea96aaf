import type { VocabularyGroup } from './vocabulary';
import { fold, wordsOf } from './words';

/** Groups met at a place in a text: `length` words from there on name each of `groups`. */
export interface Meeting {
  length: number;
  groups: readonly number[];
}

const MOST_COMPLETIONS = 3;

/** The groups made ready for looking up by folded words. A group's number is its place in the list given. */
export class Phrases {
  readonly #groups: readonly VocabularyGroup[];
  readonly #byPhrase = new Map<string, number[]>();
  readonly #sorted: string[];
  /** How many words the longest phrase has that begins with a word; most words begin none. */
  readonly #longest = new Map<string, number>();

  constructor(groups: readonly VocabularyGroup[]) {
    this.#groups = groups;
    groups.forEach((group, at) => {
      for (const text of [...group.terms, ...(group.misspelt ?? [])]) {
        const words = wordsOf(text).map((word) => fold(word.text));
        const first = words[0] ?? '';
        this.#longest.set(first, Math.max(this.#longest.get(first) ?? 0, words.length));
        const known = this.#byPhrase.get(words.join(' '));
        if (!known) this.#byPhrase.set(words.join(' '), [at]);
        else if (!known.includes(at)) known.push(at);
      }
    });
    this.#sorted = [...this.#byPhrase.keys()].sort();
  }

  /** The names of a group as a reader sees them. */
  names(group: number): string[] {
    return this.#groups[group]?.terms ?? [];
  }

  /** Every phrase that begins at `at`, longest first. `words` are folded. */
  startingAt(words: readonly string[], at: number): Meeting[] {
    const met: Meeting[] = [];
    const longest = this.#longest.get(words[at] ?? '') ?? 0;
    for (let length = Math.min(longest, words.length - at); length > 0; length -= 1) {
      const groups = this.#byPhrase.get(words.slice(at, at + length).join(' '));
      if (groups) met.push({ length, groups });
    }
    return met;
  }

  /** Groups with a phrase that goes on from `typed` ("rocker cov"); none where too many could be meant. */
  completing(typed: string): number[] {
    let low = 0;
    let high = this.#sorted.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((this.#sorted[middle] ?? '') < typed) low = middle + 1;
      else high = middle;
    }
    const groups = new Set<number>();
    for (let i = low; this.#sorted[i]?.startsWith(typed); i += 1) {
      for (const group of this.#byPhrase.get(this.#sorted[i] ?? '') ?? []) groups.add(group);
      if (groups.size > MOST_COMPLETIONS) return [];
    }
    return [...groups];
  }
}
