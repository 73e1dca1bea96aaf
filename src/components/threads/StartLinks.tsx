import type { ThreadKind } from '@/domain/review/threads';
import { START_WORDS } from './words';

/** The words that start a thread at one place. Links to the page with the panel open, for where no script runs. */
export const StartLinks = ({
  at,
  place,
  kinds,
  onStart,
}: {
  /** Anchor, or empty for the whole. */
  at: string;
  /** What is meant, for ears: "step 2, Tighten the cover". */
  place: string;
  kinds: readonly ThreadKind[];
  onStart: (kind: ThreadKind) => void;
}) => (
  <span className="start-here">
    {kinds.map((kind) => (
      <a
        key={kind}
        id={`start-${kind}-${at}`}
        href={`?start=${kind}&at=${encodeURIComponent(at)}#start`}
        onClick={(event) => {
          event.preventDefault();
          onStart(kind);
        }}
      >
        {START_WORDS[kind].verb}
        <span className="sr-only">, {place}</span>
      </a>
    ))}
  </span>
);
