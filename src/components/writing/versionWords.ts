import type { DraftVersion } from '@/domain/api/schemas/versions';
import { capital, listed } from '@/domain/wording';

/** How a version came to be, in words; null for one that was simply saved. */
export function becameWords({ kind, of, base }: Pick<DraftVersion, 'kind' | 'of' | 'base'>): string | null {
  switch (kind) {
    case 'start':
      return base ? `Begun on revision ${base}` : 'Begun as a new procedure';
    case 'write':
      return null;
    case 'submit':
      return 'Sent in for review';
    case 'return':
      return 'Returned to its author';
    case 'restore':
      return `Gone back to version ${of ?? ''}`;
    case 'merge':
      return `Brought to revision ${base ?? ''}`;
    case 'suggestion':
      return 'A suggestion taken up';
    case 'aside':
      return 'Set aside, when the text of another tab was taken';
  }
}

const MOST = 4;

/** "Step 3 deleted, torque Cover bolt changed and 2 more". Empty where nothing differs. */
export function whatWords(what: readonly string[]): string {
  const told = what.length > MOST ? [...what.slice(0, MOST - 1), `${what.length - MOST + 1} more`] : what;
  return capital(listed(told));
}
