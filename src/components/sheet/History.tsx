import { dayOf } from '@/components/ui/day';
import type { HistoryPart, WithdrawalEvent as Act } from '@/domain/revision/timeline';
import { ReadBy } from './ReadBy';
import { BULLETIN_ACTS } from './bulletinWords';
import { RevisionEvent } from './RevisionEvent';

const WithdrawalEvent = ({ event }: { event: Act }) => (
  <li className="history-event history-act">
    <div>
      <h2 className="font-sans text-base font-semibold leading-tight">{BULLETIN_ACTS[event.kind]}</h2>
      <p className="mt-1">{dayOf(event.at)}</p>
    </div>
    <p className="max-w-prose whitespace-pre-line font-serif text-[0.9375rem] italic leading-relaxed">{event.reason}</p>
    <div className="flex flex-col gap-1 text-ink-2">
      <p>
        {BULLETIN_ACTS[event.kind]} at revision {event.letter} by{' '}
        <b className="font-semibold text-ink">{event.by.name}</b>
      </p>
      <ReadBy count={event.readBy} />
    </div>
  </li>
);

/** Some of a history, latest first, with ways to what is older and newer. Each part has an address. */
export function History({
  number,
  part,
  current,
  withdrawn,
  mayPropose,
}: {
  number: string;
  part: HistoryPart;
  /** The letter to work from. */
  current: string;
  withdrawn: boolean;
  mayPropose: boolean;
}) {
  const { events, from, total, older, newer } = part;
  const here = `/procedures/${number}/revisions`;
  const standingOf = (letter: string) => (letter !== current ? 'superseded' : withdrawn ? 'withdrawn' : 'current');
  const currentHash = events.flatMap((event) =>
    event.kind === 'revision' && event.revision.letter === current ? [event.revision.hash] : [],
  )[0];
  return (
    <>
      <ol aria-label={`What happened to ${number}, latest first`} className="px-4 sm:px-9">
        {events.map((event) =>
          event.kind === 'revision' ? (
            <RevisionEvent
              key={event.id}
              number={number}
              event={event}
              standing={standingOf(event.revision.letter)}
              restorable={mayPropose && event.revision.letter !== current && event.revision.hash !== currentHash}
            />
          ) : (
            <WithdrawalEvent key={event.id} event={event} />
          ),
        )}
      </ol>
      {(older ?? newer) && (
        <nav
          aria-label="Parts of the history"
          className="flex flex-wrap items-center gap-x-8 px-4 py-3 sm:px-9 print:hidden [&_a]:inline-flex [&_a]:min-h-touch [&_a]:items-center"
        >
          {newer && <a href={`${here}?after=${newer}`}>Newer</a>}
          <span className="text-ink-2">
            {from} to {from + events.length - 1} of {total}, latest first
          </span>
          {older && <a href={`${here}?before=${older}`}>Older</a>}
        </nav>
      )}
    </>
  );
}
