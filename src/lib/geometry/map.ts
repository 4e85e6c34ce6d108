import { parameterGradients } from './covariance';
import { denominatorAt, pixelAt, placeGradients, placesAt, projectionOfFrame } from './projection';
import { laidOut, valueAt, valueSlope } from './scale';
import type { Frame, Px } from './types';

const fromOrigin = ({ origin }: Frame, px: Px): Px => [px[0] - origin[0], px[1] - origin[1]];

/** The values (x, y) at a pixel, in the chart's own units. Beyond the horizon of a perspective frame the numbers mean nothing: see {@link isVisible}. */
export function toValue(frame: Frame, px: Px): readonly [number, number] {
  const [s, t] = placesAt(projectionOfFrame(frame), fromOrigin(frame, px));
  return [valueAt(s, frame.scales.x), valueAt(t, frame.scales.y)];
}

/** The pixel that shows the values (x, y); the inverse of {@link toValue}. Not a number where a log axis has no such value. */
export function toPixel(frame: Frame, [x, y]: readonly [number, number]): Px {
  const [dx, dy] = pixelAt(projectionOfFrame(frame), [laidOut(x, frame.scales.x), laidOut(y, frame.scales.y)]);
  return [frame.origin[0] + dx, frame.origin[1] + dy];
}

/** Whether a pixel shows the page at all: always, but beyond the horizon of a perspective frame. */
export const isVisible = (frame: Frame, px: Px): boolean => denominatorAt(projectionOfFrame(frame), fromOrigin(frame, px)) > 0;

/** Derivatives of the values over the pixel, [[∂x/∂px, ∂x/∂py], [∂y/∂px, ∂y/∂py]], in units of the axes per pixel. */
export function valueJacobian(frame: Frame, px: Px): readonly [Px, Px] {
  const [s, t] = placeGradients(projectionOfFrame(frame), fromOrigin(frame, px));
  const [x, y] = toValue(frame, px);
  const [slopeX, slopeY] = [valueSlope(x, frame.scales.x), valueSlope(y, frame.scales.y)];
  return [
    [slopeX * s[0], slopeX * s[1]],
    [slopeY * t[0], slopeY * t[1]],
  ];
}

/** Covariance of the two values read at a pixel: variances and covariance in the units of the axes. */
export interface ValueCovariance {
  readonly xx: number;
  readonly xy: number;
  readonly yy: number;
}

const product = (a: readonly number[], matrix: readonly (readonly number[])[], b: readonly number[]) =>
  a.reduce((sum, left, i) => sum + left * b.reduce((row, right, j) => row + (matrix[i]?.[j] ?? 0) * right, 0), 0);

/**
 * Covariance of the values read at a pixel that is itself good to `pointU` pixels in each direction, marks included:
 * the law of propagation of uncertainty, J·Jᵀ·pointU² + G·C·Gᵀ with C the covariance of the frame (JCGM 100:2008, eq. 13).
 */
export function valueCovariance(frame: Frame, px: Px, pointU: number): ValueCovariance {
  const [jx, jy] = valueJacobian(frame, px);
  const [x, y] = toValue(frame, px);
  const [s, t] = parameterGradients(frame.kind, frame.parameters, fromOrigin(frame, px));
  const gx = s.map((value) => value * valueSlope(x, frame.scales.x));
  const gy = t.map((value) => value * valueSlope(y, frame.scales.y));
  const of = (ja: Px, jb: Px, ga: readonly number[], gb: readonly number[]) =>
    pointU * pointU * (ja[0] * jb[0] + ja[1] * jb[1]) + product(ga, frame.covariance, gb);
  return { xx: of(jx, jx, gx, gx), xy: of(jx, jy, gx, gy), yy: of(jy, jy, gy, gy) };
}

/** Standard uncertainties of the two values read at a pixel that is good to `pointU` pixels; those of the marks included. In the units of the axes. */
export function valueUncertainty(frame: Frame, px: Px, pointU: number): { readonly x: number; readonly y: number } {
  const { xx, yy } = valueCovariance(frame, px, pointU);
  return { x: Math.sqrt(xx), y: Math.sqrt(yy) };
}
