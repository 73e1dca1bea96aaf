import { useId, useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Field } from '@/components/ui/Field';
import type { ListName } from '@/domain/writing/draft';
import { NAMING } from './columns';
import { ONE_OF } from './places';

/** Asks what a new entry is called, because its key is made from that and stays. */
export function NewEntry({
  list,
  onAdd,
  onCancel,
}: {
  list: ListName;
  onAdd: (name: string) => void;
  onCancel?: () => void;
}) {
  const id = useId();
  const [name, setName] = useState('');
  const [asked, setAsked] = useState(false);
  const add = () => {
    if (!name.trim()) return setAsked(true);
    onAdd(name);
    setName('');
    setAsked(false);
  };
  return (
    <div className="flex flex-wrap items-end gap-2.5">
      <Field
        fieldClass="min-w-0 flex-1 basis-56"
        label={NAMING[list].label}
        name={`new-${list}`}
        id={`${id}-name`}
        value={name}
        maxLength={90}
        autoComplete="off"
        error={asked && !name.trim() ? 'Write what it is called first.' : undefined}
        onChange={(event) => setName(event.target.value)}
        onKeyDown={(event) => {
          if (event.key !== 'Enter') return;
          event.preventDefault();
          add();
        }}
      />
      <Button onClick={add}>
        Add {/^[aeiou]/.test(ONE_OF[list]) ? 'an' : 'a'} {ONE_OF[list]}
      </Button>
      {onCancel && (
        <Button kind="quiet" onClick={onCancel}>
          Cancel
        </Button>
      )}
    </div>
  );
}
