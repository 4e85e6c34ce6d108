import { unitsPerPixel, valueAt, type BenchChart } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { formatNumber, formatWithUnit, quantitySymbol, unitSymbol } from '@/lib/units';

/** Decimals that tell one source pixel from the next, of x and of y; null without a frame. */
export const decimalsAt = (chart: BenchChart, px: Px): readonly [number, number] | null => {
  const step = unitsPerPixel(chart, px);
  if (!step) return null;
  const decimals = (size: number) => Math.min(6, Math.max(0, Math.ceil(-Math.log10(size / 2 || 1e-6))));
  return [decimals(step[0]), decimals(step[1])];
};

/** What stands at the head of a column or before a value: "ΔT / K", "Qc/Qmax / %", "x" while nothing is said. */
export const axisHead = (chart: BenchChart, axis: 'x' | 'y'): string => {
  const { quantity, unit, of } = chart[axis];
  if (!quantity) return axis;
  const symbol = unit ? unitSymbol(unit) : '';
  const shown = of ? `${quantitySymbol(quantity)}/${RATING_SYMBOLS[of]}` : quantitySymbol(quantity);
  return symbol ? `${shown} / ${symbol}` : shown;
};

/** Symbols of the ratings an axis may be normalised by. */
export const RATING_SYMBOLS = { imaxA: 'Imax', vmaxV: 'Vmax', qmaxW: 'Qmax', dTmaxK: 'ΔTmax' } as const;

/** The values at a place with as many decimals as the picture gives; null without a frame. */
export const valueTexts = (chart: BenchChart, px: Px): readonly [string, string] | null => {
  const value = valueAt(chart, px);
  const decimals = decimalsAt(chart, px);
  return value && decimals && [formatNumber(value[0], { decimals: decimals[0] }), formatNumber(value[1], { decimals: decimals[1] })];
};

/** A pixel as shown and spoken: "62.0, 661.7". */
export const pixelText = (px: Px): string => px.map((c) => formatNumber(c, { decimals: 1 })).join(', ');

/** A place in words: its values where there is a frame, else its pixel. */
export const placeWords = (chart: BenchChart, px: Px): string => {
  const value = valueAt(chart, px);
  const decimals = decimalsAt(chart, px);
  if (!value || !decimals) return `pixel ${pixelText(px)}`;
  const word = (axis: 'x' | 'y', at: 0 | 1) => {
    const { quantity, unit } = chart[axis];
    return `${quantity ? quantitySymbol(quantity) : axis} ${formatWithUnit(value[at], unit ?? '1', { decimals: decimals[at] })}`;
  };
  return `${word('x', 0)}, ${word('y', 1)}`;
};

/** A residual: two digits, and nothing finer than a thousandth. */
export const smallNumber = (value: number): string => (Math.abs(value) < 0.0005 ? 'under 0.001' : formatNumber(value, { digits: 2 }));
