import type { ReactNode, TdHTMLAttributes } from 'react';
import { classes } from './classes';

export interface Column {
  key: string;
  label: string;
  /** Numbers and dates read best from the right. */
  align?: 'right';
  /** Address that sorts by this column; the page reads the order from its own URL. */
  href?: string;
  sorted?: 'ascending' | 'descending' | undefined;
}

/**
 * A list to scan. `children` are `<Row>`s of `<Cell>`s in the order of `columns`. On a narrow screen each row
 * becomes a block with the column's name before each value; browsers still tell it as a table.
 */
export function Table({
  caption,
  columns,
  children,
}: {
  /** Says what the table lists; spoken, not shown. */
  caption: string;
  columns: readonly Column[];
  children: ReactNode;
}) {
  return (
    <table className="w-full border-collapse text-left max-sm:block">
      <caption className="sr-only">{caption}</caption>
      <thead className="max-sm:sr-only">
        <tr className="border-b-frame border-ink">
          {columns.map((column) => (
            <th
              key={column.key}

              scope="col"
              aria-sort={column.sorted}
              className={classes(
                'px-3 py-1 text-small font-medium text-ink-2 first:pl-0 last:pr-0',
                column.align === 'right' && 'text-right',
              )}
            >
              {column.href ? <SortLink column={column} /> : column.label}
            </th>
          ))}
        </tr>
      </thead>
      <tbody className="max-sm:block">{children}</tbody>
    </table>
  );
}

const SortLink = ({ column }: { column: Column }) => (
  <a
    href={column.href}
    className={classes(
      'inline-flex min-h-touch items-center gap-1.5 no-underline hover:underline',
      column.sorted ? 'text-ink' : 'text-ink-2',
    )}
  >
    {column.label}
    <svg width="9" height="12" viewBox="0 0 9 12" aria-hidden="true">
      <path d="M4.5 0 8.5 5H.5z" fill="currentColor" opacity={column.sorted === 'ascending' ? 1 : 0.3} />
      <path d="M4.5 12 8.5 7H.5z" fill="currentColor" opacity={column.sorted === 'descending' ? 1 : 0.3} />
    </svg>
  </a>
);

export const Row = ({ children, className }: { children: ReactNode; className?: string }) => (
  <tr className={classes('border-b border-hair align-top last:border-0 max-sm:block max-sm:py-3', className)}>
    {children}
  </tr>
);

/** `label` is the column's name, shown before the value on a narrow screen; leave it out for the leading cell. */
export function Cell({
  label,
  align,
  className,
  children,
  ...rest
}: TdHTMLAttributes<HTMLTableCellElement> & { label?: string; align?: 'right' }) {
  return (
    <td
      {...rest}

      data-label={label}
      className={classes(
        'px-3 py-3 first:pl-0 last:pr-0',
        'max-sm:block max-sm:px-0 max-sm:py-0.5',
        label && 'max-sm:before:mr-2 max-sm:before:text-ink-2 max-sm:before:content-[attr(data-label)]',
        align === 'right' && 'sm:text-right',
        className,
      )}
    >
      {children}
    </td>
  );
}
