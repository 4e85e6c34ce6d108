import type { Known } from './knowns';
import type { Px } from './types';

/** A kind that was solved: its parameters, or why the marks do not determine it. */
export type Solved =
  { readonly ok: true; readonly parameters: readonly number[] } | { readonly ok: false; readonly why: 'tooFew' | 'inLine' };

/** Along each axis the values of the marks must lie at least this far apart on the picture. */
const LEAST_SPAN_PX = 1;

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

/** Least squares line offset + step·place through the coordinates of some marks. */
function lineThrough(places: readonly number[], coordinates: readonly number[]): { offset: number; step: number } {
  const [meanPlace, meanCoordinate] = [mean(places), mean(coordinates)];
  const spread = places.reduce((sum, place) => sum + (place - meanPlace) ** 2, 0);
  const together = places.reduce((sum, place, at) => sum + (place - meanPlace) * ((coordinates[at] ?? 0) - meanCoordinate), 0);
  const step = together / spread;
  return { offset: meanCoordinate - step * meanPlace, step };
}

const placesOf = (knowns: readonly Known[]) => knowns.map(({ place }) => place);
const spanOf = (places: readonly number[]) => Math.max(...places) - Math.min(...places);

function solveAtAngle(x: readonly Known[], y: readonly Known[], angle: number): Solved {
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  const along = lineThrough(
    placesOf(x),
    x.map(({ d }) => cos * d[0] + sin * d[1]),
  );
  const across = lineThrough(
    placesOf(y),
    y.map(({ d }) => cos * d[1] - sin * d[0]),
  );
  const reaches = (step: number, knowns: readonly Known[]) => Math.abs(step) * spanOf(placesOf(knowns)) >= LEAST_SPAN_PX;
  if (!reaches(along.step, x) || !reaches(across.step, y)) return { ok: false, why: 'inLine' };
  return { ok: true, parameters: [along.offset, along.step, across.offset, across.step] };
}

const ofAxis = (knowns: readonly Known[], axis: 'x' | 'y') => knowns.filter((known) => known.axis === axis);

/** Upright frame: two straight lines, pixel x against x and pixel y against y, each by linear least squares. */
export const solveUpright = (knowns: readonly Known[]): Solved => solveAtAngle(ofAxis(knowns, 'x'), ofAxis(knowns, 'y'), 0);

/** Sums of squares [Σrx², Σrx·ry, Σry²] that are left of the pixels once their line over the places is taken out. */
function scatterAbout(knowns: readonly Known[]): readonly [number, number, number] {
  const places = placesOf(knowns);
  const left = ([0, 1] as const).map((coordinate) => {
    const coordinates = knowns.map(({ d }) => d[coordinate]);
    const { offset, step } = lineThrough(places, coordinates);
    return coordinates.map((value, at) => value - offset - step * (places[at] ?? 0));
  }) as [number[], number[]];
  const sum = (a: readonly number[], b: readonly number[]) => a.reduce((total, value, at) => total + value * (b[at] ?? 0), 0);
  return [sum(left[0], left[0]), sum(left[0], left[1]), sum(left[1], left[1])];
}

/**
 * Turned frame by exact least squares. For a unit vector n = (cos θ, sin θ) the best offsets and steps leave nᵀ(Mx + JᵀMyJ)n,
 * with M the scatter of the pixels about their lines over the places and J a quarter turn, so the best n is the eigenvector
 * of the smaller eigenvalue; for a symmetric 2 × 2 matrix that is a closed form. θ is in (−90°, 90°]; half a turn is a sign of both steps.
 */
export function solveTurned(knowns: readonly Known[]): Solved {
  if (knowns.length < 5) return { ok: false, why: 'tooFew' };
  const [x, y] = [ofAxis(knowns, 'x'), ofAxis(knowns, 'y')];
  const [mx, my] = [scatterAbout(x), scatterAbout(y)];
  const halfDifference = (mx[0] + my[2] - mx[2] - my[0]) / 2;
  const mixed = mx[1] - my[1];
  if (Math.hypot(halfDifference, mixed) < LEAST_SPAN_PX ** 2) return { ok: false, why: 'inLine' };
  const angle = Math.atan2(-mixed, -halfDifference) / 2;
  const solved = solveAtAngle(x, y, angle);
  return solved.ok ? { ok: true, parameters: [...solved.parameters, angle] } : solved;
}

/** Gradient of both places over the parameters of an upright or turned frame, at a pixel: [∂s/∂q, ∂t/∂q]. */
export function straightGradient(parameters: readonly number[], d: Px, [s, t]: Px): readonly [number[], number[]] {
  const [, b = 1, , step = 1, angle] = parameters;
  const x = [-1 / b, -s / b, 0, 0];
  const y = [0, 0, -1 / step, -t / step];
  if (angle === undefined) return [x, y];
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  return [
    [...x, (cos * d[1] - sin * d[0]) / b],
    [...y, -(cos * d[0] + sin * d[1]) / step],
  ];
}
