import type { ReactNode } from 'react';

/** For ears only. */
export const VisuallyHidden = ({ children }: { children: ReactNode }) => <span className="sr-only">{children}</span>;
