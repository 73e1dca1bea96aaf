import type { ReactNode } from 'react';
import { classes } from './classes';

/** A key that acts alone. Not shown to whoever has switched such keys off; see `singleKeys.ts`. */
export const Kbd = ({ children, className }: { children: ReactNode; className?: string }) => (
  <kbd
    className={classes(
      'inline-block min-w-6 rounded border border-rule bg-sheet px-1.5 text-center font-sans text-[0.8125rem] font-medium text-ink-2',
      className,
    )}
  >
    {children}
  </kbd>
);
