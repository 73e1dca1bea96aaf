import type { ReactNode } from 'react';

/** One of several, its whole line being the target. */
export function Choice({
  name,
  value,
  chosen,
  label,
  hint,
  id,
  onChoose,
}: {
  name: string;
  value: string;
  chosen: boolean;
  label: ReactNode;
  hint?: ReactNode;
  id?: string;
  onChoose?: () => void;
}) {
  return (
    <label className="flex min-h-touch cursor-pointer items-start gap-3 py-2.5 leading-snug">
      <input
        type="radio"
        id={id}
        name={name}
        value={value}
        defaultChecked={chosen}
        onChange={onChoose}
        className="mt-0.5 size-[1.15rem] flex-none accent-petrol"
      />
      <span className="min-w-0">
        <span className="block">{label}</span>
        {hint && <span className="block text-small text-ink-2">{hint}</span>}
      </span>
    </label>
  );
}

/** What is wrong with a choice, beside it. */
export const FieldError = ({ id, error }: { id: string; error: string | undefined }) =>
  error ? (
    <p id={id} className="mt-2 border-l-[8px] border-ink pl-2.5 font-medium leading-snug">
      {error}
    </p>
  ) : null;

/** A way to begin; what it asks for shows under it while it is chosen, by style alone. */
export function Way({
  way,
  now,
  label,
  hint,
  children,
}: {
  way: string;
  now: string;
  label: string;
  hint: string;
  children?: ReactNode;
}) {
  return (
    <div className="begin-way">
      <Choice
        id={`from-${way}`}
        name="from"
        value={way}
        chosen={way === now}
        label={<b className="font-semibold">{label}</b>}
        hint={hint}
      />
      {children && <div className="begin-panel pb-5 pt-1 sm:pl-8">{children}</div>}
    </div>
  );
}
