import type { ReactNode } from 'react';
import { PhotoStrip } from '@/components/photos/PhotoStrip';
import { Button } from '@/components/ui/Button';
import { TextArea } from '@/components/ui/TextArea';
import { dayOf } from '@/components/ui/day';
import type { Photo } from '@/domain/api/schemas/photos';
import { FLAG_KINDS, LONGEST_FLAG, type FlagKind, type FlagState } from '@/domain/flags/flags';

/** A flag as the page is given it. */
export interface ShownFlag {
  id: string;
  number: string;
  title: string;
  letter: string;
  step: { id: string; title: string; number: number | null } | null;
  kind: FlagKind;
  text: string;
  photos: Photo[];
  raisedBy: { name: string; shop: string | null };
  raisedAt: string;
  state: FlagState;
  endedBy: { name: string } | null;
  endedAt: string | null;
  answer: string;
  proposal: { id: string; state: string; letter: string | null } | null;
  seen: boolean;
}

const where = ({ step }: ShownFlag) =>
  !step
    ? 'the whole sheet'
    : step.number === null
      ? `a step that is gone: ${step.title}`
      : `step ${step.number}, ${step.title}`;

/** How a flag ended, for whoever raised it. */
function outcome({ state, endedBy, endedAt, proposal }: ShownFlag): string {
  const who = endedBy?.name ?? '';
  const day = endedAt ? ` on ${dayOf(endedAt)}` : '';
  switch (state) {
    case 'open':
      return 'Waits for an answer.';
    case 'answered':
      return `${who} answered${day}:`;
    case 'withdrawn':
      return `Taken back${day}.`;
    case 'taken up':
      if (!proposal) return `${who} took it up${day}.`;
      if (proposal.letter) return `${who} took it up${day}; the sheet was changed in revision ${proposal.letter}.`;
      return proposal.state === 'declined'
        ? `${who} took it up${day}; the change was declined.`
        : `${who} took it up${day} and is changing the sheet.`;
  }
}

function Flag({ flag, children }: { flag: ShownFlag; children: ReactNode }) {
  const href = `/procedures/${flag.number}${flag.step?.number ? `#step-${flag.step.id}` : ''}`;
  return (
    <li id={`flag-${flag.id}`} className="px-4 py-5 sm:px-9">
      <p className="text-ink-2">
        <b className="font-semibold text-ink">{FLAG_KINDS[flag.kind]}</b> at {where(flag)}
      </p>
      <h3 className="mt-0.5 font-serif text-lead font-bold">
        <a href={href}>
          {flag.number} {flag.title}
        </a>
        , revision {flag.letter}
      </h3>
      <p className="mt-2 max-w-prose whitespace-pre-line font-serif text-prose">{flag.text}</p>
      <PhotoStrip photos={flag.photos} plain />
      <p className="mt-1 text-ink-2">
        {flag.raisedBy.name}
        {flag.raisedBy.shop && `, ${flag.raisedBy.shop}`}, {dayOf(flag.raisedAt)}
      </p>
      {children}
    </li>
  );
}

/** What a form said that was refused: the flag it is about, what was typed and why not. */
export interface RefusedAnswer {
  id: string;
  text: string;
  error: string;
}

/** Flags to answer: each with a box for the answer, and the way to a change of the sheet. */
export const FlagsToAnswer = ({ flags, refused }: { flags: readonly ShownFlag[]; refused: RefusedAnswer | null }) => (
  <ul className="divide-y divide-rule">
    {flags.map((flag) => (
      <Flag key={flag.id} flag={flag}>
        <form method="post" className="mt-4 flex max-w-[38rem] flex-col gap-3">
          <input type="hidden" name="id" value={flag.id} />
          <TextArea
            id={`answer-${flag.id}`}
            name="text"
            label="Answer"
            hint="Where the sheet is right: say how to read it. Where it is not: change it."
            rows={3}
            maxLength={LONGEST_FLAG}
            defaultValue={refused?.id === flag.id ? refused.text : ''}
            error={refused?.id === flag.id ? refused.error : undefined}
          />
          <div className="flex flex-wrap gap-3">
            <Button type="submit" name="act" value="answer">
              Send the answer
            </Button>
            <Button type="submit" name="act" value="take-up" kind="main">
              Change the sheet
            </Button>
          </div>
        </form>
      </Flag>
    ))}
  </ul>
);

/** Flags of one's own, with how each ended. What ended since the last look is marked in words. */
export const OwnFlags = ({ flags }: { flags: readonly ShownFlag[] }) => (
  <ul className="divide-y divide-rule">
    {flags.map((flag) => (
      <Flag key={flag.id} flag={flag}>
        <div
          className={
            flag.state !== 'open' && !flag.seen ? 'heavy-edge mt-3 max-w-prose px-3 py-2.5' : 'mt-3 max-w-prose'
          }
        >
          <p className="font-medium">
            {flag.state !== 'open' && !flag.seen && 'New. '}
            {outcome(flag)}
          </p>
          {flag.answer && <p className="mt-1 whitespace-pre-line font-serif text-prose">{flag.answer}</p>}
          {flag.state === 'open' && (
            <form method="post" className="mt-2">
              <input type="hidden" name="id" value={flag.id} />
              <Button type="submit" name="act" value="withdraw" kind="quiet">
                Take it back
              </Button>
            </form>
          )}
        </div>
      </Flag>
    ))}
  </ul>
);
