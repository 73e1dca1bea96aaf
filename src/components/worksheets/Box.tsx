import { useId } from 'react';
import type { BothUnits } from '@/domain/measure/format';
import { readBare } from '@/domain/measure/read';
import type { Column } from '@/domain/worksheets/fields';
import { boxUnit } from '@/domain/worksheets/readInputs';
import { classes } from '@/components/ui/classes';
import { Field } from '@/components/ui/Field';
import { Select } from '@/components/ui/Select';
import type { Units } from './asked';

/** What every box of a worksheet is handed. `path` is its name in the form and in the address. */
export interface BoxProps {
  path: string;
  text: string;
  units: Units;
  /** What is wrong with what stands in it. */
  problem: string | undefined;
  understood: BothUnits | undefined;
  /** What the shop has set for a rule of thumb, in the field's unit. */
  rule: number | undefined;
  onType: (path: string, text: string) => void;
}

/** "0.356 mm, 0.014 in": how a text was read. Nothing where it says no more than the box. */
export function Understood({ both, text }: { both: BothUnits | undefined; text: string }) {
  if (!both || text.trim() === '') return null;
  return (
    <span className="text-small text-ink-2">
      {both.metric === both.inch ? both.metric : `${both.metric}, ${both.inch}`}
    </span>
  );
}

const unitAfter = (column: Column, units: Units) =>
  column.type === 'quantity' ? boxUnit(column.unit, units) : column.type === 'number' ? column.after : undefined;

/** Words under the label: the field's own, then what is usual where it is a rule of thumb. */
function hintOf(column: Column, rule: number | undefined): string | undefined {
  if (!('usual' in column) || column.usual === undefined || column.type === 'choice') return column.hint;
  const unit = column.type === 'quantity' ? ` ${column.unit}` : '';
  const set =
    rule === undefined
      ? `Left empty: ${column.usual}${unit}, usual in the trade.`
      : `Left empty: ${rule}${unit}, set by your shop.`;
  return [column.hint, set].filter(Boolean).join(' ');
}

/** One box with its label, and under it how it was read or what is wrong. */
export function Box({ column, path, text, units, problem, understood, rule, onType }: BoxProps & { column: Column }) {
  const id = useId();
  if (column.type === 'choice') {
    const options = column.optional ? [{ value: '', label: 'Not said' }, ...column.options] : column.options;
    return (
      <Select
        id={id}
        name={path}
        label={column.label}
        hint={column.hint}
        hintBelow
        error={problem}
        options={options}
        value={text || (column.optional ? '' : (column.usual ?? column.options[0]?.value ?? ''))}
        onChange={(event) => onType(path, event.target.value)}
      />
    );
  }
  const unit = unitAfter(column, units);
  return (
    <div className="flex min-w-0 flex-col gap-1">
      <Field
        id={id}
        name={path}
        label={
          <>
            {column.label}
            {column.optional && <span className="font-normal text-ink-2">, if known</span>}
          </>
        }
        hint={hintOf(column, rule)}
        hintBelow
        error={problem}
        {...(unit !== undefined && { unit })}
        value={text}
        inputMode={column.type === 'number' ? 'decimal' : 'text'}
        autoComplete="off"
        spellCheck={false}
        maxLength={60}
        className={classes(column.type !== 'text' && 'tabular-nums')}
        onChange={(event) => onType(path, event.target.value)}
      />
      <Understood both={understood} text={text} />
    </div>
  );
}

/** A box in a table of readings: its row and column name it. */
export function Cell({
  column,
  label,
  path,
  text,
  units,
  problem,
  understood,
  onType,
}: BoxProps & { column: Column; label: string }) {
  const id = useId();
  const shared = {
    id,
    name: path,
    'aria-label': label,
    'aria-invalid': problem ? true : undefined,
    'aria-describedby': problem ? `${id}-error` : undefined,
  };
  if (column.type === 'choice')
    return (
      <select
        {...shared}
        className="field-box"
        value={text || (column.optional ? '' : (column.usual ?? column.options[0]?.value ?? ''))}
        onChange={(event) => onType(path, event.target.value)}
      >
        {column.optional && <option value="">Not said</option>}
        {column.options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    );
  const own = unitAfter(column, units);
  const reads = own && !readBare(text).ok && !text.trim().endsWith(own);
  return (
    <>
      <input
        {...shared}
        className="field-box tabular-nums"
        value={text}
        autoComplete="off"
        spellCheck={false}
        maxLength={60}
        onChange={(event) => onType(path, event.target.value)}
      />
      {reads && <Understood both={understood} text={text} />}
      {problem && (
        <p id={`${id}-error`} className="mt-1 border-l-[8px] border-ink pl-2.5 font-medium leading-snug">
          {problem}
        </p>
      )}
    </>
  );
}
