import { dayOf } from '@/components/ui/day';
import { faultSentence, type Fault } from '@/domain/audit/fault';

const timeOf = (iso: string) => `${iso.slice(11, 16)} UTC`;
/** A page says no more than this at once; the script names them all. */
const SHOWN = 50;

/** How the whole trail stands, for the steward: whole, or each thing that is not as it was written and what to do. */
export function TrailState({
  entries,
  wholeAt,
  faults,
}: {
  entries: number;
  wholeAt: string;
  faults: readonly Fault[];
}) {
  if (faults.length === 0)
    return (
      <p className="px-4 py-4 sm:px-9">
        <b className="font-semibold">The trail is whole:</b> {entries} entries, each follows from the one before it. It
        was checked from its first entry on {dayOf(wholeAt)}, {timeOf(wholeAt)}, and what was added since just now.
      </p>
    );
  return (
    <div className="border-l-[14px] border-ink bg-white px-5 py-4 sm:px-8" role="alert">
      <p className="font-serif text-lead font-bold">The trail does not hold</p>
      <ul className="mt-2 flex flex-col gap-2">
        {faults.slice(0, SHOWN).map((fault) => (
          <li key={`${fault.table} ${fault.id} ${fault.differs.join()}`}>
            {faultSentence(fault, dayOf)}{' '}
            <span className="text-small text-ink-2 [overflow-wrap:anywhere]">
              {fault.table}, {fault.id}
            </span>
          </li>
        ))}
      </ul>
      {faults.length > SHOWN && <p className="mt-2">And {faults.length - SHOWN} more.</p>}
      <p className="mt-3 max-w-prose font-semibold">
        Let nobody work from these sheets. Have whoever runs the server keep a copy of the data folder as it is, run npm
        run audit:check on it, and compare with the last backup that held.
      </p>
    </div>
  );
}
