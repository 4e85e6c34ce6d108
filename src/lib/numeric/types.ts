/** A vector of plain numbers. */
export type Vector = readonly number[];
/** A matrix as rows of plain numbers; JSON-able. */
export type Rows = readonly (readonly number[])[];

/** One weighted linear least-squares problem: find b so that rows · b is nearest to y. */
export interface LeastSquaresProblem {
  /** Design matrix, one row for each observation. */
  readonly rows: Rows;
  /** Observations, as many as rows. */
  readonly y: Vector;
  /** One over the square of each observation's standard uncertainty; a weight of 0 leaves an observation out of the solution. */
  readonly weights?: Vector | undefined;
  /** Observations with the same label are not independent of each other; asks for `clusterCovariance`. */
  readonly clusters?: readonly (string | number)[] | undefined;
  /** Names of the parameters, for the sentence in `why`. */
  readonly names?: readonly string[] | undefined;
}

/** What is known of every attempt. */
interface Attempt {
  /** "Solved", or one sentence on what the observations cannot tell. */
  readonly why: string;
  /** Rank of the design. */
  readonly rank: number;
  /** Ratio of the largest to the smallest singular value of the design with centred columns of length one; Infinity when singular. */
  readonly condition: number;
}

/** A unique solution. */
export interface SolvedFit extends Attempt {
  readonly status: 'solved';
  readonly parameters: Vector;
  /**
   * With weights (XᵀWX)⁻¹, the covariance that the stated uncertainties carry; without weights s²(XᵀX)⁻¹.
   * NaN entries where neither is known (no weights and no more observations than unknowns).
   */
  readonly covariance: Rows;
  /** Sandwich covariance over clusters (see `clusterCovariance`); null without clusters or with fewer than two of them. */
  readonly clusterCovariance: Rows | null;
  /** y − rows · parameters, not weighted. */
  readonly residuals: Vector;
  /** Weighted sum of squared residuals. */
  readonly residualSumOfSquares: number;
  /** √(sum of squares / degrees of freedom); null without degrees of freedom. */
  readonly residualStandardDeviation: number | null;
  readonly degreesOfFreedom: number;
}

/** No unique solution, therefore no numbers; `weakest` is the direction in parameter space that the observations do not see. */
export interface UnsolvedFit extends Attempt {
  readonly status: 'rankDeficient' | 'tooFew';
  readonly weakest: Vector | null;
}

/** Outcome of a linear least-squares problem. */
export type LinearFit = SolvedFit | UnsolvedFit;
