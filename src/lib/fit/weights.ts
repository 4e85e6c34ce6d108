import type { Observation } from './types';

/** A curve never weighs more than so many points, however densely it was read: its points share one line and one set of marks. */
export const POINTS_A_CURVE = 15;

/**
 * Share of the axis range that every point is granted on top of its reading uncertainty, for what three constants cannot follow
 * in real material; it also weighs charts of different quantities over their own ranges (common practice, no source).
 */
export const MISFIT_FLOOR = 0.005;

/** The curve a point stands on; points of one curve are not independent of each other. */
export const curveOf = ({ chart, curve }: Pick<Observation, 'chart' | 'curve'>): string => `${chart}/${curve}`;

/** Standard uncertainty the fit gives a point, base units: √(u² + (floor · range)²). */
export const sigmaOf = ({ u, range }: Observation, floor: number): number => Math.hypot(u, floor * range);

/** Weights 1/σ², those of a curve scaled down together where it has more than {@link POINTS_A_CURVE} points. */
export function weightsOf(observations: readonly Observation[], floor: number): readonly number[] {
  const counts = new Map<string, number>();
  for (const point of observations) counts.set(curveOf(point), (counts.get(curveOf(point)) ?? 0) + 1);
  return observations.map((point) => Math.min(1, POINTS_A_CURVE / counts.get(curveOf(point))!) / sigmaOf(point, floor) ** 2);
}
