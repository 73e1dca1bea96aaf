import type { InputHTMLAttributes, ReactNode, Ref } from 'react';
import { classes } from './classes';

/**
 * A box to tick, its whole line being the target. `after` stands at the line's end, for a count;
 * `top` keeps the box at the first line of a long label.
 */
export function Checkbox({
  label,
  after,
  top = false,
  className,
  ref,
  ...input
}: InputHTMLAttributes<HTMLInputElement> & {
  label: ReactNode;
  after?: ReactNode;
  top?: boolean;
  ref?: Ref<HTMLInputElement>;
}) {
  return (
    <label
      className={classes(
        'grid min-h-touch cursor-pointer grid-cols-[1.25rem_1fr_auto] gap-2.5',
        top ? '[&>input]:mt-[3px]' : 'items-center',
        className,
      )}
    >
      <input
        {...input}
        ref={ref}
        type="checkbox"
        className="size-[1.15rem] cursor-pointer appearance-none rounded-[2px] border-frame border-ink bg-white checked:border-petrol checked:bg-petrol checked:bg-[url('data:image/svg+xml,%3Csvg%20xmlns=%22http://www.w3.org/2000/svg%22%20viewBox=%220%200%2016%2016%22%3E%3Cpath%20d=%22m3%208.5%203.3%203.3L13%205%22%20fill=%22none%22%20stroke=%22%23fff%22%20stroke-width=%222.4%22/%3E%3C/svg%3E')]"
      />
      <span>{label}</span>
      {after !== undefined && <span className="text-ink-2">{after}</span>}
    </label>
  );
}
