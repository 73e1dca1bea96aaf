/** The text of an earlier revision, proposed again. It is a change like any other: it needs a reason, review and agreements. */

const BEGINNING = /^Brings back revision ([A-HJ-NPRT-WY]{1,2}):/;

/** The reason of such a draft. `rest` is what its author writes behind the beginning, which is never said twice. */
export const restoreReason = (letter: string, rest = ''): string =>
  `Brings back revision ${letter}: ${rest.trim().replace(BEGINNING, '').trim()}`;

/** What to add where a reason is only begun; null for one that says why. */
export function unfinishedReason(reason: string): string | null {
  const [beginning, letter] = BEGINNING.exec(reason.trim()) ?? [];
  if (beginning === undefined || reason.trim() !== beginning) return null;
  return `Write why revision ${letter ?? ''} is to come back, behind “${beginning}”.`;
}
