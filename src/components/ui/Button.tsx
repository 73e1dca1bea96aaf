import type { ButtonHTMLAttributes, ReactNode } from 'react';
import { buttonLook, type ButtonKind } from './buttonLook';
import { classes } from './classes';

export interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  kind?: ButtonKind;
  /** The act is under way. The button keeps its place and size, and a second press does nothing. */
  pending?: boolean;
  /** What the button says meanwhile, for example "Publishing". */
  pendingText?: string;
  children: ReactNode;
}

export function Button({
  kind = 'plain',
  pending = false,
  pendingText,
  type = 'button',
  className,
  children,
  onClick,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      className={buttonLook(kind, className)}
      aria-disabled={pending || rest['aria-disabled'] || undefined}
      aria-busy={pending || undefined}
      data-pending={pending ? '' : undefined}
      onClick={(event) => {
        if (pending) event.preventDefault();
        else onClick?.(event);
      }}
    >
      {pendingText === undefined ? (
        children
      ) : (
        <span className="grid">
          <span className={classes('col-start-1 row-start-1', pending && 'invisible')}>{children}</span>
          <span className={classes('col-start-1 row-start-1', !pending && 'invisible')} aria-hidden={!pending}>
            {pendingText}
          </span>
        </span>
      )}
    </button>
  );
}
