import type { ReactNode } from 'react';
import { dayOf } from '@/components/ui/day';
import type { Sheet } from '@/domain/api/schemas/book';

const WORDS = 'Withdrawn. Do not work from this sheet';
const heading = 'font-serif text-[2.25rem] font-bold leading-[1.12] tracking-[-0.015em] sm:text-[3.25rem]';

/** The largest words of a withdrawn sheet, above all of it, on paper too. `acts`: what its reader may do about it. */
export function Withdrawn({ withdrawn, acts }: { withdrawn: NonNullable<Sheet['withdrawn']>; acts?: ReactNode }) {
  return (
    <div className="border-l-[14px] border-ink bg-white px-5 py-6 sm:px-8" role="note">
      <p className={heading}>{WORDS}</p>
      <p className="mt-4 max-w-prose whitespace-pre-line font-serif text-lead leading-normal">{withdrawn.reason}</p>
      <p className="mt-3 text-[1.0625rem] text-ink-2">
        Withdrawn on {dayOf(withdrawn.at)} by {withdrawn.by.name}
      </p>
      {acts && <div className="mt-4 flex flex-wrap gap-2.5 print:hidden">{acts}</div>}
    </div>
  );
}

/**
 * Stands hidden over a sheet that was in use when it was opened, until `stillCurrent.ts` finds that it was withdrawn
 * meanwhile. Stays in sight above all of the sheet, and stands on paper too.
 */
export const WithdrawnSince = ({ number }: { number: string }) => (
  <div
    hidden
    data-withdrawn-since
    role="alert"
    className="frame sticky top-0 z-30 border-l-[14px] bg-white px-5 py-4 max-sm:-mx-3 max-sm:-mt-4 max-sm:mb-4 max-sm:border-r-0 max-sm:border-t-0 sm:px-8 print:static print:mb-4"
  >
    <p className="font-serif text-[1.625rem] font-bold leading-tight sm:text-[2.25rem]">{WORDS}</p>
    <p data-withdrawn-why className="mt-1 line-clamp-3 max-w-prose font-serif" />
    <p className="mt-1">
      It was withdrawn by <span data-withdrawn-by /> after you opened it.{' '}
      <a href={`/procedures/${number}`} className="font-semibold">
        Open it again
      </a>
    </p>
  </div>
);
