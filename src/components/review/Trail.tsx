import { dayOf } from '@/components/ui/day';
import type { TrailEntry } from '@/domain/api/schemas/proposals';
import { trailWords } from './words';

/** What became of a proposal so far, in one line. */
export function Trail({ trail, letter }: { trail: readonly TrailEntry[]; letter: string | null }) {
  if (trail.length === 0) return null;
  return (
    <section aria-label="What happened so far" className="review-part !py-4">
      <ol className="trail">
        {trailWords(trail, letter).map((entry, i) => (
          <li key={i}>
            <span className="font-semibold">{entry.person.name}</span> {entry.words}
            <span className="block text-small text-ink-2">{dayOf(entry.at)}</span>
          </li>
        ))}
      </ol>
    </section>
  );
}
