import { formatWithUnit } from '@/lib/units';

const DIGITS = 3;
const MOST_DIGITS = 9;

/** "3.1 A": at most three significant digits, without trailing zeros. */
export const brief = (value: number, unit: string, digits = DIGITS): string => formatWithUnit(Number(value.toPrecision(digits)), unit);

/** Two values of one unit in as few digits, from three on, as tell them apart: never "needs 3 A, the limit is 3 A". */
export function apart(a: number, b: number, unit: string): readonly [string, string] {
  for (let digits = DIGITS; digits < MOST_DIGITS; digits += 1) {
    const texts = [brief(a, unit, digits), brief(b, unit, digits)] as const;
    if (texts[0] !== texts[1]) return texts;
  }
  return [formatWithUnit(a, unit, { digits: MOST_DIGITS }), formatWithUnit(b, unit, { digits: MOST_DIGITS })];
}
