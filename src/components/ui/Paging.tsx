/** Which part of a long list is shown, with the ways to what stands before and after it. Nothing where all of it is. */
export function Paging({
  label,
  from,
  shown,
  of,
  before,
  after,
}: {
  /** What is paged; spoken, not shown. */
  label: string;
  /** How many stand before the first that is shown. */
  from: number;
  shown: number;
  of: number;
  /** Addresses; left out where there is nothing. */
  before?: string | undefined;
  after?: string | undefined;
}) {
  if (!before && !after) return null;
  return (
    <nav aria-label={label} className="flex flex-wrap items-center justify-between gap-x-6 border-t border-hair pt-1.5">
      <p className="tabular-nums text-ink-2">
        {from + 1} to {from + shown} of {of}
      </p>
      <p className="flex gap-x-6">
        {before && (
          <a href={before} rel="prev" className="inline-flex min-h-touch items-center">
            Previous
          </a>
        )}
        {after && (
          <a href={after} rel="next" className="inline-flex min-h-touch items-center">
            Next
          </a>
        )}
      </p>
    </nav>
  );
}
