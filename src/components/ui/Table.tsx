import type { ReactNode } from 'react';
import { classes } from './classes';
import { nextSort, sortGlyph, type Sort, type SortDirection } from './sort';

export interface TableProps {
  /** Says what the table holds, and that headings sort where they do. */
  caption: string;
  hideCaption?: boolean;
  head: ReactNode;
  children: ReactNode;
  sticky?: boolean;
  className?: string;
}

/** A native table that scrolls sideways in its own box, never the page. */
export const Table = ({ caption, hideCaption = false, head, children, sticky = false, className }: TableProps) => (
  <div className="table-scroll">
    <table className={classes('table', sticky && 'table-sticky', className)}>
      <caption className={hideCaption ? 'sr-only' : undefined}>{caption}</caption>
      <thead>
        <tr>{head}</tr>
      </thead>
      <tbody>{children}</tbody>
    </table>
  </div>
);

export interface SortHeaderProps<Key extends string> {
  column: Key;
  sort: Sort<Key> | null;
  onSort: (next: Sort<Key>) => void;
  children: ReactNode;
  numeric?: boolean;
  first?: SortDirection;
}

/** A heading that sorts: a button inside the cell, aria-sort on the sorted column only. */
export function SortHeader<Key extends string>({ column, sort, onSort, children, numeric = false, first }: SortHeaderProps<Key>) {
  return (
    <th scope="col" className={numeric ? 'num' : undefined} aria-sort={sort?.key === column ? sort.direction : undefined}>
      <button type="button" className="sort" onClick={() => onSort(nextSort(sort, column, first))}>
        {children} <span aria-hidden="true">{sortGlyph(sort, column)}</span>
      </button>
    </th>
  );
}
