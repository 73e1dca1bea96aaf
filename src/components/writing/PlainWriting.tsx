import { OriginNote } from '@/components/sheet/OriginNote';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { TextArea } from '@/components/ui/TextArea';
import { overrideMissing } from '@/domain/review/overrides';
import type { Proposal } from '@/domain/api/schemas/proposals';

/** What the last press of a button came to; null on a fresh page. */
type Outcome =
  | {
      refusal: { detail: string; errors: readonly { path: string; message: string; line?: number }[] };
      source: string;
      reason: string;
    }
  | { done: string }
  | null;

/** The draft as a plain form, for a browser without scripts: it saves, proposes, and keeps what was typed. */
export function PlainWriting({
  proposal,
  source,
  outcome,
  kept,
  said,
}: {
  proposal: Proposal;
  source: string;
  outcome: Outcome;
  kept: boolean;
  /** What was just done that brought the author here. */
  said?: string | undefined;
}) {
  const past = overrideMissing(proposal.failing.filter(({ override }) => override === null));
  const refused = outcome && 'refusal' in outcome ? outcome : null;
  return (
    <form method="post" className="leaf framed-sections">
      <div className="px-5 py-5 sm:px-9">
        <h1 className="text-title">
          {proposal.title}
          {proposal.base ? `, changing ${proposal.base}` : ', a new procedure'}
        </h1>
        <p className="mt-2 max-w-prose">
          Without scripts in the browser the sheet is written as text. Front matter stands between lines of three
          hyphens, then the steps. Keep the draft to have it checked.
        </p>
        <p className="mt-2">
          <a href={`/proposals/${proposal.id}/versions`}>Earlier versions</a>
        </p>
      </div>
      <OriginNote origin={proposal.origin} className="border-b-0 border-r-0 px-5 py-4 sm:px-9" />
      {kept && !refused && <p className="px-5 py-3 font-semibold sm:px-9">Draft kept.</p>}
      {said && !kept && !refused && <p className="px-5 py-3 font-semibold sm:px-9">{said}</p>}
      {past && (
        <Notice title="Past proof load" className="border-b-0 border-r-0 px-5 py-4 sm:px-9">
          <p>{past}</p>
        </Notice>
      )}
      {refused && (
        <Notice title="Not accepted" className="border-b-0 border-r-0 px-5 py-4 sm:px-9">
          <p>{refused.refusal.detail}</p>
          <ul>
            {refused.refusal.errors
              .filter(({ message }) => message !== refused.refusal.detail)
              .map(({ path, message, line }) => (
                <li key={`${path} ${message}`}>
                  {line ? `Line ${line}: ` : ''}
                  {message}
                </li>
              ))}
          </ul>
        </Notice>
      )}
      <div className="flex flex-col gap-5 px-5 py-5 sm:px-9">
        <input type="hidden" name="version" value={proposal.version} />
        <TextArea
          label="The whole text"
          name="source"
          defaultValue={refused?.source ?? source}
          rows={30}
          className="whitespace-pre !font-sans !text-base"
        />
        <TextArea
          label="Why this is better, for the editor"
          name="reason"
          defaultValue={refused?.reason ?? proposal.reason}
          rows={3}
          maxLength={4000}
        />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" name="act" value="keep">
            Keep the draft
          </Button>
          <Button type="submit" name="act" value="propose" kind="main">
            Propose
          </Button>
        </div>
      </div>
    </form>
  );
}
