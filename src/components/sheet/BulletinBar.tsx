import type { Bulletin } from '@/domain/api/schemas/bulletins';
import { BulletinText } from './BulletinText';
import { bulletinTitle } from './bulletinWords';
import { ReadThis } from './ReadThis';

/** What the reader of a sheet has still to read and sign, ahead of its steps. It stands on paper too, for it is not read yet. */
export function BulletinBar({ bulletins, back }: { bulletins: readonly Bulletin[]; back: string }) {
  if (bulletins.length === 0) return null;
  return (
    <section aria-label="Read and sign" className="border-l-[14px] border-ink bg-white">
      {bulletins.map((bulletin) => (
        <div
          key={bulletin.id}
          className="flex flex-wrap items-end justify-between gap-x-10 gap-y-4 border-t border-hair px-5 py-5 first:border-t-0 sm:px-[1.375rem]"
        >
          <div>
            <h2 className="mb-1.5 text-lead">{bulletinTitle(bulletin)}</h2>
            <BulletinText bulletin={bulletin} />
          </div>
          <div className="print:hidden">
            <ReadThis bulletin={bulletin.id} back={back} about={bulletinTitle(bulletin)} />
          </div>
        </div>
      ))}
    </section>
  );
}
