import type { ReactNode } from 'react';
import { classes } from './classes';

/**
 * Something to know before going on: ink frame, heavy left edge. Not for hazards, which have signal panels.
 * `live` makes a screen reader say it when it appears: "status" when convenient, "alert" at once.
 */
export function Notice({
  title,
  live,
  className,
  children,
  ...rest
}: {
  title?: ReactNode;
  live?: 'status' | 'alert';
  id?: string;
  className?: string;
  children?: ReactNode;
}) {
  return (
    <div {...rest} role={live} className={classes('heavy-edge px-4 py-2.5 leading-snug', className)}>
      {title && <p className="font-semibold">{title}</p>}
      {children}
    </div>
  );
}
