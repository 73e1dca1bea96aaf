import { capital } from '@/domain/wording';
import { Field } from '@/components/ui/Field';
import { Select } from '@/components/ui/Select';
import { TextArea } from '@/components/ui/TextArea';
import { ENTRY_FIELDS, isListName } from '@/domain/procedure/fields';
import type { Conflict } from '@/domain/revision/mergeTypes';

type Fields = Record<string, unknown>;

/** Fields whose words are free; of all others that are no numbers, one of the three is taken. */
const FREE = new Set(
  'title summary name number note range class hazard harm avoid expect detail caption alt'.split(' '),
);
const SIDES = ['base', 'theirs', 'mine'] as const;

const isFree = (name: string, values: readonly unknown[]) =>
  values.every((v) => v === undefined || v === null || typeof v === 'number') ||
  (FREE.has(name) && values.every((v) => v === undefined || v === null || typeof v === 'string'));

const lastOf = (path: string) => path.split('.').at(-1) ?? path;

/** Whether an author may write a value of their own in place of the three. */
export function canType(conflict: Conflict): boolean {
  const { kind, path, base, mine, theirs } = conflict;
  if (kind === 'text') return true;
  if (kind === 'field') return isFree(lastOf(path), [base, mine, theirs]);
  return kind === 'entry' && Boolean(mine) && Boolean(theirs);
}

function Box({
  name,
  label,
  values,
  value,
  onChange,
}: {
  name: string;
  label: string;
  values: readonly unknown[];
  value: unknown;
  onChange: (value: unknown) => void;
}) {
  const text = (v: unknown) => (v === undefined || v === null ? '' : typeof v === 'string' ? v : JSON.stringify(v));
  if (!isFree(lastOf(name), values)) {
    const options = [...new Set(values.map(text))].map((v) => ({ value: v, label: v || 'not set' }));
    const pick = (chosen: string) => onChange(values.find((v) => text(v) === chosen));
    return (
      <Select name={name} label={label} options={options} value={text(value)} onChange={(e) => pick(e.target.value)} />
    );
  }
  const number = values.some((v) => typeof v === 'number');
  return (
    <Field
      name={name}
      label={label}
      inputMode={number ? 'decimal' : undefined}
      type={number ? 'number' : 'text'}
      step="any"
      defaultValue={text(value)}
      onChange={({ target }) => {
        if (target.value.trim() === '') onChange(undefined);
        else onChange(number ? target.valueAsNumber : target.value);
      }}
    />
  );
}

/** Boxes for a value of the author's own, filled with what stood chosen before. */
export function MergeTyped({
  conflict,
  value,
  onChange,
}: {
  conflict: Conflict;
  value: unknown;
  onChange: (value: unknown) => void;
}) {
  const { kind, path, label } = conflict;
  if (kind === 'text')
    return (
      <TextArea
        name={`typed.${path}`}
        label={`${label}, in your words`}
        rows={10}
        value={String(value ?? '')}
        onChange={(event) => onChange(event.target.value)}
      />
    );
  if (kind === 'field') {
    const values = SIDES.map((side) => conflict[side]);
    return <Box name={`typed.${path}`} label={label} values={values} value={value} onChange={onChange} />;
  }
  const list = path.split('.')[0];
  if (!isListName(list)) return null;
  const sides = SIDES.map((side) => (conflict[side] ?? {}) as Fields);
  const differing = Object.entries(ENTRY_FIELDS[list]).filter(
    ([name]) => new Set(sides.map((side) => JSON.stringify(side[name]))).size > 1,
  );
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      {differing.map(([name, words]) => (
        <Box
          key={name}
          name={`typed.${path}.${name}`}
          label={capital(words)}
          values={sides.map((side) => side[name])}
          value={(value as Fields)[name]}
          onChange={(next) => {
            const { [name]: _, ...rest } = value as Fields;
            onChange(next === undefined ? rest : { ...rest, [name]: next });
          }}
        />
      ))}
    </div>
  );
}
