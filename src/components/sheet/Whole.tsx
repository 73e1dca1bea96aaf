import { dayOf } from '@/components/ui/day';
import { Notice } from '@/components/ui/Notice';
import { faultSentence, TELL_THE_STEWARD, type Fault } from '@/domain/audit/fault';
import { counted } from './words';

/** How a history stands in the audit trail, as it was looked at while the page was made. */
export interface TrailWords {
  /** Entries of the whole trail. */
  entries: number;
  /** When it was last followed from its first entry. */
  wholeAt: string;
  /** Entries about what is shown. */
  own: number;
  /** Texts on the page. */
  texts: number;
  faults: readonly Fault[];
  /** Something else in the trail is wrong. */
  elsewhere: boolean;
  /** Entries are gone, and nobody can say what they were about. */
  unplaced: boolean;
}

const timeOf = (iso: string) => `${iso.slice(11, 16)} UTC`;

/**
 * Says that a history is whole, or plainly what is wrong with it and what to do.
 *
 * @param part true where the page shows only a part of the history: no more is claimed than was looked at
 */
export function Whole({ trail, part }: { trail: TrailWords; part: boolean }) {
  const { entries, wholeAt, own, texts, faults, elsewhere, unplaced } = trail;
  if (faults.length > 0)
    return (
      <div className="border-l-[14px] border-ink bg-white px-5 py-4 sm:px-8" role="alert">
        <p className="font-serif text-lead font-bold">This history does not hold</p>
        <ul className="mt-1 flex flex-col gap-1">
          {faults.map((fault) => (
            <li key={`${fault.table} ${fault.id} ${fault.differs.join()}`}>{faultSentence(fault, dayOf)}</li>
          ))}
        </ul>
        <p className="mt-1 font-semibold">{TELL_THE_STEWARD}</p>
      </div>
    );
  const shown = `${counted(texts, 'text')} on this page`;
  return (
    <div className="px-4 py-4 sm:px-9">
      <p className="max-w-[110ch]">
        <b className="font-semibold">{part || unplaced ? 'What is shown here holds:' : 'This history is whole:'}</b>{' '}
        {elsewhere
          ? `${counted(own, 'entry', 'entries')} about it in the audit trail and ${shown} were checked just now.`
          : `${counted(entries, 'entry', 'entries')} in the audit trail, each follows from the one before it. ${own} of them and ${shown} were checked just now; the trail from its first entry on ${dayOf(wholeAt)}, ${timeOf(wholeAt)}.`}
      </p>
      {elsewhere && (
        <Notice className="mt-3">
          {unplaced
            ? `Entries of the trail are gone, and nobody can say whether they were about this sheet. ${TELL_THE_STEWARD}`
            : 'The trail does not hold in another place, which is not about this sheet. The network’s steward sees it.'}
        </Notice>
      )}
    </div>
  );
}
