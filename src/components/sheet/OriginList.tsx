import { dayOf } from '@/components/ui/day';
import type { RevisionSummary } from '@/domain/api/schemas/book';
import { byRevision, type Origin, type OriginGroup, type SinceRevision } from '@/domain/revision/originView';
import { Mark } from './Mark';

/** "tolerance ±1 N·m", "12 N·m", "how to avoid". */
const valueOf = ({ words, text }: Origin) => [words, text].filter(Boolean).join(' ');

/** Who wrote, when and why, and who reviewed it. */
const Because = ({ revision: { author, publishedAt, reason, reviewers } }: { revision: RevisionSummary }) => (
  <div className="origin-because">
    <p>
      <b className="font-semibold">{author.name}</b>, {dayOf(publishedAt)}
    </p>
    <p className="font-serif text-[0.9375rem] italic leading-relaxed">{reason || 'No reason given'}</p>
    <p className="text-ink-2">
      {reviewers.length > 0
        ? `Reviewed by ${reviewers.map(({ name }) => name).join(', ')}`
        : 'Reviewed by nobody named'}
    </p>
  </div>
);

function Since({
  since,
  number,
  revision,
}: {
  since: SinceRevision;
  number: string;
  revision: RevisionSummary | undefined;
}) {
  return (
    <div className="origin-since">
      <a
        href={`/procedures/${number}/revisions/${since.letter}`}
        className="font-serif text-[1.5rem] font-bold leading-none"
      >
        <span className="sr-only">Since revision </span>
        {since.letter}
      </a>
      <ul className="flex min-w-0 flex-col gap-0.5">
        {since.subjects.map(({ subject, origins }) => (
          <li key={subject || origins[0]?.place}>
            {subject && <span className="font-medium">{subject}</span>}
            {subject && origins.some((one) => valueOf(one)) && ': '}
            {origins.map(valueOf).filter(Boolean).join('; ')}
          </li>
        ))}
      </ul>
      {revision && <Because revision={revision} />}
    </div>
  );
}

/** The parts of a sheet in its own order, each with the revision since which it reads so. */
export const OriginList = ({
  number,
  groups,
  revisions,
}: {
  number: string;
  groups: readonly OriginGroup[];
  revisions: readonly RevisionSummary[];
}) => (
  <>
    {groups.map(({ step, title, origins }) => (
      <section
        key={step?.id ?? title}
        id={step ? `step-${step.id}` : undefined}
        className="origin-group px-4 py-4 sm:px-9"
      >
        <h2 className="flex items-center gap-3 text-lead">
          {step && (
            <a
              href={`/procedures/${number}#step-${step.id}`}
              aria-label={`Step ${step.number} on the sheet`}
              className="text-ink"
            >
              <Mark number={step.number} />
            </a>
          )}
          {title}
        </h2>
        {byRevision(origins).map((since) => (
          <Since
            key={since.letter}
            since={since}
            number={number}
            revision={revisions.find(({ letter }) => letter === since.letter)}
          />
        ))}
      </section>
    ))}
  </>
);
