import type { ReactNode } from 'react';
import { OriginNote } from '@/components/sheet/OriginNote';
import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { dayOf } from '@/components/ui/day';
import { PhotoStrip } from '@/components/photos/PhotoStrip';
import { OpenQuestions } from '@/components/threads/OpenQuestions';
import { Notice } from '@/components/ui/Notice';
import { Status } from '@/components/ui/Status';
import type { Proposal } from '@/domain/api/schemas/proposals';
import { takenBackWords } from '@/domain/review/desk';
import type { Thread } from '@/domain/api/schemas/threads';
import { Acts, isReviewer } from './Acts';
import { Gravity } from './Gravity';
import type { Trouble } from './useReviewActs';
import { headingOf, needed, standingWords, type ReviewAct } from './words';

const ByLine = ({ proposal, me }: { proposal: Proposal; me: string }) => {
  const { id, author, proposedAt, createdAt, state, number, base, book } = proposal;
  const own = author.id === me;
  return (
    <p className="mt-1.5 text-ink-2">
      <b className="font-semibold text-ink">{own ? 'You' : author.name}</b>
      {!own && author.shop && `, ${author.shop},`} {proposedAt ? 'proposed' : 'started'} this on{' '}
      {dayOf(proposedAt ?? createdAt)}
      {base === null ? ` for the ${book.kind === 'common' ? 'common book' : `book of ${book.name}`}` : ''}.{' '}
      {state === 'proposed' && needed(proposal)}{' '}
      {base !== null && (
        <a href={`/procedures/${number}`} className="whitespace-nowrap">
          {number}, the sheet
        </a>
      )}
      {own && (
        <>
          {base !== null && ', '}
          <a href={`/proposals/${id}/versions`} className="whitespace-nowrap">
            earlier versions
          </a>
        </>
      )}
    </p>
  );
};

/** Where to go from a proposal that is one's own to write on, or that has been published. */
function Ways({ proposal, me }: { proposal: Proposal; me: string }) {
  const { id, number, state, publishedLetter, may, remarks } = proposal;
  if (publishedLetter) {
    const href =
      state === 'superseded' ? `/procedures/${number}/revisions/${publishedLetter}` : `/procedures/${number}`;
    return (
      <ButtonLink kind="main" href={href}>
        Open sheet {number} {publishedLetter}
      </ButtonLink>
    );
  }
  if (proposal.author.id !== me || !may.edit) return null;
  const anchor = remarks
    .filter((remark) => remark.anchor?.startsWith('step:'))
    .at(-1)
    ?.anchor?.slice(5);
  return (
    <ButtonLink kind="main" href={`/proposals/${id}/edit${anchor && state === 'returned' ? `#step-${anchor}` : ''}`}>
      Go on writing
    </ButtonLink>
  );
}

export interface ReviewHeadProps {
  proposal: Proposal;
  me: string;
  letter: string | null;
  version: number;
  /** Where a draft stops being readable. */
  fault: string | null;
  pending: ReviewAct | null;
  /** What was just done, in the word of its button. */
  said: string | null;
  trouble: Trouble | null;
  /** Somebody else changed it after it was opened here. */
  movedOn: boolean;
  onAgree: () => void;
  onAsk: (act: ReviewAct) => void;
  panel: ReactNode;
  threads: readonly Thread[];
  /** Remarks on the whole. */
  children: ReactNode;
}

/** What the proposal is, why, how far it has got, and what can be done with it. */
export function ReviewHead({
  proposal,
  me,
  letter,
  fault,
  said,
  trouble,
  movedOn,
  panel,
  threads,
  children,
  ...acts
}: ReviewHeadProps) {
  const standing = standingWords(proposal, me);
  const reviewer = isReviewer(proposal, me);
  const takesBack = takenBackWords(proposal.takesBack, 4, proposal.publishedLetter !== null);
  const refused = proposal.state === 'proposed' && !reviewer && proposal.author.id !== me;
  return (
    <header className="review-head">
      {!proposal.publishedLetter && (
        <p className="review-paper">Not a sheet to work from: this text was not published when it was printed.</p>
      )}
      <div className="review-title">
        <h1 className="text-title tracking-[-0.01em]">{headingOf(proposal, letter)}</h1>
        <ByLine proposal={proposal} me={me} />
        <Gravity severity={proposal.severity} />
        {takesBack.length > 0 && (
          <Notice className="mt-3">
            {takesBack.map((sentence) => (
              <p key={sentence} className="font-semibold">
                {sentence}
              </p>
            ))}
          </Notice>
        )}
      </div>
      <div className="min-w-0">
        <p className="review-why">{proposal.reason || 'No reason given yet.'}</p>
        <PhotoStrip photos={proposal.photos} />
        {standing && <p className="mt-3 max-w-prose font-medium">{standing}</p>}
        {refused && <p className="mt-3 font-medium">{proposal.whyNot['agree']}</p>}
      </div>
      <div className="review-side">
        {reviewer ? <Acts proposal={proposal} me={me} {...acts} /> : <Ways proposal={proposal} me={me} />}
        {!proposal.publishedLetter && <OpenQuestions threads={threads} />}
        <Status text={said ?? ''} className="font-semibold empty:hidden sm:text-right" />
      </div>
      <div className="review-below">
        {trouble && trouble.field === null && (
          <Notice live="alert" title={trouble.status === 409 ? 'Not done: this changed in the meantime' : 'Not done'}>
            <p>{trouble.detail}</p>
            {trouble.status === 409 && <LoadAgain id={proposal.id} />}
          </Notice>
        )}
        {movedOn && trouble?.status !== 409 && (
          <Notice live="status" title="This changed after you opened it">
            <p>What you see below may no longer be what stands. Nothing you typed is lost.</p>
            <LoadAgain id={proposal.id} />
          </Notice>
        )}
        {proposal.stale && trouble?.status !== 409 && (
          <Notice id="stale" title="Written on an older revision">
            <p>
              {proposal.base === null
                ? `Revision ${proposal.currentLetter ?? ''} was published meanwhile.`
                : `Revision ${proposal.currentLetter ?? ''} was published after this was written on revision ${proposal.base}. Below it is compared with ${proposal.base}; it can be agreed to once its author has brought it up to ${proposal.currentLetter ?? ''}.`}
            </p>
          </Notice>
        )}
        {!proposal.publishedLetter && <OriginNote origin={proposal.origin} />}
        {fault && (
          <Notice title="This draft cannot be compared yet">
            <p>{fault}</p>
          </Notice>
        )}
        {panel}
        {children}
      </div>
    </header>
  );
}

const LoadAgain = ({ id }: { id: string }) => (
  <Button className="mt-2.5" onClick={() => location.assign(`/proposals/${id}`)} data-needs-script="">
    Load what is there now
  </Button>
);
