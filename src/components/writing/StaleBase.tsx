import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { BothTexts } from './BothTexts';

/** Another revision was published since the draft was begun; the author reads it and then stands the text on it. */
export function StaleBase({
  number,
  base,
  current,
  mine,
  onRebase,
}: {
  number: string;
  base: string | null;
  current: { letter: string; source: string };
  mine: string;
  /** Returns what went wrong, or null. */
  onRebase: () => Promise<string | null>;
}) {
  const [pending, setPending] = useState(false);
  const [failed, setFailed] = useState<string | null>(null);
  return (
    <section role="alert" className="border-l-[14px] border-ink bg-white px-5 py-4 sm:px-7">
      <h2 className="text-lead">
        Revision {current.letter} was published since you started{base ? ` from ${base}` : ''}
      </h2>
      <p className="mt-1 max-w-prose">
        {base && (
          <>
            <a href={`/procedures/${number}/compare?from=${base}&to=${current.letter}`}>
              See what changed from {base} to {current.letter}
            </a>{' '}
            and bring over what you want to keep.{' '}
          </>
        )}
        Then put your text on top of {current.letter}: from there on the editor sees your text against {current.letter},
        and anything of it that you leave out is shown as taken away.
      </p>
      <div className="mt-3">
        <Button
          pending={pending}
          pendingText="Putting it there"
          onClick={() => {
            setPending(true);
            void onRebase().then((why) => {
              setFailed(why);
              if (why) setPending(false);
            });
          }}
        >
          Put my text on top of {current.letter}
        </Button>
        {failed && <p className="mt-2 border-l-[8px] border-ink pl-2.5 font-medium">{failed}</p>}
      </div>
      <BothTexts
        texts={[
          { name: `Revision ${current.letter}, as published`, text: current.source },
          { name: 'Your text', text: mine },
        ]}
      />
    </section>
  );
}
