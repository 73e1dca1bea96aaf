import { memo } from 'react';
import { benchTime, counted } from '@/components/sheet/words';
import { classes } from '@/components/ui/classes';
import { dayOf } from '@/components/ui/day';
import type { SearchHit } from '@/domain/search/engine';
import type { Matched } from '@/domain/search/explain';
import { Marked } from './Marked';

const VALUES: readonly Matched['field'][] = ['torque', 'limit', 'timer'];
const OWN_PLACE: readonly Matched['field'][] = ['title', 'summary'];
const SKILL = { apprentice: 'apprentice', technician: 'technician', senior: 'senior technician' };

/** A value that was asked for stands out; the rest of the line says what it is for. */
function Line({ field, text, marks }: Matched) {
  const [first] = marks;
  const isValue = VALUES.includes(field) && first?.[0] === 0;
  return (
    <p className="mt-1.5 leading-snug">
      {isValue && (
        <b className="mr-2 whitespace-nowrap text-[1.0625rem] font-semibold">
          <Marked text={text.slice(0, first[1])} marks={[first]} />
        </b>
      )}
      {field === 'text' && <span className="text-ink-2">In the text: </span>}
      <Marked text={text} marks={isValue ? marks.slice(1) : marks} from={isValue ? first[1] + 1 : 0} />
    </p>
  );
}

interface RowProps {
  hit: SearchHit;
  engineName: (key: string) => string;
  /** The one that Enter opens. */
  current: boolean;
  /** The reader has a bulletin about it to sign. */
  unread: boolean;
  onOpen: (hit: SearchHit) => void;
}

/** One sheet of the list. A letter typed draws no row again until the answer to it is there. */
export const Row = memo(function Row({ hit, engineName, current, unread, onOpen }: RowProps) {
  const marksOf = (field: Matched['field']): [number, number][] =>
    hit.matched.find((one) => one.field === field)?.marks ?? [];
  const lines = hit.matched.filter(({ field }) => !OWN_PLACE.includes(field));
  const cell = 'px-4 sm:px-[22px] md:py-[18px]';
  return (
    <li
      data-current={current ? '' : undefined}
      className={classes(
        'relative grid border-t border-hair first:border-t-0 max-md:py-4 md:grid-cols-[1fr_12.5rem_7.375rem]',
        'hover:bg-side has-[a:focus-visible]:bg-side has-[a:focus-visible]:shadow-[inset_5px_0_theme(colors.petrol)]',
        current && 'bg-side shadow-[inset_5px_0_theme(colors.petrol)]',
      )}
    >
      <div className={cell}>
        <h2 className="text-[1.25rem] leading-[1.3]">
          <a
            href={`/procedures/${hit.number}`}
            data-hit
            onClick={() => {
              onOpen(hit);
            }}
            className="text-ink no-underline after:absolute after:inset-0 focus-visible:outline-none after:focus-visible:outline after:focus-visible:outline-[3px] after:focus-visible:outline-offset-[-3px] after:focus-visible:outline-petrol"
          >
            <Marked text={hit.title} marks={marksOf('title')} />
          </a>
        </h2>
        {hit.withdrawn && (
          <p className="mt-1.5 border-l-[8px] border-ink pl-2.5 text-[1.0625rem] font-semibold">
            Withdrawn. Do not work from this sheet
          </p>
        )}
        {unread && !hit.withdrawn && (
          <p className="mt-1.5 border-l-[8px] border-ink pl-2.5 font-semibold">Changed: read and sign</p>
        )}
        <p className="mt-1 max-w-[60ch] font-serif text-[0.96875rem] leading-[1.6]">
          <Marked text={hit.summary} marks={marksOf('summary')} />
        </p>
        {lines.map((line) => (
          <Line key={`${line.field} ${line.text}`} {...line} />
        ))}
      </div>
      <div
        className={classes(
          cell,
          'text-[0.96875rem] leading-snug text-ink-2 max-md:mt-2 max-md:flex max-md:flex-wrap max-md:gap-x-3 md:border-l md:border-hair',
        )}
      >
        <b className="block font-semibold text-ink">{hit.engines.map(engineName).join(', ')}</b>
        <span className="block">
          {benchTime(hit.minutes)}, {SKILL[hit.skill]}
        </span>
        {hit.holds > 0 && <span className="block">{counted(hit.holds, 'hold point')}</span>}
        {hit.book !== 'Common book' && <span className="block">{hit.book} only</span>}
      </div>
      <div
        className={classes(
          cell,
          'text-small text-ink-2 max-md:mt-1 max-md:flex max-md:items-baseline max-md:gap-3 md:border-l md:border-hair md:text-right',
        )}
      >
        <b className="block font-serif text-[1.5rem] font-bold leading-none text-ink max-md:text-base">
          <span className="md:sr-only">Revision </span>
          {hit.letter}
        </b>
        <span className="block md:mt-1.5">{hit.number}</span>
        <span className="block">{dayOf(hit.publishedAt)}</span>
      </div>
    </li>
  );
});
