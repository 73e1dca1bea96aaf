/**
 * Revision letters by ASME Y14.35: upper case; I, O, Q, S, X and Z are left out because they are misread; after Y
 * comes AA. Two letters at most, so 420 revisions (the limit of two is from memory).
 */
const ALPHABET = 'ABCDEFGHJKLMNPRTUVWY';
const BASE = ALPHABET.length;
const LAST = BASE + BASE * BASE;

/** Place of a letter in the chain, from 0 for A; -1 for what is no revision letter. */
export function letterIndex(letter: string): number {
  const places = [...letter].map((character) => ALPHABET.indexOf(character));
  const [first = -1, second] = places;
  if (places.length > 2 || places.includes(-1) || first === -1) return -1;
  return second === undefined ? first : BASE + first * BASE + second;
}

export const isRevisionLetter = (text: string): boolean => letterIndex(text) !== -1;

/**
 * The letter after this one; A for the first revision (`null`).
 *
 * @throws RangeError for what is no letter, and after YY, where the standard ends
 */
export function nextLetter(letter: string | null): string {
  const index = letter === null ? 0 : letterIndex(letter) + 1;
  if (letter !== null && index === 0) throw new RangeError(`"${letter}" is no revision letter.`);
  if (index >= LAST) throw new RangeError('Revision YY is the last that ASME Y14.35 has a letter for.');
  const at = (place: number) => ALPHABET.charAt(place);
  return index < BASE ? at(index) : at(Math.floor(index / BASE) - 1) + at(index % BASE);
}

/** Negative where `a` came before `b`; for sorting a history. What is no letter sorts first. */
export const compareLetters = (a: string, b: string): number => letterIndex(a) - letterIndex(b);
