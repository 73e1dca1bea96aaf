import type { Bulletin } from '@/domain/api/schemas/bulletins';

/** What a bulletin is about, as its heading. */
export function bulletinTitle({ kind, revision }: Pick<Bulletin, 'kind' | 'revision'>): string {
  switch (kind) {
    case 'withdrawn':
      return 'Withdrawn: do not work from this sheet';
    case 'brought back':
      return `Brought back: work from revision ${revision.letter} again`;
    case 'critical change':
      return `What changed in revision ${revision.letter}`;
  }
}

/** What was done, before the name of who did it. */
export const BULLETIN_ACTS: Record<Bulletin['kind'], string> = {
  withdrawn: 'Withdrawn',
  'brought back': 'Brought back',
  'critical change': 'Published',
};
