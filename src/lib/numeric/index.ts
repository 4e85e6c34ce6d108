/** Least squares, roots, minima, covariance and statistics over plain arrays. */
export type * from './types';
export { solveLeastSquares } from './least-squares';
export { gaussNewton, type ModelValues, type NonlinearFit, type NonlinearProblem } from './gauss-newton';
export { largerCovariance, propagate, weakestCombination, type Propagated, type WeakestCombination } from './covariance';
export { findRoot, type RootOptions } from './root';
export { minimise, type Minimum } from './minimise';
export { mean, median, quantile, rms } from './statistics';
export { spectralGrid, type SpectralGrid } from './chebyshev';
export { solveInPlace } from './small-system';
