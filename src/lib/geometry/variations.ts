import { CholeskyDecomposition, Matrix } from 'ml-matrix';
import type { Frame } from './types';

/**
 * The frame moved by one standard uncertainty along as many independent directions as it has parameters: its parameters plus each column of a
 * Cholesky factor L of their covariance, C = L·Lᵀ. For any quantity that depends on the frame, the sum of the squares of its changes over these
 * frames is the variance it has from the marks, to first order (JCGM 100:2008, eq. 13).
 */
export function frameVariations(frame: Frame): readonly Frame[] {
  const factor = new CholeskyDecomposition(new Matrix(frame.covariance.map((row) => [...row]))).lowerTriangularMatrix;
  return frame.parameters.map((_, direction) => ({
    ...frame,
    parameters: frame.parameters.map((value, at) => value + factor.get(at, direction)),
  }));
}
