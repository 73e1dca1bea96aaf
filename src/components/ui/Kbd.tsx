import type { ReactNode } from 'react';

/** A key on the keyboard. */
export const Kbd = ({ children }: { children: ReactNode }) => (
  <kbd className="inline-block min-w-6 rounded border border-rule bg-sheet px-1.5 text-center font-sans text-[0.8125rem] font-medium text-ink-2">
    {children}
  </kbd>
);
