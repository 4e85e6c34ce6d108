/** Small steps that give back the very object they were given when nothing would change. */

const isPlain = (value: unknown): value is Readonly<Record<string, unknown>> => typeof value === 'object' && value !== null;

const keysOf = (value: Readonly<Record<string, unknown>>): string[] => Object.keys(value).filter((key) => value[key] !== undefined);

/**
 * Whether two plain values say the same; a key that is undefined counts as absent. Parts that two documents share are
 * compared by identity, so that comparing a document with its neighbour in the history is cheap.
 */
export const same = (a: unknown, b: unknown): boolean => {
  if (Object.is(a, b)) return true;
  if (!isPlain(a) || !isPlain(b) || Array.isArray(a) !== Array.isArray(b)) return false;
  const keys = keysOf(a);
  return keys.length === keysOf(b).length && keys.every((key) => same(a[key], b[key]));
};

/** `object` with `to` laid over it; the same object when every value in `to` is already there. */
export const changed = <T extends object>(object: T, to: Partial<NoInfer<T>>): T =>
  (Object.keys(to) as (keyof T)[]).every((key) => same(object[key], to[key])) ? object : { ...object, ...to };

/** The list with the element of this id passed through `change`; the same list when that gives the same element or there is none. */
export const changedById = <T extends { readonly id: string }>(list: readonly T[], id: string, change: (element: T) => T): readonly T[] => {
  const at = list.findIndex((element) => element.id === id);
  const before = list[at];
  if (!before) return list;
  const after = change(before);
  return after === before ? list : list.map((element, index) => (index === at ? after : element));
};

/** The list without the element of this id; the same list when there is none. */
export const withoutId = <T extends { readonly id: string }>(list: readonly T[], id: string): readonly T[] =>
  list.some((element) => element.id === id) ? list.filter((element) => element.id !== id) : list;
