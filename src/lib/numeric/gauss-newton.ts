import { solveLeastSquares } from './least-squares';
import type { LinearFit, Rows, Vector } from './types';

/** A least-squares problem that is not linear in its parameters. */
export interface NonlinearProblem {
  readonly start: Vector;
  readonly y: Vector;
  /** Values of the model and their derivatives by each parameter, one row an observation; null where the model is not defined. */
  readonly model: (parameters: Vector) => ModelValues | null;
  /** One over the square of each observation's standard uncertainty. */
  readonly weights?: Vector | undefined;
  readonly clusters?: readonly (string | number)[] | undefined;
  readonly names?: readonly string[] | undefined;
  /** Most accepted or refused steps; 200 when left out. */
  readonly maxIterations?: number | undefined;
  /** Largest relative change of any parameter at which the solution counts as found; 1e-9 when left out. */
  readonly tolerance?: number | undefined;
}

export interface ModelValues {
  readonly values: Vector;
  readonly jacobian: Rows;
}

/** Where the iteration ended, why, and the linear problem at that place: its covariance, rank and condition. */
export interface NonlinearFit {
  readonly status: 'converged' | 'stalled' | 'iterationLimit' | 'undefinedStart';
  readonly why: string;
  readonly parameters: Vector;
  readonly iterations: number;
  /** Weighted sum of squared residuals at `parameters`. */
  readonly residualSumOfSquares: number;
  /** The linearised problem at `parameters`; its parameters are the next step, which is as good as zero. Null for an undefined start. */
  readonly linear: LinearFit | null;
}

interface State {
  readonly parameters: Vector;
  readonly residuals: Vector;
  readonly jacobian: Rows;
  readonly cost: number;
}

const FIRST_DAMPING = 1e-3;
const LEAST_DAMPING = 1e-7;
const MOST_DAMPING = 1e12;
/** An undamped step this small that lowers nothing any more is rounding: the solution is reached as nearly as it can be. */
const ROUNDING_STEP = 1e-6;

/**
 * Gauss-Newton with step control: each step solves the linearised problem, damped by rows √λ d_j δ_j = 0 in the scale d_j of
 * the columns (D. W. Marquardt, J. SIAM 11 (1963) 431-441; from memory); λ falls tenfold after a step that lowers the
 * sum of squares and rises tenfold after one that does not. Converged when the undamped step changes no parameter by more than `tolerance`.
 */
export function gaussNewton(problem: NonlinearProblem): NonlinearFit {
  const { start, maxIterations = 200, tolerance = 1e-9 } = problem;
  const first = stateAt(problem, start);
  if (first === null) return undefinedStart(start);
  let state = first;
  let damping = FIRST_DAMPING;
  let refused = false;
  for (let iterations = 0; iterations < maxIterations; iterations += 1) {
    const newton = linearise(problem, state);
    const ahead = relativeStep(newton, state);
    if (ahead <= tolerance || (refused && ahead <= ROUNDING_STEP)) return finish(problem, 'converged', state, iterations);
    if (damping > MOST_DAMPING) return finish(problem, 'stalled', state, iterations);
    const next = dampedStep(problem, state, damping);
    refused = next === null || next.cost >= state.cost;
    damping = refused ? damping * 10 : Math.max(damping / 10, LEAST_DAMPING);
    if (!refused) state = next!;
  }
  return finish(problem, 'iterationLimit', state, maxIterations);
}

function stateAt({ model, y, weights }: NonlinearProblem, parameters: Vector): State | null {
  const result = model(parameters);
  if (result === null) return null;
  const residuals = y.map((value, i) => value - result.values[i]!);
  const cost = residuals.reduce((sum, r, i) => sum + (weights?.[i] ?? 1) * r * r, 0);
  const finite = Number.isFinite(cost) && result.jacobian.every((row) => row.every(Number.isFinite));
  return finite ? { parameters, residuals, jacobian: result.jacobian, cost } : null;
}

const linearise = ({ weights }: NonlinearProblem, { jacobian, residuals }: State): LinearFit =>
  solveLeastSquares({ rows: jacobian, y: residuals, weights });

function relativeStep(newton: LinearFit, { parameters }: State): number {
  if (newton.status !== 'solved') return Infinity;
  return Math.max(...newton.parameters.map((step, j) => Math.abs(step) / (Math.abs(parameters[j]!) || 1)));
}

function dampedStep(problem: NonlinearProblem, { parameters, jacobian, residuals }: State, damping: number): State | null {
  const weights = problem.weights ?? residuals.map(() => 1);
  const damper = parameters.map((_, j) => {
    const length = Math.sqrt(jacobian.reduce((sum, row, i) => sum + weights[i]! * row[j]! ** 2, 0));
    return parameters.map((_, k) => (k === j ? Math.sqrt(damping) * (length || 1) : 0));
  });
  const zeros = parameters.map(() => 0);
  const step = solveLeastSquares({
    rows: [...jacobian, ...damper],
    y: [...residuals, ...zeros],
    weights: [...weights, ...zeros.map(() => 1)],
  });
  if (step.status !== 'solved') return null;
  return stateAt(
    problem,
    parameters.map((value, j) => value + step.parameters[j]!),
  );
}

const WHY = {
  converged: 'Converged.',
  stalled: 'No step lowers the sum of squares, though the solution is not reached.',
  iterationLimit: 'The step limit was reached before the solution.',
} as const;

function finish(problem: NonlinearProblem, status: keyof typeof WHY, state: State, iterations: number): NonlinearFit {
  const { weights, clusters, names } = problem;
  const linear = solveLeastSquares({ rows: state.jacobian, y: state.residuals, weights, clusters, names });
  return { status, why: WHY[status], parameters: state.parameters, iterations, residualSumOfSquares: state.cost, linear };
}

const undefinedStart = (start: Vector): NonlinearFit => ({
  status: 'undefinedStart',
  why: 'The model is not defined at the start values.',
  parameters: start,
  iterations: 0,
  residualSumOfSquares: Infinity,
  linear: null,
});
