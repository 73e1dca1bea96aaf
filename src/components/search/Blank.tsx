import type { Suggestion } from '@/domain/search/suggest';
import { addressOf } from './address';
import type { RecentSheet } from './kept';
import { NO_FILTERS } from '@/domain/search/filters';

/** Shown before anything is asked: what can be typed, by examples from this very book, and what was opened last. */
export function Blank({
  suggestions,
  recent,
  onTry,
}: {
  suggestions: readonly Suggestion[];
  recent: readonly RecentSheet[];
  onTry: (query: string) => void;
}) {
  const heading = 'px-4 pb-2 pt-5 text-[1.125rem] sm:px-[22px]';
  const row =
    'relative grid gap-x-5 border-t border-hair px-4 py-2.5 hover:bg-side sm:grid-cols-[17rem_1fr] sm:px-[22px]';
  const link = 'text-ink no-underline after:absolute after:inset-0';
  return (
    <div className="frame">
      <h2 className={heading}>Type it the way you say it</h2>
      <ul>
        {suggestions.map(({ query, says }) => (
          <li key={query} className={row}>
            <a
              href={addressOf({ q: query, filters: NO_FILTERS })}
              className={`${link} text-[1.0625rem] font-semibold`}
              onClick={(event) => {
                if (event.ctrlKey || event.metaKey || event.shiftKey) return;
                event.preventDefault();
                onTry(query);
              }}
            >
              {query}
            </a>
            <span className="text-ink-2">{says}</span>
          </li>
        ))}
        <li className={`${row} hover:bg-transparent`}>
          <span>Or choose an engine or a system</span>
          <span className="text-ink-2">The list then shows all there is for it</span>
        </li>
      </ul>
      {recent.length > 0 && (
        <section className="border-t-frame border-ink">
          <h2 className={heading}>Opened last on this machine</h2>
          <ul>
            {recent.map(({ number, title }) => (
              <li key={number} className={row}>
                <a href={`/procedures/${number}`} className={`${link} font-semibold sm:col-start-1`}>
                  {title}
                </a>
                <span className="text-ink-2">{number}</span>
              </li>
            ))}
          </ul>
        </section>
      )}
    </div>
  );
}
