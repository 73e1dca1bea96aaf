import { Button } from '@/components/ui/Button';
import { dayOf } from '@/components/ui/day';
import { overText } from '@/domain/review/overrides';
import type { RevisionEvent as Event } from '@/domain/revision/timeline';
import { Changes } from './Changes';
import { ReadBy } from './ReadBy';
import { spacedCheck } from './words';

const ACTS: Record<Event['acts'][number]['what'], string> = {
  proposed: 'Proposed',
  returned: 'Returned',
  declined: 'Declined',
  agreed: 'Agreed to',
  overrode: 'Clamp check overridden',
  published: 'Published',
};

/** Beside links, so that all that can be done with a revision reads alike. */
const LIKE_A_LINK = '!border-0 !px-0 !text-base !font-normal !underline';

/** Whoever publishes agrees by that, so an agreement of the same day and person is not told twice. */
const told = (acts: Event['acts']) =>
  acts.filter(
    ({ what, person, at }) =>
      what !== 'agreed' ||
      !acts.some(
        (other) => other.what === 'published' && other.person.id === person.id && dayOf(other.at) === dayOf(at),
      ),
  );

/** Who answered for it, in the order of time. */
function Answered({ event }: { event: Event }) {
  const { acts, revision, readBy } = event;
  return (
    <div className="flex flex-col gap-1 text-ink-2 [&_b]:font-semibold [&_b]:text-ink">
      <p>
        Written by <b>{revision.author.name}</b>
      </p>
      <p>
        {revision.reviewers.length > 0 ? (
          <>
            Reviewed by <b>{revision.reviewers.map(({ name }) => name).join(', ')}</b>
          </>
        ) : (
          'Reviewed by nobody named'
        )}
      </p>
      <ul>
        {told(acts).map(({ what, person, at }) => (
          <li key={`${what} ${at} ${person.id}`}>
            {ACTS[what]} {dayOf(at)}, {person.name}
          </li>
        ))}
      </ul>
      <ReadBy count={readBy} />
    </div>
  );
}

/** One published revision: why, what it changed, who answered for it, and what can be done with it. */
export function RevisionEvent({
  number,
  event,
  standing,
  restorable,
}: {
  number: string;
  event: Event;
  standing: 'current' | 'withdrawn' | 'superseded';
  /** The reader may propose this text again. */
  restorable: boolean;
}) {
  const { revision, parent, changes } = event;
  const { letter } = revision;
  const here = `/procedures/${number}/revisions/${letter}`;
  return (
    <li id={`revision-${letter}`} className="history-event">
      <div>
        <h2 className="font-sans text-base font-medium leading-tight">
          <a href={here} className="mr-2 font-serif text-[1.75rem] font-bold leading-none">
            <span className="sr-only">Revision </span>
            {letter}
          </a>
          <span className="text-ink-2">{standing}</span>
        </h2>
        <p className="mt-1">{dayOf(revision.publishedAt)}</p>
        <p className="text-small text-ink-2">Sheet check {spacedCheck(revision.sheetCheck)}</p>
      </div>
      <div className="history-words">
        <p className="max-w-prose font-serif text-[0.9375rem] italic leading-relaxed">
          {revision.reason || 'No reason given'}
        </p>
        {revision.overrides.map(({ torque, share, person, reason, at }) => (
          <p key={torque} className="border-l-[8px] border-ink pl-2.5 leading-snug">
            <b className="font-semibold">{torque}</b>, clamped to {overText(share)} of proof load. {person.name}{' '}
            overrode the clamp check on {dayOf(at)}: {reason}
          </p>
        ))}
        {changes ? <Changes changes={changes} /> : <p className="text-ink-2">The first revision: all of it is new.</p>}
        <div className="flex flex-wrap items-center gap-x-5 print:hidden">
          {parent && (
            <a
              href={`/procedures/${number}/compare?from=${parent}&to=${letter}`}
              className="inline-flex min-h-touch items-center"
            >
              Grew from {parent}: see both texts
            </a>
          )}
          <Button kind="quiet" data-copy={here} data-needs-script="" className={LIKE_A_LINK}>
            Copy the permanent link
            <span className="sr-only"> of revision {letter}</span>
          </Button>
          {restorable && (
            <form method="post" action={`${here}/restore`}>
              <Button type="submit" kind="quiet" className={LIKE_A_LINK}>
                Propose this text again
                <span className="sr-only">, revision {letter}</span>
              </Button>
            </form>
          )}
        </div>
      </div>
      <Answered event={event} />
    </li>
  );
}
