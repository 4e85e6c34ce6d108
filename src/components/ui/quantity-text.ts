import { MINUS } from '@/lib/units';

/** A number as it stands in a field: no trailing zeros, no grouping, true minus, an exponent only where the plain form is long. */
export function editableNumber(value: number | null, digits = 12): string {
  if (value === null || !Number.isFinite(value)) return '';
  const rounded = Number(value.toPrecision(digits));
  return String(Object.is(rounded, -0) ? 0 : rounded).replace(/-/g, MINUS);
}

/** `value` moved by so many steps, without the dust of binary fractions. */
export const stepped = (value: number, step: number, count: number): number => Number((value + step * count).toPrecision(12));
