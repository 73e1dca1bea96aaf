import { Button } from '@/components/ui/Button';
import { BothTexts } from './BothTexts';
import { CameIn } from './CameIn';
import { placesWords } from './mergeWords';
import type { Merging } from './useMerging';

/** Another revision was published since the draft was begun: both are brought together, or the author is asked where they touch. */
export function StaleBase({
  number,
  base,
  current,
  mine,
  merging,
}: {
  number: string;
  base: string | null;
  current: { letter: string; source: string };
  mine: string;
  merging: Merging;
}) {
  const { merged, pending, failed } = merging;
  const { letter } = current;
  const asks = merged?.conflicts.length ?? 0;
  const seen = base && (
    <a href={`/procedures/${number}/compare?from=${base}&to=${letter}`}>
      See what changed from {base} to {letter}
    </a>
  );
  return (
    <section role="alert" className="border-l-[14px] border-ink bg-white px-5 py-4 sm:px-7">
      <h2 className="text-lead">Revision {letter} was published meanwhile</h2>
      {merged && asks === 0 && (
        <>
          <p className="mt-1 max-w-prose">
            Its changes and yours do not touch, so they are brought together. This comes into your text:
          </p>
          <CameIn changes={merged.cameIn} />
        </>
      )}
      {merged && asks > 0 && (
        <p className="mt-1 max-w-prose">
          It changed {placesWords(asks)} that you changed too. Choose there what goes on; all else is brought together
          by itself. {seen}
        </p>
      )}
      {merged === null && (
        <p className="mt-1 max-w-prose">
          Your text cannot be read yet, so it cannot be brought together with revision {letter}. Mend what the check
          lists first. {seen}
        </p>
      )}
      {merged && (
        <div className="mt-3 flex flex-wrap items-center gap-x-5 gap-y-1">
          {asks === 0 ? (
            <Button kind="main" pending={pending} pendingText="Putting it there" onClick={merging.take}>
              Go on from revision {letter}
            </Button>
          ) : (
            <Button kind="main" onClick={() => merging.show(true)}>
              Choose {asks === 1 ? 'there' : `in ${placesWords(asks)}`}
            </Button>
          )}
          {asks === 0 && seen}
        </div>
      )}
      {failed && <p className="mt-2 border-l-[8px] border-ink pl-2.5 font-medium">{failed}</p>}
      <BothTexts
        texts={[
          { name: `Revision ${letter}, as published`, text: current.source },
          { name: 'Your text', text: mine },
        ]}
      />
    </section>
  );
}
