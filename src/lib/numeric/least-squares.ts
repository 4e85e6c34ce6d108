import { Matrix, QrDecomposition, SingularValueDecomposition } from 'ml-matrix';
import { conditionDesign } from './conditioning';
import { symmetric } from './covariance';
import { clusterSandwich } from './sandwich';
import type { LeastSquaresProblem, LinearFit, SolvedFit, UnsolvedFit, Vector } from './types';

/** Share of the weakest direction above which a parameter is named as one that cannot be told. */
const NAMED_SHARE = 0.1;

/**
 * Weighted linear least squares: the parameters b that make Σ w (y − rows · b)² smallest, by Householder QR of the centred and
 * scaled design, rank and condition from the singular values of its triangle. Without a unique solution there are no
 * parameters but a sentence. Weights are one over squared standard uncertainties. Throws a RangeError when rows, y, weights
 * and clusters do not match or hold anything but finite numbers.
 */
export function solveLeastSquares(problem: LeastSquaresProblem): LinearFit {
  checkProblem(problem);
  const { rows, y } = problem;
  const unknowns = rows[0]?.length ?? 0;
  const weights = problem.weights ?? y.map(() => 1);
  const used = weights.filter((weight) => weight > 0).length;
  if (used < unknowns || unknowns === 0) return tooFew(used, unknowns);
  const { design, back } = conditionDesign(rows, weights);
  const qr = new QrDecomposition(design);
  const triangle = new SingularValueDecomposition(qr.upperTriangularMatrix);
  const singular = [...triangle.diagonal];
  const rank = singular.filter((value) => value > rows.length * Number.EPSILON * singular[0]!).length;
  const condition = rank < unknowns ? Infinity : singular[0]! / singular[unknowns - 1]!;
  if (rank < unknowns) return rankDeficient(problem, triangle, back, rank);
  const target = Matrix.columnVector(y.map((value, i) => value * Math.sqrt(weights[i]!)));
  const scaled = qr.solve(target);
  return solved(problem, { design, back, triangle, scaled, target, rank, condition, used });
}

interface Solution {
  readonly design: Matrix;
  readonly back: Matrix;
  readonly triangle: SingularValueDecomposition;
  readonly scaled: Matrix;
  readonly target: Matrix;
  readonly rank: number;
  readonly condition: number;
  readonly used: number;
}

function solved({ rows, y, weights, clusters }: LeastSquaresProblem, solution: Solution): SolvedFit {
  const { design, back, triangle, scaled, target, rank, condition, used } = solution;
  const parameters = back.mmul(scaled).to1DArray();
  const weighted = Matrix.sub(target, design.mmul(scaled)).to1DArray();
  const residualSumOfSquares = weighted.reduce((sum, r) => sum + r * r, 0);
  const degreesOfFreedom = used - parameters.length;
  const variance = degreesOfFreedom > 0 ? residualSumOfSquares / degreesOfFreedom : null;
  const toParameters = (covariance: Matrix) => symmetric(back.mmul(covariance).mmul(back.transpose()));
  const whole = inverseNormal(triangle);
  const sandwich = clusters ? clusterSandwich(design, whole, weighted, clusters) : null;
  const information = toParameters(whole);
  return {
    status: 'solved',
    why: 'Solved.',
    parameters,
    covariance: (weights ? information : information.mul(variance ?? NaN)).to2DArray(),
    clusterCovariance: sandwich && toParameters(sandwich).to2DArray(),
    residuals: rows.map((row, i) => y[i]! - dot(row, parameters)),
    rank,
    condition,
    residualSumOfSquares,
    residualStandardDeviation: variance === null ? null : Math.sqrt(variance),
    degreesOfFreedom,
  };
}

/** (RᵀR)⁻¹ = V S⁻² Vᵀ from the singular values of the triangle R. */
function inverseNormal(triangle: SingularValueDecomposition): Matrix {
  const V = triangle.rightSingularVectors;
  const inverseSquares = triangle.diagonal.map((value) => 1 / (value * value));
  return V.mmul(Matrix.diag(inverseSquares)).mmul(V.transpose());
}

function rankDeficient({ names }: LeastSquaresProblem, triangle: SingularValueDecomposition, back: Matrix, rank: number): UnsolvedFit {
  const scaled = triangle.rightSingularVectors.getColumn(triangle.diagonal.length - 1);
  const hidden = scaled.flatMap((share, j) => (Math.abs(share) > NAMED_SHARE ? [names?.[j] ?? `parameter ${j + 1}`] : []));
  return {
    status: 'rankDeficient',
    why: `The observations cannot tell ${hidden.join(' from ')}.`,
    rank,
    condition: Infinity,
    weakest: back.mmul(Matrix.columnVector(scaled)).to1DArray(),
  };
}

const tooFew = (used: number, unknowns: number): UnsolvedFit => ({
  status: 'tooFew',
  why: `There are ${unknowns} unknowns and only ${used} observations.`,
  rank: used,
  condition: Infinity,
  weakest: null,
});

const dot = (a: Vector, b: Vector) => a.reduce((sum, x, j) => sum + x * b[j]!, 0);

function checkProblem({ rows, y, weights, clusters }: LeastSquaresProblem): void {
  const unknowns = rows[0]?.length ?? 0;
  if (rows.length !== y.length) throw new RangeError(`${rows.length} rows but ${y.length} observations`);
  if (weights && weights.length !== y.length) throw new RangeError(`${weights.length} weights but ${y.length} observations`);
  if (clusters && clusters.length !== y.length) throw new RangeError(`${clusters.length} cluster labels but ${y.length} observations`);
  if (rows.some((row) => row.length !== unknowns)) throw new RangeError('rows differ in length');
  if (![...rows, y].every((row) => row.every(Number.isFinite))) throw new RangeError('rows and observations must be finite');
  if (weights && !weights.every((weight) => weight >= 0 && Number.isFinite(weight)))
    throw new RangeError('weights must be finite and not negative');
}
