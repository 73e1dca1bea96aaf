import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { entryName, type Entry, type ListName } from '@/domain/writing/draft';
import { usesInWords } from '@/domain/writing/uses';
import { useDesk } from './desk';
import { ONE_OF } from './places';
import { useEntries } from './useEntries';

/** Deletes an entry. Where something points at it, says where and asks first. */
export function DeleteEntry({ list, entry }: { list: ListName; entry: Entry }) {
  const { draft } = useDesk();
  const { remove } = useEntries(list);
  const [asking, setAsking] = useState(false);
  const key = entry['key'] ?? '';
  const name = entryName(list, entry);
  const uses = usesInWords(draft, list, key);
  const sure = () => {
    setAsking(false);
    remove(key);
  };
  return (
    <>
      <Button
        kind="quiet"
        className="text-small"
        aria-label={`Delete ${name}`}
        onClick={() => (uses ? setAsking(true) : remove(key))}
      >
        Delete
      </Button>
      <Dialog
        open={asking}
        title={`Delete ${name}?`}
        onClose={() => setAsking(false)}
        actions={
          <>
            <Button onClick={sure}>Delete the {ONE_OF[list]}</Button>
            <Button kind="quiet" onClick={() => setAsking(false)}>
              Keep it
            </Button>
          </>
        }
      >
        <p>
          It is used in {uses}. The words there stay as they are and the check will show each place that then points at
          nothing.
        </p>
      </Dialog>
    </>
  );
}
