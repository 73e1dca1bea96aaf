import { Button } from '@/components/ui/Button';
import type { Proposal } from '@/domain/api/schemas/proposals';
import { BothTexts } from './BothTexts';

/** The draft was saved in another tab or on another device meanwhile: the author says which text goes on, and loses neither. */
export function Elsewhere({
  theirs,
  mine,
  onTheirs,
  onMine,
}: {
  theirs: Proposal;
  mine: string;
  onTheirs: () => void;
  onMine: () => void;
}) {
  return (
    <section role="alert" className="border-l-[14px] border-ink bg-white px-5 py-4 sm:px-7">
      <h2 className="text-lead">This draft was changed in another tab or on another device</h2>
      <p className="mt-1 max-w-prose">
        It was saved there after you opened it here. Nothing was written over: your words are held on this device until
        you say which text goes on.
      </p>
      <div className="mt-3 flex flex-wrap gap-2.5">
        <Button onClick={onMine}>Keep what is on this screen</Button>
        <Button onClick={onTheirs}>Take what was saved there</Button>
      </div>
      <BothTexts
        texts={[
          { name: 'Saved there', text: theirs.source },
          { name: 'On this screen', text: mine },
        ]}
      />
    </section>
  );
}
