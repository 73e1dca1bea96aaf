import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import type { Proposal } from '@/domain/api/schemas/proposals';
import type { DraftVersion } from '@/domain/api/schemas/versions';
import { Moment } from './Moment';
import { becameWords, whatWords } from './versionWords';

/** One version: whose it is and when it was kept, and the button that goes back to it. A plain form. */
export function VersionHead({
  proposal,
  version,
  me,
  refused,
}: {
  proposal: Proposal;
  version: DraftVersion;
  me: string;
  /** Why the last press did nothing. */
  refused: string | null;
}) {
  const { id, title, may, whyNot, base } = proposal;
  const { n, at, person, current, what } = version;
  const became = [becameWords(version), whatWords(what)].filter(Boolean).join('. ');
  return (
    <div className="px-4 py-6 sm:px-8">
      <p className="font-medium text-ink-2">
        {may.edit && (
          <>
            <a href={`/proposals/${id}/edit`}>{title}</a>,{' '}
          </>
        )}
        <a href={`/proposals/${id}/versions`}>earlier versions</a>
      </p>
      <h1 className="mt-1 text-title tracking-[-0.01em]">
        Version {n} of “{title}”
      </h1>
      <p className="mt-2 max-w-prose">
        Kept <Moment at={at} /> by {person.id === me ? 'you' : person.name}
        {version.base !== base && version.base !== null && `, on revision ${version.base}`}. {became && `${became}.`}
      </p>
      {refused && (
        <Notice title="Not done" live="alert" className="mt-4">
          <p>{refused}</p>
        </Notice>
      )}
      {current ? (
        <p className="mt-4 font-semibold">The draft says the same now, so there is nothing to go back on.</p>
      ) : may.edit ? (
        <form method="post" className="mt-4 flex flex-wrap items-center gap-x-5 gap-y-2">
          <input type="hidden" name="version" value={proposal.version} />
          <Button type="submit" kind="main" pendingText="Going back">
            Go back to this version
          </Button>
          <span className="max-w-prose text-ink-2">
            It makes a new version. What stands in the draft now is kept, and can be gone back to as well.
          </span>
        </form>
      ) : (
        <p className="mt-4 text-ink-2">{whyNot['edit'] ?? 'Only its author can go back to it.'}</p>
      )}
    </div>
  );
}
