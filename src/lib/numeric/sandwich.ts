import { inverse, Matrix } from 'ml-matrix';
import type { Vector } from './types';

/** Largest condition of XᵀX without one cluster at which leaving that cluster out still says something. */
const JACKKNIFE_CONDITION = 1e12;

/**
 * Covariance of weighted least squares that holds when the errors inside a cluster depend on each other in any way:
 * the sandwich of K.-Y. Liang, S. L. Zeger, Biometrika 73 (1986) 13-22 (from memory), in the form of the cluster jackknife
 * C = (G−1)/G Σ_g d_g d_gᵀ, d_g = (XᵀX − X_gᵀX_g)⁻¹ X_gᵀ r_g, which corrects the residuals for their own leverage
 * (L. A. Mancl, T. A. DeRouen, Biometrics 57 (2001) 126-134; from memory) and so does not fall short with few clusters.
 * A cluster without which the design is singular enters uncorrected, d_g = (XᵀX)⁻¹ X_gᵀ r_g.
 *
 * `design` and `residuals` are already multiplied by the square roots of the weights; `whole` is (XᵀX)⁻¹ of that design.
 * Null with fewer than two clusters.
 */
export function clusterSandwich(design: Matrix, whole: Matrix, residuals: Vector, clusters: readonly (string | number)[]): Matrix | null {
  const members = groupRows(clusters);
  if (members.length < 2) return null;
  const normal = design.transpose().mmul(design);
  const p = design.columns;
  const sum = Matrix.zeros(p, p);
  for (const rows of members) {
    const part = design.subMatrixRow([...rows], 0, p - 1);
    const score = part.transpose().mmul(Matrix.columnVector(rows.map((i) => residuals[i]!)));
    const rest = Matrix.sub(normal, part.transpose().mmul(part));
    const step = (inverseOrNull(rest) ?? whole).mmul(score);
    sum.add(step.mmul(step.transpose()));
  }
  return sum.mul((members.length - 1) / members.length);
}

function inverseOrNull(symmetric: Matrix): Matrix | null {
  try {
    const result = inverse(symmetric);
    return result.norm('frobenius') * symmetric.norm('frobenius') < JACKKNIFE_CONDITION ? result : null;
  } catch {
    return null;
  }
}

function groupRows(clusters: readonly (string | number)[]): readonly (readonly number[])[] {
  const groups = new Map<string | number, number[]>();
  clusters.forEach((label, i) => {
    const group = groups.get(label);
    if (group) group.push(i);
    else groups.set(label, [i]);
  });
  return [...groups.values()];
}
