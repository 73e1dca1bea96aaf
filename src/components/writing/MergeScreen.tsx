import { Button } from '@/components/ui/Button';
import { CameIn } from './CameIn';
import { MergeConflict } from './MergeConflict';
import { placesWords } from './mergeWords';
import type { Merged } from './useMerge';
import type { Merging } from './useMerging';

/** Everything that both changed, to choose from, and then the one press that stands the draft on the new base. */
export function MergeScreen({
  merged,
  merging,
  base,
  letter,
}: {
  merged: Merged;
  merging: Merging;
  base: string;
  letter: string;
}) {
  const { choices, pending, failed } = merging;
  const open = merged.conflicts.filter(({ path }) => !choices[path]);
  const first = open[0];
  const take = () => {
    if (!first) return merging.take();
    const place = document.getElementById(`conflict-${first.path}`);
    place?.scrollIntoView({ block: 'start' });
    place?.querySelector('input')?.focus();
  };
  return (
    <section aria-labelledby="merge-title" className="flex flex-col gap-7 px-5 py-6 sm:px-7">
      <div>
        <h2 id="merge-title" className="text-title">
          Bring your text and revision {letter} together
        </h2>
        <p className="mt-1 max-w-prose">
          Choose for each place. All else that you and revision {letter} changed is brought together already, and your
          draft stays as it is until you press the button at the end.
        </p>
      </div>
      {merged.conflicts.map((conflict) => (
        <MergeConflict
          key={conflict.path}
          conflict={conflict}
          base={base}
          letter={letter}
          choice={choices[conflict.path]}
          onChoose={(choice) => merging.choose({ ...choices, [conflict.path]: choice })}
        />
      ))}
      <div className="border-t-[3px] border-ink pt-3">
        <p role="status" className="font-semibold">
          {open.length === 0 ? 'Every place is chosen.' : `${placesWords(open.length)} still to choose.`}
        </p>
        {open.length === 0 && (
          <>
            <p className="mt-2">This comes into your text:</p>
            <CameIn changes={merged.cameIn} />
          </>
        )}
        <div className="mt-3 flex flex-wrap gap-2.5">
          <Button kind="main" pending={pending} pendingText="Putting it there" onClick={take}>
            {open.length === 0 ? `Go on from revision ${letter}` : 'Go to the next place'}
          </Button>
          <Button onClick={() => merging.show(false)}>Back to the draft</Button>
        </div>
        {failed && (
          <p role="alert" className="mt-2 border-l-[8px] border-ink pl-2.5 font-medium">
            {failed}
          </p>
        )}
      </div>
    </section>
  );
}
