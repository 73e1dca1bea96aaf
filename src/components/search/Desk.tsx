import { type KeyboardEvent, useEffect, useRef, useState } from 'react';
import { counted } from '@/components/sheet/words';
import { Button } from '@/components/ui/Button';
import { Kbd } from '@/components/ui/Kbd';
import { Notice } from '@/components/ui/Notice';
import { type Facets, isFiltered, NO_FILTERS } from '@/domain/search/filters';
import type { Suggestion } from '@/domain/search/suggest';
import { addressOf, type Asked, askedIn } from './address';
import { Blank } from './Blank';
import { type Choice, FilterPanel } from './FilterPanel';
import { keepRecent } from './kept';
import { NoHits } from './NoHits';
import { Kept, ReadAs } from './ReadAs';
import { Row } from './Row';
import { type Given, useAnswer } from './useAnswer';
import { useRecent } from './useRecent';

export interface DeskProps extends Given {
  engines: readonly Choice[];
  /** Counts of the whole book. */
  whole: Facets;
  suggestions: readonly Suggestion[];
  mayWrite: boolean;
}

const FIELD = 'Find a job, part, engine or torque';

export function Desk(props: DeskProps) {
  const { engines, whole, suggestions, mayWrite, person } = props;
  const [asked, setAsked] = useState<Asked>(props.asked);
  const [limit, setLimit] = useState(props.limit);
  const recent = useRecent(person);
  const field = useRef<HTMLInputElement>(null);
  const list = useRef<HTMLUListElement>(null);
  const { answer, ready, late, lost, settle } = useAnswer(asked, limit, props);
  const filtered = isFiltered(asked.filters);
  const blank = !asked.q.trim() && !filtered;

  const ask = (next: Asked): void => {
    setAsked(next);
    setLimit(props.limit);
    history.replaceState(history.state, '', addressOf(next));
  };
  const put = (q: string): void => {
    if (field.current) field.current.value = q;
    ask({ ...asked, q });
  };

  useEffect(() => {
    // What was typed before the page came to life counts.
    if (field.current && field.current.value !== field.current.defaultValue)
      field.current.dispatchEvent(new Event('input', { bubbles: true }));
    const back = (): void => {
      const there = askedIn(
        new URLSearchParams(location.search),
        engines.map(({ key }) => key),
      );
      if (field.current) field.current.value = there.q;
      setAsked(there);
    };
    addEventListener('popstate', back);
    return () => {
      removeEventListener('popstate', back);
    };
  }, [engines]);

  const links = (): HTMLAnchorElement[] => [
    ...(list.current?.querySelectorAll<HTMLAnchorElement>('a[data-hit]') ?? []),
  ];
  const openFirst = async (): Promise<void> => {
    const [first] = (late ? await settle() : answer).hits;
    if (!first || blank) return;
    keepRecent(person, first);
    location.assign(`/procedures/${first.number}`);
  };

  const onFieldKey = (event: KeyboardEvent): void => {
    if (event.key === 'ArrowDown') links()[0]?.focus();
    else if (event.key === 'Escape') put('');
    else if (event.key === 'Enter' && !event.nativeEvent.isComposing) void openFirst();
    else return;
    event.preventDefault();
  };
  const onListKey = (event: KeyboardEvent): void => {
    const all = links();
    const at = all.indexOf(document.activeElement as HTMLAnchorElement);
    if (at < 0) return;
    if (event.key === 'ArrowDown') all[at + 1]?.focus();
    else if (event.key === 'ArrowUp') (all[at - 1] ?? field.current)?.focus();
    else if (event.key === 'Home') all[0]?.focus();
    else if (event.key === 'End') all.at(-1)?.focus();
    else if (event.key === 'Escape') field.current?.focus();
    else return;
    event.preventDefault();
  };

  const engineName = (key: string): string => engines.find((engine) => engine.key === key)?.name ?? key;
  return (
    <form
      action="/"
      role="search"
      data-index={ready ? 'ready' : 'loading'}
      data-shown={late ? undefined : asked.q}
      onSubmit={(event) => {
        event.preventDefault();
      }}
      className="mx-auto grid max-w-sheet gap-x-11 gap-y-6 sm:pt-4 lg:grid-cols-[14.375rem_1fr] lg:gap-y-8"
    >
      <div className="lg:col-span-2">
        <h1 className="sr-only">Look up</h1>
        <div className="relative">
          <input
            ref={field}
            type="search"
            name="q"
            data-find
            defaultValue={props.asked.q}
            maxLength={200}
            aria-label={FIELD}
            placeholder={FIELD}
            autoComplete="off"
            autoCapitalize="off"
            spellCheck={false}
            enterKeyHint="go"
            aria-describedby="look-up-keys"
            onInput={({ currentTarget }) => {
              ask({ ...asked, q: currentTarget.value });
            }}
            onKeyDown={onFieldKey}
            className="h-[58px] w-full rounded border-2 border-ink bg-white pl-4 pr-4 font-serif text-[1.125rem] sm:h-[68px] sm:pl-5 sm:pr-16 sm:text-[1.5625rem] [&::-webkit-search-cancel-button]:hidden"
          />
          <span
            data-needs-script
            aria-hidden="true"
            className="pointer-events-none absolute right-5 top-1/2 -translate-y-1/2 max-sm:hidden"
          >
            <Kbd>/</Kbd>
          </span>
        </div>
        <span id="look-up-keys" className="sr-only" data-needs-script>
          Enter opens the first sheet. Arrow down goes into the list, Escape clears.
        </span>
        <noscript>
          <button className="mt-3 min-h-touch rounded border-frame border-petrol bg-petrol px-5 font-semibold text-white">
            Look up
          </button>
        </noscript>
        {blank ? (
          <p role="status" className="mt-3 min-h-[1.625rem] text-[1.0625rem] leading-relaxed text-ink-2">
            {counted(answer.total, 'sheet')} in the books you may read. <Kept kept={ready} />
          </p>
        ) : (
          <ReadAs answer={answer} kept={ready} />
        )}
      </div>
      <FilterPanel
        filters={asked.filters}
        facets={answer.facets}
        whole={whole}
        engines={engines}
        onChange={(filters) => {
          ask({ ...asked, filters });
        }}
      />
      {/* The keys move between the links inside, which are what is operated. */}
      {/* eslint-disable-next-line jsx-a11y/no-static-element-interactions */}
      <div className="min-w-0" onKeyDown={onListKey} aria-busy={late}>
        {lost && (
          <Notice live="status" title="No network, and the book is not kept on this machine" className="mb-4">
            Look up works again once the network is back. After that it works without.
          </Notice>
        )}
        {blank ? (
          <Blank suggestions={suggestions} recent={recent} onTry={put} />
        ) : answer.hits.length === 0 ? (
          <NoHits
            query={asked.q}
            filtered={filtered}
            mayWrite={mayWrite}
            onClear={() => {
              ask({ ...asked, filters: NO_FILTERS });
            }}
          />
        ) : (
          <>
            <ul ref={list} className="frame" aria-label="Sheets">
              {answer.hits.map((hit, i) => (
                <Row
                  key={hit.number}
                  hit={hit}
                  engineName={engineName}
                  current={i === 0 && asked.q.trim() !== ''}
                  onOpen={() => {
                    keepRecent(person, hit);
                  }}
                />
              ))}
            </ul>
            {answer.total > answer.hits.length && (
              <p className="mt-4 flex flex-wrap items-center gap-4">
                <span className="text-ink-2">
                  The best {answer.hits.length} of {answer.total} are shown.
                </span>
                <Button
                  type="submit"
                  name="show"
                  value={limit * 2}
                  onClick={() => {
                    setLimit(limit * 2);
                  }}
                >
                  Show more
                </Button>
              </p>
            )}
          </>
        )}
      </div>
    </form>
  );
}
