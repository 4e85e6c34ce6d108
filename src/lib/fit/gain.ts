import { solveLeastSquares, type Vector } from '@/lib/numeric';
import { observe } from './observable';
import { problemOf } from './problem';
import { constantsOf, type ModuleFit, type Observation } from './types';
import { MISFIT_FLOOR } from './weights';

/** What small changes of the points do to a fit, to first order. */
export interface FitGain {
  /**
   * Change of α, R and K when each of the fit's points, in their order, is read as the given one instead: its value, faces, current or voltage.
   * Points at which the form has no answer are left as they were.
   */
  readonly changeBy: (moved: readonly Observation[]) => Vector;
}

/**
 * The linear response of a fit to its points, G = (XᵀWX)⁻¹XᵀW at the solution: Δp = G Δr, with r the residuals at fixed parameters. Null where
 * the points, thinned perhaps from those of the fit, do not determine all parameters.
 */
export function gainOf(fit: ModuleFit, observations: readonly Observation[], misfitFloor = MISFIT_FLOOR): FitGain | null {
  const constants = constantsOf(fit);
  const { model, weights, y } = problemOf(observations, misfitFloor, fit.form);
  const here = model(fit.parameters);
  if (here === null) return null;
  const solved = solveLeastSquares({ rows: here.jacobian, y: y.map((value, i) => value - here.values[i]!), weights });
  if (solved.status !== 'solved') return null;
  const shiftAt = (i: number, moved: Observation) => {
    const answer = observe(constants, moved.answer, moved, fit.form);
    return answer === null ? 0 : moved.value - answer.value - (y[i]! - here.values[i]!);
  };
  const gains = here.jacobian.map((row, i) =>
    solved.covariance.map((column) => weights[i]! * column.reduce((sum, part, k) => sum + part * row[k]!, 0)),
  );
  const changeBy = (moved: readonly Observation[]): Vector =>
    moved.reduce<readonly number[]>(
      (change, point, i) => {
        const shift = shiftAt(i, point);
        return change.map((value, k) => value + gains[i]![k]! * shift);
      },
      [0, 0, 0],
    );
  return { changeBy };
}
