import { ENTRY_FIELDS, isListName } from '@/domain/procedure/fields';
import { detailOf, type Entry, wholeOf } from '@/domain/revision/fields';
import type { Conflict, Side } from '@/domain/revision/mergeTypes';
import { fieldText } from '@/domain/revision/mergeWords';

const SIDES = ['base', 'theirs', 'mine'] as const satisfies Side[];

/**
 * An entry as one side has it: the value that hands act on, large, with the fastener or state that it stands on; then
 * what differs between the sides. What all have alike is left out.
 */
export function MergeEntry({ conflict, side }: { conflict: Conflict; side: Side }) {
  const list = conflict.path.split('.')[0];
  const entry = conflict[side] as Entry | null;
  if (!isListName(list) || !entry) return null;
  const sides = SIDES.flatMap((one) => (conflict[one] ? [conflict[one] as Entry] : []));
  const names = Object.keys(ENTRY_FIELDS[list]).filter((name) => name !== 'key');
  const differing = names.filter((name) => new Set(sides.map((one) => fieldText(list, name, one))).size > 1);
  const number = list === 'torques' || list === 'limits' || list === 'timers';
  const detail = (detailOf[list] as (entry: Entry) => string | null)(entry);
  return (
    <>
      <p className={number ? 'text-title font-semibold' : 'font-semibold'}>
        {(wholeOf[list] as (entry: Entry) => string)(entry)}
      </p>
      {detail && <p className="text-ink-2">{detail}</p>}
      {differing.length > 0 && (
        <dl className="mt-2 grid grid-cols-[max-content_minmax(0,1fr)] gap-x-3 border-t border-hair pt-1.5">
          {differing.map((name) => (
            <div key={name} className="contents">
              <dt className="text-ink-2">{(ENTRY_FIELDS[list] as Record<string, string>)[name]}</dt>
              <dd className="break-words font-semibold">{fieldText(list, name, entry) ?? 'not set'}</dd>
            </div>
          ))}
        </dl>
      )}
    </>
  );
}
