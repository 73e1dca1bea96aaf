import type { AnchorHTMLAttributes, ReactNode } from 'react';
import { buttonLook, type ButtonKind } from './buttonLook';

/** A link that stands among buttons. It goes somewhere; what changes something is a Button. */
export function ButtonLink({
  kind = 'plain',
  className,
  children,
  ...rest
}: AnchorHTMLAttributes<HTMLAnchorElement> & { href: string; kind?: ButtonKind; children: ReactNode }) {
  return (
    <a {...rest} className={buttonLook(kind, className)}>
      {children}
    </a>
  );
}
