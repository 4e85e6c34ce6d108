import { Matrix, inverse } from 'ml-matrix';
import type { Known } from './knowns';
import { perspectiveGradient } from './perspective';
import { placeGradients, placesAt, projectionOf } from './projection';
import { straightGradient } from './straight';
import type { FrameKind, Px } from './types';

/** Gradient of both places over the parameters of any kind of frame, at a pixel relative to the origin: [∂s/∂q, ∂t/∂q]. */
export function parameterGradients(kind: FrameKind, parameters: readonly number[], d: Px): readonly [number[], number[]] {
  const places = placesAt(projectionOf(kind, parameters), d);
  return kind === 'perspective' ? perspectiveGradient(parameters, d, places) : straightGradient(parameters, d, places);
}

/**
 * Covariance of the parameters when each known value is off by `u` pixels, independently: u²·(JᵀJ)⁻¹ with J the pixel distances from the value lines
 * over the parameters (JCGM 100:2008, 5.1.2 turned round for least squares). The columns are scaled to length one before the inverse.
 */
export function parameterCovariance(kind: FrameKind, parameters: readonly number[], knowns: readonly Known[], u: number): number[][] {
  const projection = projectionOf(kind, parameters);
  const jacobian = new Matrix(
    knowns.map(({ axis, d }) => {
      const at = axis === 'x' ? 0 : 1;
      const perPixel = Math.hypot(...placeGradients(projection, d)[at]);
      return parameterGradients(kind, parameters, d)[at].map((value) => value / perPixel);
    }),
  );
  const lengths = parameters.map((_, column) => jacobian.getColumnVector(column).norm('frobenius'));
  lengths.forEach((length, column) => jacobian.mulColumn(column, 1 / length));
  const scaled = inverse(jacobian.transpose().mmul(jacobian), true).to2DArray();
  // rounding leaves the inverse unsymmetric in its last bit
  const even = (i: number, j: number) => ((scaled[i]?.[j] ?? 0) + (scaled[j]?.[i] ?? 0)) / 2;
  return lengths.map((one, i) => lengths.map((other, j) => (u * u * even(i, j)) / (one * other)));
}
