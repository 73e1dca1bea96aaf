import type { Conflict, Side } from '@/domain/revision/mergeTypes';

/** Why an author is asked, in words. */
export function askWords({ reason, kind }: Conflict, letter: string): string {
  switch (reason) {
    case 'both':
      return kind === 'entry'
        ? `You and revision ${letter} both changed it. Take one of them whole: values of both together are values that nobody chose.`
        : `You and revision ${letter} both changed it.`;
    case 'added':
      return `You and revision ${letter} both added it, each in another way.`;
    case 'mineRemoved':
      return `You took it away; revision ${letter} changed or moved it.`;
    case 'theirsRemoved':
      return `Revision ${letter} took it away; you changed or moved it.`;
    case 'order':
      return 'Both arranged them anew. You can move them again at the desk afterwards.';
    case 'reference':
      return 'One of you took it away or changed it, and the words of the other point at it. Without it, those words must be mended at the desk afterwards.';
  }
}

export const sideNames = (base: string, letter: string): Record<Side, string> => ({
  base: `Revision ${base}, where you started`,
  theirs: `Revision ${letter}, as published`,
  mine: 'Yours',
});

/** "3 places", "1 place". */
export const placesWords = (count: number): string => (count === 1 ? '1 place' : `${count} places`);
