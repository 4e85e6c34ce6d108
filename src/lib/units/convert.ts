import { unitsOf, type Quantity, type Unit } from './quantity';

/** One unit is multiply/divide base units; kept as two whole numbers so that 700 mA is exactly 0.7 A. */
type Ratio = readonly [multiply: number, divide: number];

const WHOLE: Ratio = [1, 1];
const MILLI: Ratio = [1, 1000];
const RATIO: Readonly<Record<Unit, Ratio>> = {
  K: WHOLE,
  C: WHOLE,
  F: [5, 9],
  W: WHOLE,
  mW: MILLI,
  V: WHOLE,
  mV: MILLI,
  A: WHOLE,
  mA: MILLI,
  '1': WHOLE,
  '%': [1, 100],
};

/** Shift before scaling, absolute temperatures only: T/K = t/°C + 273.15 and T/K = (t/°F + 459.67) · 5/9, exact (NIST SP 811, B.8; value from memory). */
const SHIFT: Readonly<Partial<Record<Unit, number>>> = { C: 273.15, F: 459.67 };

const shiftOf = (quantity: Quantity, unit: Unit) => (quantity === 'Tc' || quantity === 'Th' ? (SHIFT[unit] ?? 0) : 0);

function ratioOf(quantity: Quantity, unit: Unit): Ratio {
  if (unitsOf(quantity).includes(unit)) return RATIO[unit];
  throw new RangeError(`${quantity} cannot be in ${unit}; its units are ${unitsOf(quantity).join(', ')}`);
}

/**
 * Value in base units: A, V, W, 1, K absolute for Tc and Th, K difference for deltaT.
 * A difference in F or C is scaled, never shifted. Throws a RangeError for a unit the quantity does not have.
 */
export function toBase(value: number, quantity: Quantity, unit: Unit): number {
  const [multiply, divide] = ratioOf(quantity, unit);
  return ((value + shiftOf(quantity, unit)) * multiply) / divide;
}

/** Value in the given unit from base units; the inverse of {@link toBase}. Throws a RangeError for a unit the quantity does not have. */
export function fromBase(value: number, quantity: Quantity, unit: Unit): number {
  const [multiply, divide] = ratioOf(quantity, unit);
  return (value * divide) / multiply - shiftOf(quantity, unit);
}

/** How many base units one unit of the quantity spans: the factor for differences, ranges and uncertainties, never shifted. */
export function baseUnitsPer(quantity: Quantity, unit: Unit): number {
  const [multiply, divide] = ratioOf(quantity, unit);
  return multiply / divide;
}

/** A share of a rating, printed as `1` or `%`, as a plain fraction. */
export const toFraction = (value: number, unit: '1' | '%'): number => (unit === '%' ? value / 100 : value);

/** A plain fraction as a share in `1` or `%`; the inverse of {@link toFraction}. */
export const fromFraction = (fraction: number, unit: '1' | '%'): number => (unit === '%' ? fraction * 100 : fraction);
