import { useId, type ReactNode } from 'react';
import type { BothUnits } from '@/domain/measure/format';
import { readBare } from '@/domain/measure/read';
import type { ChoiceField, Column } from '@/domain/worksheets/fields';
import { boxUnit } from '@/domain/worksheets/readInputs';
import { ruleWords } from '@/domain/worksheets/ruleWords';
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
  /** Where the shop sets it; only for those who may. */
  ruleHref: string | undefined;
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

/** What a field asks for, and whether it must be known. */
export const Asked = ({ label, optional = false }: { label: string; optional?: boolean }) => (
  <>
    {label}
    {optional && <span className="font-normal text-ink-2">, if known</span>}
  </>
);

const unitAfter = (column: Column, units: Units) =>
  column.type === 'quantity' ? boxUnit(column.unit, units) : column.type === 'number' ? column.after : undefined;

/** What can be chosen, and what is where nobody has chosen yet. */
const optionsOf = ({ optional, options }: ChoiceField) =>
  optional ? [{ value: '', label: 'Not said' }, ...options] : options;
const chosen = ({ optional, usual, options }: ChoiceField, text: string) =>
  text || (optional ? '' : (usual ?? options[0]?.value ?? ''));

type Hinted = Pick<BoxProps, 'units' | 'rule' | 'ruleHref'>;

/** Words under the box: the field's own, then what is usual where it is a rule of thumb. */
function hintOf(column: Column, { units, rule, ruleHref }: Hinted): ReactNode {
  if (!('usual' in column) || column.usual === undefined || column.type === 'choice') return column.hint;
  const measured = column.type === 'quantity' ? column : { unit: null, after: column.after };
  const value = ruleWords(measured, rule ?? column.usual, units);
  return (
    <>
      {column.hint && `${column.hint} `}
      Left empty: {value}, {rule === undefined ? 'usual in the trade' : 'set by your shop'}.{' '}
      {ruleHref && (
        <a href={ruleHref} className="whitespace-nowrap print:hidden">
          {rule === undefined ? 'Set it for your shop' : 'Change it for your shop'}
        </a>
      )}
    </>
  );
}

/** One box with its label, and under it how it was read or what is wrong. */
export function Box({
  column,
  path,
  text,
  units,
  problem,
  understood,
  rule,
  ruleHref,
  onType,
}: BoxProps & { column: Column }) {
  const id = useId();
  if (column.type === 'choice') {
    return (
      <Select
        id={id}
        name={path}
        label={column.label}
        hint={column.hint}
        hintBelow
        error={problem}
        options={optionsOf(column)}
        value={chosen(column, text)}
        onChange={(event) => onType(path, event.target.value)}
      />
    );
  }
  // A text with a unit of its own is not in that of the box.
  const unit = text.trim() === '' || readBare(text).ok ? unitAfter(column, units) : undefined;
  return (
    <div className="flex min-w-0 flex-col gap-1">
      <Field
        id={id}
        name={path}
        label={<Asked {...column} />}
        hint={hintOf(column, { units, rule, ruleHref })}
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
        value={chosen(column, text)}
        onChange={(event) => onType(path, event.target.value)}
      >
        {optionsOf(column).map((option) => (
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
