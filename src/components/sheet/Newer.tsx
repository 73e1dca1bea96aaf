/**
 * Stands hidden over a current sheet until `stillCurrent.ts` finds that another revision took its place while the page
 * was open. Stays in sight above all of the sheet, and stands on paper too.
 */
export const Newer = ({ number, letter }: { number: string; letter: string }) => (
  <div
    hidden
    data-newer
    data-number={number}
    data-letter={letter}
    role="alert"
    className="frame sticky top-0 z-30 border-l-[14px] bg-white px-5 py-4 max-sm:-mx-3 max-sm:-mt-4 max-sm:mb-4 max-sm:border-r-0 max-sm:border-t-0 sm:px-8 print:static print:mb-4"
  >
    <p className="font-serif text-lead font-bold">Do not work from this sheet</p>
    <p className="mt-1">
      Revision <span data-letter-now /> was published after you opened revision {letter}.{' '}
      <a href={`/procedures/${number}`} className="font-semibold">
        Go to revision <span data-letter-now />
      </a>{' '}
      or{' '}
      <a data-what-changed href={`/procedures/${number}/compare`}>
        see what changed
      </a>
      .
    </p>
  </div>
);
