import { EntryTable } from './EntryTable';
import { Figures } from './Figures';
import { NewEntry } from './NewEntry';
import { LIST_NAMES, ONE_OF } from './places';
import { useDesk } from './desk';
import { useEntries } from './useEntries';
import type { ListName } from '@/domain/writing/draft';
import { COLUMNS } from './columns';

const WHAT_FOR: Record<ListName, string> = {
  torques: 'Written once here; the steps point at it. Change a number and it changes in every step that uses it.',
  limits: 'What a reading is judged against. A finding has no number: it says what must be seen.',
  timers: 'Soaking, waiting, retorque. How long a sealant takes stands under supplies.',
  parts: 'What is replaced, inspected or used again. Quantity and disposition show in "before you start".',
  tools: 'What to lay out, with the range that is needed.',
  supplies: 'What is used up, with the time until it skins over and until it is cured.',
  cautions: 'What can hurt, what it does, what to do about it. Each stands ahead of the steps that it guards.',
  figures: 'Drawings that the book has. Put one into a step with "Drawing" under its words.',
  sources: 'Where values come from. A value without a source says so on the sheet.',
};

/** One list of the sheet: what it is for, its entries, and a place for another. */
export function ListEditor({ list }: { list: ListName }) {
  const { draft, focusSoon } = useDesk();
  const { add } = useEntries(list);
  return (
    <div>
      <h2 className="text-lead">{LIST_NAMES[list]}</h2>
      <p className="mb-5 mt-1 max-w-prose text-ink-2">{WHAT_FOR[list]}</p>
      {draft[list].length === 0 && (
        <p className="mb-5 border border-rule bg-side px-4 py-3">There is no {ONE_OF[list]} on this sheet yet.</p>
      )}
      {list === 'figures' ? <Figures /> : <EntryTable list={list} />}
      <NewEntry
        key={draft[list].length}
        list={list}
        onAdd={(name) => {
          const at = draft[list].length;
          add(name);
          const first = list === 'figures' ? 'file' : (COLUMNS[list][1]?.field ?? COLUMNS[list][0]?.field ?? 'name');
          focusSoon(`f-${list}-${at}-${first}`);
        }}
      />
    </div>
  );
}
