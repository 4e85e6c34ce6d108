export type SortDirection = 'ascending' | 'descending';
export interface Sort<Key extends string = string> {
  readonly key: Key;
  readonly direction: SortDirection;
}

/** The order after a press on a column's heading: the same column turns round, another starts in its own first direction. */
export const nextSort = <Key extends string>(now: Sort<Key> | null, key: Key, first: SortDirection = 'ascending'): Sort<Key> => ({
  key,
  direction: now?.key === key ? (now.direction === 'ascending' ? 'descending' : 'ascending') : first,
});

/** The glyph beside a heading; an unsorted column shows another shape, not another shade. */
export const sortGlyph = (now: Sort | null, key: string): string => (now?.key !== key ? '↕' : now.direction === 'ascending' ? '▲' : '▼');

/** Compares values for a sort; what is missing goes last in both directions. */
export function compareValues(
  a: number | string | null | undefined,
  b: number | string | null | undefined,
  direction: SortDirection,
): number {
  if (a == null || b == null) return a == null ? (b == null ? 0 : 1) : -1;
  const order = typeof a === 'number' && typeof b === 'number' ? a - b : String(a).localeCompare(String(b), 'en', { numeric: true });
  return direction === 'ascending' ? order : -order;
}
