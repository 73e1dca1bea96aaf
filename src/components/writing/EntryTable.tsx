import { Fragment } from 'react';
import { SignalPanel } from '@/components/sheet/SignalPanel';
import { classes } from '@/components/ui/classes';
import { entryName, type Entry, type ListName } from '@/domain/writing/draft';
import { SIGNAL_WORDS } from '@/domain/procedure/schema';
import { usesInWords } from '@/domain/writing/uses';
import { Cell } from './Cell';
import { columnsFor, type Column } from './columns';
import { DeleteEntry } from './DeleteEntry';
import { useDesk } from './desk';
import { ChoiceBox, LongBox, TextBox } from './fields';
import { LIST_NAMES } from './places';
import { RowProblems } from './RowProblems';
import { TorqueMore } from './TorqueMore';

/** Where an entry is used, in words, and whether it is new to the sheet. */
function Standing({ list, entryKey }: { list: ListName; entryKey: string }) {
  const { draft, base } = useDesk();
  const uses = usesInWords(draft, list, entryKey);
  const fresh = base && !base[list].some((entry) => entry['key'] === entryKey);
  const quiet = list === 'tools' || (list === 'supplies' && !uses) || (list === 'parts' && !uses);
  return (
    <span className="text-small text-ink-2">
      {[fresh && 'New.', uses ? `Used in ${uses}.` : !quiet && 'Not used yet.'].filter(Boolean).join(' ')}
    </span>
  );
}

function Beneath({ path, column, list, index }: { path: string; column: Column; list: ListName; index: number }) {
  const { draft } = useDesk();
  const entry = draft[list][index] ?? {};
  const shared = { path, label: column.label, hint: column.hint };
  if (column.options)
    return (
      <ChoiceBox
        {...shared}
        options={column.options(entry, draft)}
        blank={column.blank}
        fieldClass={list === 'limits' ? 'sm:col-span-4' : 'sm:col-span-2'}
      />
    );
  return column.long ? (
    <LongBox {...shared} rows={1} fieldClass="sm:col-span-full" />
  ) : (
    <TextBox {...shared} fieldClass={'sm:col-span-2'} />
  );
}

/** The caution as it will stand ahead of its step. */
function CautionBand({ entry }: { entry: Entry }) {
  const { signal, hazard = '', harm = '', avoid = '' } = entry;
  const known = SIGNAL_WORDS.find((word) => word === signal);
  if (!known) return null;
  return (
    <div className="border-frame border-b-0 border-ink">
      <SignalPanel caution={{ key: entry['key'] ?? '', signal: known, hazard, harm, avoid }} shape="band" />
    </div>
  );
}

/** Every entry of a list: what is compared most in a row, the rest with its label underneath. */
export function EntryTable({ list }: { list: Exclude<ListName, 'figures'> }) {
  const { draft } = useDesk();
  const entries = draft[list];
  return entries.map((entry, index) => {
    const key = entry['key'] ?? '';
    const columns = columnsFor(list, entry);
    const row = columns.filter((column) => column.width);
    const beneath = columns.filter((column) => !column.width);
    return (
      <section
        key={`${key}:${index}`}
        id={`f-${list}-${index}`}
        tabIndex={-1}
        aria-label={`${LIST_NAMES[list]}, ${index + 1}: ${entryName(list, entry)}`}
        className="mb-6"
      >
        {list === 'cautions' && <CautionBand entry={entry} />}
        {row.length > 0 && (
          <div
            className="value-grid border-frame border-ink"
            style={{ '--columns': row.map(({ width }) => `minmax(0,${width})`).join(' ') } as React.CSSProperties}
          >
            {row.map((column) => (
              <div key={column.field} className="value-cell">
                <span aria-hidden="true" className="value-label">
                  {column.label}
                </span>
                <Cell list={list} index={index} entry={entry} column={column} />
              </div>
            ))}
          </div>
        )}
        <RowProblems list={list} index={index} fields={row.map(({ field }) => field)} />
        <div
          className={classes(
            'grid gap-x-5 gap-y-4 border-x border-b border-rule bg-sheet px-4 pb-2 pt-3 sm:grid-cols-6',
            row.length === 0 && 'border-t border-t-rule',
          )}
        >
          {beneath.map((column) => (
            <Fragment key={column.field}>
              {list === 'torques' && column.field === 'note' && <TorqueMore index={index} entry={entry} />}
              <Beneath path={`${list}.${index}.${column.field}`} column={column} list={list} index={index} />
            </Fragment>
          ))}
          <div className="flex items-center justify-between gap-4 sm:col-span-full">
            <Standing list={list} entryKey={key} />
            <DeleteEntry list={list} entry={entry} />
          </div>
        </div>
      </section>
    );
  });
}
