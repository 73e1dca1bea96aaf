/** Turns of phrase that several parts of a sheet share. */

const ORDINALS = ['First', 'Second', 'Third', 'Fourth', 'Fifth', 'Sixth'];

/** `passWord(1)` is "First pass". */
export const passWord = (pass: number): string => `${ORDINALS[pass - 1] ?? `${pass}th`} pass`;

/** `counted(1, 'place')` is "1 place", `counted(2, 'place')` "2 places". */
export const counted = (n: number, one: string, many = `${one}s`): string => `${n} ${n === 1 ? one : many}`;

/** `7f3a91c0` as it is read aloud and printed: `7f3a 91c0`. */
export const spacedCheck = (check: string): string => check.replace(/(.{4})(?=.)/g, '$1 ');

/** Bench time: "70 min", "2 h", "3 h 20 min". */
export function benchTime(minutes: number): string {
  if (minutes < 120) return `${minutes} min`;
  const rest = minutes % 60;
  return `${Math.floor(minutes / 60)} h${rest ? ` ${rest} min` : ''}`;
}

export const SKILL_WORDS = {
  apprentice: 'an apprentice',
  technician: 'a technician',
  senior: 'a senior technician',
} as const;
