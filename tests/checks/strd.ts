import { readFileSync } from 'node:fs';

/** Observations of one NIST StRD data set: y first, then the predictors. */
export function strd(name: string): { readonly y: readonly number[]; readonly x: readonly (readonly number[])[] } {
  const text = readFileSync(new URL(`../fixtures/strd/${name}.csv`, import.meta.url), 'utf8');
  const rows = text
    .trim()
    .split('\n')
    .slice(1)
    .map((line) => line.split(',').map(Number));
  return { y: rows.map(([y]) => y!), x: rows.map(([, ...x]) => x) };
}

/** Log relative error, about the number of right digits (B. D. McCullough, The American Statistician 52 (1998) 358; value from memory). */
export const rightDigits = (got: number, certified: number): number =>
  got === certified ? Infinity : -Math.log10(Math.abs(got - certified) / Math.abs(certified));
