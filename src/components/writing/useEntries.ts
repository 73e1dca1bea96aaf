import { capital } from '@/domain/wording';
import { ENTRY_FIELDS } from '@/domain/procedure/fields';
import type { Entry, ListName } from '@/domain/writing/draft';
import { entryName } from '@/domain/writing/draft';
import { freeSlug } from '@/domain/writing/ids';
import { NAMING, STARTS_WITH } from './columns';
import { useDesk, useDraftForm } from './desk';
import { ONE_OF } from './places';

/** Adding and deleting entries of a list. */
export function useEntries(list: ListName) {
  const { getValues, setValue } = useDraftForm();
  const { offerUndo } = useDesk();
  const change = (entries: Entry[]) => setValue(list, entries, { shouldDirty: true });

  /** Adds an entry under a key made from its name, and returns the key. */
  const add = (name: string, more: Entry = {}): string => {
    const entries = getValues(list);
    const key = freeSlug(
      name,
      entries.map((entry) => entry['key'] ?? ''),
      ONE_OF[list],
    );
    const blank = Object.fromEntries(Object.keys(ENTRY_FIELDS[list]).map((field) => [field, '']));
    change([...entries, { ...blank, ...STARTS_WITH[list], ...more, key, [NAMING[list].field]: name.trim() }]);
    return key;
  };

  /** Deletes an entry; it can be brought back to where it stood. */
  const remove = (key: string) => {
    const entries = getValues(list);
    const at = entries.findIndex((entry) => entry['key'] === key);
    const entry = entries[at];
    if (!entry) return;
    change(entries.toSpliced(at, 1));
    const one = ONE_OF[list];
    offerUndo(`${capital(one)} deleted: ${entryName(list, entry)}.`, () =>
      change(getValues(list).toSpliced(at, 0, entry)),
    );
  };
  return { add, remove };
}
