import type { Piece } from '@/domain/writing/insert';
import type { Format } from './field/formats';

/** What the buttons under a field put in at its caret. */
export interface FieldHandle {
  put: (piece: Piece) => void;
}

/** What the menu above it does there besides. */
export interface LayoutHandle {
  /** Ways of setting words that can be used where the caret stands. */
  formats: () => readonly Format[];
  run: (format: Format) => void;
}
