/** Turns of phrase that many sentences share. */

/** "4", "4 and 5", "4, 5 and 9". */
export const listed = (items: readonly (string | number)[]): string =>
  items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} and ${items.at(-1) ?? ''}`;

/** The text as a sentence begins. */
export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** The text as it stands inside a sentence, whatever it is. */
export const lowered = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);

/** A name inside a sentence: "Cover bolt" gives "cover bolt", while "VIN" and "K" stay as they are. */
export const nameInside = (name: string): string => (/^\p{Lu}\p{Ll}/u.test(name) ? lowered(name) : name);
