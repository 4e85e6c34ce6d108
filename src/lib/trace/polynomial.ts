/** A line or parabola through weighted points near `centre`: value, slope and curvature there, and what one unit of weight knows of the value. */
export interface LocalFit {
  readonly value: number;
  readonly slope: number;
  /** Second derivative. */
  readonly bend: number;
  /** Variance of the value for observations of unit variance at unit weight. */
  readonly variance: number;
}

/**
 * Weighted least squares of v = c0 + c1·(t − centre) + c2·(t − centre)²/2 by the normal equations of moments (at most 3 × 3, Cramer's rule);
 * one degree less where the points do not hold it. Null without points.
 */
export function localFit(
  t: readonly number[],
  v: readonly number[],
  w: readonly number[] | null,
  centre: number,
  degree: 0 | 1 | 2,
): LocalFit | null {
  let [s0, s1, s2, s3, s4, y0, y1, y2] = [0, 0, 0, 0, 0, 0, 0, 0];
  for (let k = 0; k < t.length; k++) {
    const [x, y, weight] = [t[k]! - centre, v[k]!, w ? w[k]! : 1];
    const wx = weight * x;
    s0 += weight;
    s1 += wx;
    s2 += wx * x;
    s3 += wx * x * x;
    s4 += wx * x * x * x;
    y0 += weight * y;
    y1 += wx * y;
    y2 += wx * x * y;
  }
  if (!(s0 > 0)) return null;
  if (degree === 2) {
    const det = s0 * (s2 * s4 - s3 * s3) - s1 * (s1 * s4 - s2 * s3) + s2 * (s1 * s3 - s2 * s2);
    if (det > 1e-6 * s0 * s2 * s4 && s2 > 0) {
      const c00 = s2 * s4 - s3 * s3;
      const c01 = s2 * s3 - s1 * s4;
      const c02 = s1 * s3 - s2 * s2;
      const value = (c00 * y0 + c01 * y1 + c02 * y2) / det;
      const slope = (c01 * y0 + (s0 * s4 - s2 * s2) * y1 + (s1 * s2 - s0 * s3) * y2) / det;
      const half = (c02 * y0 + (s1 * s2 - s0 * s3) * y1 + (s0 * s2 - s1 * s1) * y2) / det;
      return { value, slope, bend: 2 * half, variance: c00 / det };
    }
  }
  const det = s0 * s2 - s1 * s1;
  if (degree >= 1 && det > 1e-6 * s0 * s2) {
    return { value: (s2 * y0 - s1 * y1) / det, slope: (s0 * y1 - s1 * y0) / det, bend: 0, variance: s2 / det };
  }
  return { value: y0 / s0, slope: 0, bend: 0, variance: 1 / s0 };
}
