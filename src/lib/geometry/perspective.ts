import { determinant, Matrix, SingularValueDecomposition, solve } from 'ml-matrix';
import type { Known } from './knowns';
import { denominatorAt, projectionOf, type Projection } from './projection';
import type { Solved } from './straight';
import type { Px } from './types';

type Nine = readonly number[];

/** Shift and scale that bring numbers to mean 0 and a mean size of 1. */
interface Normaliser {
  readonly shift: number;
  readonly scale: number;
}

/** Below this share of the largest singular value the eighth one counts as zero: the marks leave a direction open. */
const LEAST_SINGULAR_SHARE = 1e-7;
/** Smallest determinant of the normalised map, and smallest denominator at a mark (1 at the mean of the marks). */
const LEAST_DETERMINANT = 1e-6;
const LEAST_DENOMINATOR = 0.02;
const MOST_STEPS = 20;

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

function normaliserOf(values: readonly number[]): Normaliser {
  const shift = mean(values);
  return { shift, scale: mean(values.map((value) => Math.abs(value - shift))) };
}

/** Two rows of the map times pixel, one known value: (g − place·g3)·p = 0 (direct linear transformation). */
function equation({ axis, d, place }: Known): number[] {
  const p = [d[0], d[1], 1];
  const zero = [0, 0, 0];
  return [...(axis === 'x' ? [...p, ...zero] : [...zero, ...p]), ...p.map((value) => -place * value)];
}

/** The nine numbers that best satisfy every equation: the singular vector of the smallest singular value; null when it is not the only one. */
function nullVector(knowns: readonly Known[]): Nine | null {
  const rows = knowns.map(equation);
  while (rows.length < 9) rows.push(new Array<number>(9).fill(0));
  const decomposition = new SingularValueDecomposition(new Matrix(rows), { computeLeftSingularVectors: false });
  const [largest = 0, eighth = 0] = [decomposition.diagonal[0], decomposition.diagonal[7]];
  return eighth > LEAST_SINGULAR_SHARE * largest ? decomposition.rightSingularVectors.getColumn(8) : null;
}

/** Signed pixel distance of a mark from its value line, and its exact gradient over the eight parameters. */
function distanceAndGradient(projection: Projection, { axis, d, place }: Known): { distance: number; gradient: number[] } {
  const own = projection[axis === 'x' ? 0 : 1];
  const third = projection[2];
  const line = own.map((value, at) => value - place * (third[at] ?? 0)) as [number, number, number];
  const size = Math.hypot(line[0], line[1]);
  const distance = (line[0] * d[0] + line[1] * d[1] + line[2]) / size;
  const overLine = [d[0] - (distance * line[0]) / size, d[1] - (distance * line[1]) / size, 1].map((value) => value / size);
  const zero = [0, 0, 0];
  const overThird = overLine.slice(0, 2).map((value) => -place * value);
  return { distance, gradient: [...(axis === 'x' ? [...overLine, ...zero] : [...zero, ...overLine]), ...overThird] };
}

const sumOfSquares = (parameters: readonly number[], knowns: readonly Known[]) => {
  const projection = projectionOf('perspective', parameters);
  return knowns.reduce((sum, known) => sum + distanceAndGradient(projection, known).distance ** 2, 0);
};

/** Gauss-Newton on the pixel distances, a step halved until it helps; from the linear solution two or three steps do. */
function refine(start: readonly number[], knowns: readonly Known[]): readonly number[] {
  let parameters = start;
  let best = sumOfSquares(parameters, knowns);
  for (let step = 0; step < MOST_STEPS; step++) {
    const projection = projectionOf('perspective', parameters);
    const rows = knowns.map((known) => distanceAndGradient(projection, known));
    const move = solve(new Matrix(rows.map(({ gradient }) => gradient)), Matrix.columnVector(rows.map(({ distance }) => -distance)), true);
    const tried = [1, 0.5, 0.25, 0.125].map((share) => {
      const next = parameters.map((value, at) => value + share * move.get(at, 0));
      return { next, sum: sumOfSquares(next, knowns) };
    });
    const better = tried.find(({ sum }) => sum < best);
    if (!better) break;
    const settled = best - better.sum <= 1e-14 * best;
    [parameters, best] = [better.next, better.sum];
    if (settled) break;
  }
  return parameters;
}

/** The parameters in pixels and places from those in normalised pixels and normalised places. */
function restore(g: readonly number[], pixel: Normaliser, x: Normaliser, y: Normaliser): readonly number[] {
  const q = (at: number) => g[at] ?? 0;
  const third = [q(6) / pixel.scale, q(7) / pixel.scale, 1];
  const row = (first: number, { shift, scale }: Normaliser) =>
    [q(first) / pixel.scale, q(first + 1) / pixel.scale, q(first + 2)].map((value, at) => scale * value + shift * (third[at] ?? 0));
  return [...row(0, x), ...row(3, y), ...third.slice(0, 2)];
}

/** In normalised numbers: the marks must all be well on this side of the horizon, and the map must not fold the page into a line. */
function isSound(parameters: readonly number[], knowns: readonly Known[]): boolean {
  const projection = projectionOf('perspective', parameters);
  const unfolded = Math.abs(determinant(new Matrix(projection.map((row) => [...row])))) > LEAST_DETERMINANT;
  return unfolded && knowns.every(({ d }) => denominatorAt(projection, d) > LEAST_DENOMINATOR);
}

/**
 * Perspective frame: direct linear transformation on normalised pixels and places, then Gauss-Newton on the distances in pixels between the
 * marks and their value lines. R. Hartley, A. Zisserman, Multiple View Geometry, 2nd edition 2004, algorithms 4.1 to 4.3 (from memory).
 * The origin of the frame is the mean of the marks, so the pixels need a scale only; it is one for both coordinates, so that distances stay distances.
 */
export function solvePerspective(knowns: readonly Known[]): Solved {
  if (knowns.length < 8) return { ok: false, why: 'tooFew' };
  const pixel: Normaliser = { shift: 0, scale: mean(knowns.map(({ d }) => Math.hypot(d[0], d[1]))) / Math.SQRT2 };
  const of = (axis: 'x' | 'y') => normaliserOf(knowns.filter((known) => known.axis === axis).map(({ place }) => place));
  const [x, y] = [of('x'), of('y')];
  const normalised = knowns.map((known): Known => {
    const { shift, scale } = known.axis === 'x' ? x : y;
    const d: Px = [known.d[0] / pixel.scale, known.d[1] / pixel.scale];
    return { ...known, d, place: (known.place - shift) / scale };
  });
  const nine = nullVector(normalised);
  const ninth = nine?.[8] ?? 0;
  if (!nine || Math.abs(ninth) < 1e-9) return { ok: false, why: 'inLine' };
  const start = nine.slice(0, 8).map((value) => value / ninth);
  const refined = isSound(start, normalised) ? refine(start, normalised) : null;
  if (!refined || !isSound(refined, normalised)) return { ok: false, why: 'inLine' };
  return { ok: true, parameters: restore(refined, pixel, x, y) };
}

/** Gradient of both places over the parameters of a perspective frame, at a pixel: [∂s/∂q, ∂t/∂q]. */
export function perspectiveGradient(parameters: readonly number[], d: Px, [s, t]: Px): readonly [number[], number[]] {
  const w = denominatorAt(projectionOf('perspective', parameters), d);
  const p = [d[0] / w, d[1] / w, 1 / w];
  const zero = [0, 0, 0];
  const third = (place: number) => [(-place * d[0]) / w, (-place * d[1]) / w];
  return [
    [...p, ...zero, ...third(s)],
    [...zero, ...p, ...third(t)],
  ];
}
