import { lowered } from '@/domain/wording';
import { Button } from '@/components/ui/Button';
import type { BandField, Field, RowsField } from '@/domain/worksheets/fields';
import { boxUnit } from '@/domain/worksheets/readInputs';
import { Asked, Box, Cell, type BoxProps } from './Box';

export type BoxAt = (path: string) => BoxProps;

interface InputProps {
  name: string;
  /** Rows that are shown, where the field has any. */
  count: number;
  boxAt: BoxAt;
  onCount: (name: string, count: number) => void;
}

/** The words over boxes that belong together. */
const Legend = ({ label, optional, hint }: { label: string; optional?: boolean; hint: string | undefined }) => (
  <>
    <legend className="font-medium">
      <Asked label={label} optional={optional} />
    </legend>
    {hint && <p className="text-small text-ink-2">{hint}</p>}
  </>
);

function Band({ name, field, boxAt }: Pick<InputProps, 'name' | 'boxAt'> & { field: BandField }) {
  const end = (which: 'min' | 'max', label: string) => (
    <Box {...boxAt(`${name}.${which}`)} column={{ type: 'quantity', unit: field.unit, label, optional: false }} />
  );
  return (
    <fieldset className="min-w-0">
      <Legend label={field.label} optional={field.optional} hint={field.hint} />
      <div className="mt-1 grid grid-cols-2 gap-3">
        {end('min', 'Least')}
        {end('max', 'Most')}
      </div>
    </fieldset>
  );
}

/** A table of readings. On a phone each row stands by itself, its boxes one under another. */
function Rows({ name, field, count, boxAt, onCount }: InputProps & { field: RowsField }) {
  const columns = Object.entries(field.columns);
  const { units } = boxAt(name);
  const heading = ([, column]: (typeof columns)[number]) =>
    column.type === 'quantity' ? `${column.label}, ${boxUnit(column.unit, units)}` : column.label;
  return (
    <fieldset className="min-w-0 sm:col-span-2">
      <Legend label={field.label} hint={field.hint} />
      <table className="mt-1 w-full border-collapse text-left max-sm:block">
        <thead className="max-sm:sr-only">
          <tr>
            <th scope="col" className="py-1 pr-3 text-small font-medium text-ink-2">
              {field.item}
            </th>
            {columns.map((entry) => (
              <th
                key={entry[0]}
                scope="col"
                className="px-1.5 py-1 text-small font-medium leading-snug text-ink-2 last:pr-0"
              >
                {heading(entry)}
              </th>
            ))}
          </tr>
        </thead>
        <tbody className="max-sm:block">
          {Array.from({ length: count }, (_, i) => (
            <tr key={i} className="align-top max-sm:block max-sm:border-t max-sm:border-hair max-sm:py-2">
              <th scope="row" className="whitespace-nowrap py-3 pr-3 font-medium max-sm:block max-sm:py-1">
                <span className="sm:hidden">{field.item} </span>
                {i + 1}
              </th>
              {columns.map((entry) => (
                <td
                  key={entry[0]}
                  className="px-1.5 py-1 last:pr-0 max-sm:grid max-sm:grid-cols-[9rem_minmax(0,1fr)] max-sm:items-center max-sm:gap-x-2 max-sm:px-0"
                >
                  <span aria-hidden="true" className="leading-snug text-ink-2 sm:hidden">
                    {heading(entry)}
                  </span>
                  <div>
                    <Cell
                      {...boxAt(`${name}.${i}.${entry[0]}`)}
                      column={entry[1]}
                      label={`${field.item} ${i + 1}, ${heading(entry)}`}
                    />
                  </div>
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <div className="mt-2 flex flex-wrap gap-2 print:hidden" data-needs-script="">
        {count < field.most && <Button onClick={() => onCount(name, count + 1)}>Add {lowered(field.item)}</Button>}
        {count > Math.max(1, field.least) && (
          <Button kind="quiet" onClick={() => onCount(name, count - 1)}>
            Take the last away
          </Button>
        )}
      </div>
    </fieldset>
  );
}

/** A field of any type, by its description. */
export function Input({ field, ...given }: InputProps & { field: Field }) {
  if (field.type === 'band') return <Band {...given} field={field} />;
  if (field.type === 'rows') return <Rows {...given} field={field} />;
  return <Box {...given.boxAt(given.name)} column={field} />;
}
