import { type KeyboardEvent, useCallback, useRef, useState } from 'react';
import { counted } from '@/components/sheet/words';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import type { SearchHit } from '@/domain/search/engine';
import { type Facets, isFiltered, NO_FILTERS } from '@/domain/search/filters';
import type { Suggestion } from '@/domain/search/suggest';
import type { Asked } from './address';
import { Blank } from './Blank';
import { type Choice, FilterPanel } from './FilterPanel';
import { keepRecent } from './kept';
import { NoHits } from './NoHits';
import { Kept, ReadAs } from './ReadAs';
import { Row } from './Row';
import { SearchField } from './SearchField';
import { type Given, useAnswer } from './useAnswer';
import { keepAddress, useAsked } from './useAsked';
import { useRecent } from './useRecent';

export interface DeskProps extends Given {
  engines: readonly Choice[];
  /** Counts of the whole book. */
  whole: Facets;
  suggestions: readonly Suggestion[];
  mayWrite: boolean;
  /** Numbers of sheets that the reader has a bulletin about to sign. */
  unread: readonly string[];
}

export function Desk(props: DeskProps) {
  const { engines, whole, suggestions, mayWrite, person } = props;
  const [limit, setLimit] = useState(props.limit);
  const recent = useRecent(person);
  const field = useRef<HTMLInputElement>(null);
  const [asked, setAsked] = useAsked(props.asked, field);
  const list = useRef<HTMLUListElement>(null);
  const { answer, ready, late, lost, settle } = useAnswer(asked, limit, props);
  const filtered = isFiltered(asked.filters);
  const blank = !asked.q.trim() && !filtered;

  const ask = (next: Asked): void => {
    setAsked(next);
    setLimit(props.limit);
  };
  const put = (q: string): void => {
    if (field.current) field.current.value = q;
    ask({ ...asked, q });
  };

  const engineName = useCallback(
    (key: string): string => engines.find((engine) => engine.key === key)?.name ?? key,
    [engines],
  );
  const onOpen = useCallback(
    (hit: SearchHit): void => {
      keepAddress(asked);
      keepRecent(person, hit);
    },
    [asked, person],
  );

  const links = (): HTMLAnchorElement[] => [
    ...(list.current?.querySelectorAll<HTMLAnchorElement>('a[data-hit]') ?? []),
  ];
  const openFirst = async (): Promise<void> => {
    const [first] = (late ? await settle() : answer).hits;
    if (!first || blank) return;
    onOpen(first);
    location.assign(`/procedures/${first.number}`);
  };

  /** Into the list. Where its answer is still on the way, the first of that answer, not of the last one. */
  const toFirst = (): void => {
    links()[0]?.focus();
    if (late) void settle().then(() => requestAnimationFrame(() => links()[0]?.focus()));
  };

  const onFieldKey = (event: KeyboardEvent): void => {
    if (event.key === 'ArrowDown') toFirst();
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
        <SearchField
          ref={field}
          defaultValue={props.asked.q}
          onText={(q) => {
            ask({ ...asked, q });
          }}
          onKeyDown={onFieldKey}
        />
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
                  unread={props.unread.includes(hit.number)}
                  onOpen={onOpen}
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
