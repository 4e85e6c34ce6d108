import { inverse, Matrix } from 'ml-matrix';
import type { Rows, Vector } from './types';

/** Points of an interval from 0 to 1, and the integrals of the polynomial through values at them. */
export interface SpectralGrid {
  /** Points in rising order; the first is 0, the last 1. */
  readonly points: Vector;
  /** ∫ from 0 to points[i] of the interpolating polynomial is Σ_j integral[i][j] · value[j]. */
  readonly integral: Rows;
}

/** Value of the Chebyshev polynomial of degree k at cos(angle). */
const chebyshev = (k: number, angle: number) => Math.cos(k * angle);

/** An antiderivative of the Chebyshev polynomial of degree k at cos(angle). */
function antiderivative(k: number, angle: number): number {
  if (k === 0) return Math.cos(angle);
  if (k === 1) return Math.cos(angle) ** 2 / 2;
  return (chebyshev(k + 1, angle) / (k + 1) - chebyshev(k - 1, angle) / (k - 1)) / 2;
}

/**
 * The Chebyshev-Lobatto points on [0, 1] and their integration matrix: exact for polynomials of a degree below the number of
 * points, and converging faster than any power for smooth functions (L. N. Trefethen, Spectral Methods in MATLAB, SIAM 2000, ch. 6
 * and 12; from memory). At least two points.
 */
export function spectralGrid(count: number): SpectralGrid {
  const degrees = Array.from({ length: count }, (_, k) => k);
  const angles = degrees.map((j) => Math.PI * (1 - j / (count - 1)));
  const values = new Matrix(angles.map((angle) => degrees.map((k) => chebyshev(k, angle))));
  const integrals = new Matrix(angles.map((angle) => degrees.map((k) => (antiderivative(k, angle) - antiderivative(k, Math.PI)) / 2)));
  return { points: angles.map((angle) => (1 + Math.cos(angle)) / 2), integral: integrals.mmul(inverse(values)).to2DArray() };
}
