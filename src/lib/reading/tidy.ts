/** Twelve digits are more than any reading holds, and few enough that the last bit of a sum does not show. */
const DIGITS = 12;

/** A computed number with its noise digits dropped, so that results compare and read well. */
export const tidy = (value: number): number => Number(value.toPrecision(DIGITS));

/** The same for every number inside plain data. */
export function tidyAll<T>(data: T): T {
  if (typeof data === 'number') return tidy(data) as T;
  if (Array.isArray(data)) return data.map((item: unknown) => tidyAll(item)) as T;
  if (data === null || typeof data !== 'object') return data;
  return Object.fromEntries(Object.entries(data).map(([key, value]) => [key, tidyAll(value)])) as T;
}
