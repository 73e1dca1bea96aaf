import { classes } from '@/components/ui/classes';
import { VisuallyHidden } from '@/components/ui/VisuallyHidden';
import type { Entry, ListName } from '@/domain/writing/draft';
import { boxesOf, joinBoxes } from '@/domain/writing/draft';
import type { Column } from './columns';
import { useDesk } from './desk';
import { useBox, useWas } from './useBox';

const BOX =
  'min-h-[42px] w-full rounded-none border-0 bg-transparent px-2.5 py-1.5 text-ink focus-visible:relative focus-visible:z-10 focus-visible:outline-offset-[-3px]';
/** A value that is no longer what the base says. */
const CHANGED = 'bg-wash font-semibold shadow-[inset_0_0_0_3px_theme(colors.petrol)]';

/** "was 10", for ears and on a second look. */
const Was = ({ was, id }: { was: string; id: string }) => (
  <VisuallyHidden>
    <span id={id}>Changed. Before: {was || 'nothing'}.</span>
  </VisuallyHidden>
);

/** One field of an entry inside a table: no frame of its own, outlined once it differs from the base. */
export function Cell({ list, index, entry, column }: { list: ListName; index: number; entry: Entry; column: Column }) {
  const { draft } = useDesk();
  const path = `${list}.${index}.${column.field}`;
  const { id, value, set, onBlur, error } = useBox(path);
  const was = useWas(list, entry['key'] ?? '', column.field, value);
  const changed = was !== undefined;
  const shared = {
    id,
    name: path,
    value,
    onBlur,
    'aria-label': `${column.label}, row ${index + 1}`,
    'aria-invalid': error ? true : undefined,
    'aria-describedby': classes(error && `${id}-error`, changed && `${id}-was`) || undefined,
    title: changed ? `was ${was || 'empty'}` : column.hint,
    className: classes(BOX, changed && CHANGED, error && 'underline decoration-2 underline-offset-4'),
  };
  const options = column.options?.(entry, draft);
  return (
    <>
      {options ? (
        <select
          {...shared}
          className={classes(shared.className, '!pl-1.5 !pr-1')}
          onChange={(event) => set(event.target.value)}
        >
          {(column.blank !== undefined || value === '') && <option value="">{column.blank ?? 'Choose'}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
          {value !== '' && !options.some((option) => option.value === value) && <option value={value}>{value}</option>}
        </select>
      ) : column.wraps ? (
        <textarea
          {...shared}
          rows={1}
          autoComplete="off"
          className={classes(shared.className, 'block resize-none [field-sizing:content]')}
          onChange={(event) => set(event.target.value.replace(/\s*\n\s*/g, ' '))}
        />
      ) : (
        <input
          {...shared}
          autoComplete="off"
          inputMode={column.short && column.field !== 'thread' && column.field !== 'number' ? 'decimal' : undefined}
          onChange={(event) => set(event.target.value)}
        />
      )}
      {changed && <Was was={was} id={`${id}-was`} />}
    </>
  );
}

/** One box of a field that holds several numbers, such as the second pass. */
export function BoxCell({
  list,
  index,
  entry,
  field,
  at,
  label,
}: {
  list: ListName;
  index: number;
  entry: Entry;
  field: string;
  at: number;
  label: string;
}) {
  const path = `${list}.${index}.${field}`;
  const { base } = useDesk();
  const { id, value, set, onBlur, error } = useBox(path);
  const boxes = boxesOf(value);
  const before = base?.[list].find((one) => one['key'] === entry['key']);
  const was = before && (boxesOf(before[field])[at] ?? '');
  const changed = was !== undefined && was.replace(',', '.') !== (boxes[at] ?? '').replace(',', '.');
  const own = `${id}-${at}`;
  return (
    <>
      <input
        id={own}
        value={boxes[at] ?? ''}
        autoComplete="off"
        inputMode="decimal"
        aria-label={`${label}, row ${index + 1}`}
        aria-invalid={error ? true : undefined}
        aria-describedby={classes(error && `${id}-error`, changed && `${own}-was`) || undefined}
        className={classes(BOX, changed && CHANGED)}
        onBlur={onBlur}
        onChange={(event) => set(joinBoxes(boxes.with(at, event.target.value)))}
      />
      {changed && <Was was={was} id={`${own}-was`} />}
    </>
  );
}
