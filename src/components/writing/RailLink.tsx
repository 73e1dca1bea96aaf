import type { ReactNode } from 'react';
import { classes } from '@/components/ui/classes';
import { useDesk } from './desk';
import { hashOfPlace, type Place } from './places';

export const MIDDLE = 'writing-middle';

/** One line of the rail: a handle or nothing, a number, the name, and how much there is to mend. */
export function RailLink({
  to,
  on,
  number,
  faults,
  before,
  children,
}: {
  to: Place;
  on: boolean;
  number?: number;
  faults: number;
  before?: ReactNode;
  children: ReactNode;
}) {
  const { focusSoon } = useDesk();
  return (
    <div
      className={classes(
        'flex items-stretch leading-snug',
        on && 'bg-sheet font-semibold shadow-[inset_5px_0_theme(colors.petrol)]',
      )}
    >
      {before ?? <span className="w-9 shrink-0" />}
      <a
        href={hashOfPlace(to)}
        aria-current={on ? 'true' : undefined}
        onClick={() => focusSoon(MIDDLE)}
        className="grid min-h-[40px] min-w-0 flex-1 grid-cols-[1.75rem_minmax(0,1fr)] items-start py-2 pr-3.5 text-ink no-underline hover:underline"
      >
        <span className={on ? undefined : 'text-ink-2'}>{number}</span>
        <span>
          {children}
          {faults > 0 && <span className="block text-small font-semibold">{faults} to mend</span>}
        </span>
      </a>
    </div>
  );
}
