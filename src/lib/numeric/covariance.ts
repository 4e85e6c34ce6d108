import { CholeskyDecomposition, EigenvalueDecomposition, inverse, Matrix } from 'ml-matrix';
import type { Rows, Vector } from './types';

/** Relative step of the central differences, near the cube root of the machine precision. */
const STEP = 6e-6;

/** Values that follow from uncertain parameters. */
export interface Propagated {
  readonly values: Vector;
  /** Standard uncertainties of the values. */
  readonly u: Vector;
  /** Covariance of the values. */
  readonly covariance: Rows;
}

/**
 * Law of propagation of uncertainty: the covariance of f(parameters) is J C Jᵀ (JCGM 100:2008, 5.2.2 eq. 13, for several results
 * at once), with J by central differences.
 */
export function propagate(f: (parameters: Vector) => Vector, parameters: Vector, covariance: Rows): Propagated {
  const values = f(parameters);
  const columns = parameters.map((value, j) => {
    const step = STEP * (Math.abs(value) || Math.sqrt(covariance[j]![j]!) || 1);
    const shifted = (by: number) => f(parameters.map((other, k) => (k === j ? other + by : other)));
    const [up, down] = [shifted(step), shifted(-step)];
    return values.map((_, i) => (up[i]! - down[i]!) / (2 * step));
  });
  const jacobian = new Matrix(columns).transpose();
  const result = jacobian.mmul(new Matrix(covariance as number[][])).mmul(jacobian.transpose());
  return { values, covariance: result.to2DArray(), u: result.diagonal().map((variance) => Math.sqrt(Math.max(0, variance))) };
}

/**
 * The smallest covariance of its kind that is nowhere below either of two: in the axes in which `base` is the unit matrix and
 * `other` is diagonal, the larger of both on each axis. Every combination of the parameters then has at least the
 * variance that either gives it, which a choice element by element would not ensure. `base` must be positive definite.
 */
export function largerCovariance(base: Rows, other: Rows): Rows {
  const root = new CholeskyDecomposition(symmetric(new Matrix(base as number[][]))).lowerTriangularMatrix;
  const toUnit = inverse(root);
  const relative = toUnit.mmul(new Matrix(other as number[][])).mmul(toUnit.transpose());
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(symmetric(relative), { assumeSymmetric: true });
  const axes = root.mmul(eigenvectorMatrix);
  const larger = axes.mmul(Matrix.diag(realEigenvalues.map((value) => Math.max(value, 1)))).mmul(axes.transpose());
  return symmetric(larger).to2DArray();
}

/** The same matrix without the asymmetry that rounding leaves. */
export const symmetric = (matrix: Matrix): Matrix => Matrix.add(matrix, matrix.transpose()).mul(0.5);

/** The combination of parameters known worst. */
export interface WeakestCombination {
  /** Its parts, each relative to its parameter; the vector has length one. */
  readonly direction: Vector;
  /** Its relative standard uncertainty. */
  readonly u: number;
}

/** The combination of parameters that is known worst when each is measured in its own size: the main axis of the relative covariance. */
export function weakestCombination(parameters: Vector, covariance: Rows): WeakestCombination {
  const relative = covariance.map((row, i) => row.map((value, j) => value / Math.abs(parameters[i]! * parameters[j]!)));
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(symmetric(new Matrix(relative)), { assumeSymmetric: true });
  const worst = realEigenvalues.indexOf(Math.max(...realEigenvalues));
  return { direction: eigenvectorMatrix.getColumn(worst), u: Math.sqrt(Math.max(0, realEigenvalues[worst]!)) };
}
