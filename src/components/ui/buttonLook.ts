import { classes } from './classes';

/** `main` is the one thing to do on a screen, `plain` everything else, `quiet` a small act inside running text. */
export type ButtonKind = 'main' | 'plain' | 'quiet';

const LOOKS: Record<ButtonKind, string> = {
  main: 'min-h-touch border-petrol bg-petrol px-5 text-white hover:bg-ink hover:border-ink',
  plain: 'min-h-touch border-ink bg-sheet px-5 text-ink hover:bg-wash',
  quiet:
    'min-h-touch border-transparent bg-transparent px-2 text-petrol underline underline-offset-[3px] hover:decoration-2',
};

/** The look shared by buttons and by links that act as one. */
export const buttonLook = (kind: ButtonKind, more?: string): string =>
  classes(
    'inline-flex items-center justify-center gap-2 rounded border-frame text-center text-[1.0625rem] font-semibold leading-tight no-underline',
    'disabled:cursor-not-allowed disabled:border-rule disabled:bg-side disabled:text-ink-2',
    LOOKS[kind],
    more,
  );
