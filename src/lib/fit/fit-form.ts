import { lumpedAt, type ModelForm, type ModuleConstants } from '@/lib/module';
import { gaussNewton, largerCovariance, mean, solveLeastSquares, weakestCombination } from '@/lib/numeric';
import type { LinearFit, NonlinearFit, SolvedFit, Vector } from '@/lib/numeric';
import { checkObservations } from './check';
import { gapOf, tooLittle } from './missing';
import { modelOf, problemOf, tripleOf, type Triple } from './problem';
import { remainderOf } from './residuals';
import { startConstants } from './start';
import { constantsOf, type ConstantFit, type FitOutcome, type ModuleFit, type Observation } from './types';
import { MISFIT_FLOOR } from './weights';

/** How a fit may differ from the usual one. */
export interface FitOptions {
  /** Share of the axis range granted to every point beside its reading uncertainty; 0.005 when left out. */
  readonly misfitFloor?: number | undefined;
}

/** Beyond this condition of the design, columns of length one, the constants hang on rounding. */
const LARGEST_CONDITION = 1e5;
/** A combination of the constants less certain than this share of itself counts as not determined (a choice, no source). */
const LARGEST_RELATIVE_UNCERTAINTY = 0.5;

const CHECK = 'check the quantities, the units, the values of the curves and which side is held.';
const TOO_FEW = 'Three constants need at least three points: put more points on the curves.';
const UNANSWERABLE = `No module can show all of these points: ${CHECK}`;
const UNSETTLED = `The fit did not settle on one answer: ${CHECK}`;

/**
 * Fits a form of the model, α (V/K), R (ohm) and K (W/K), to all charts of a reading together. For the constant form heat, power and voltage
 * at a given current are linear in them and solved at once; everything else goes on by Gauss-Newton, the forms shaped and leg from the
 * constants that fit best, taken back to 300.15 K.
 *
 * Weights are 1/(u² + (floor · axis range)²), those of one curve together at most those of fifteen points. The covariance is
 * that of the weights, (XᵀWX)⁻¹, or the sandwich by curve of K.-Y. Liang and S. L. Zeger (see `solveLeastSquares`), in every
 * direction the larger of both: points of one curve share their line and are not independent.
 * Errors that all points of a chart share (its marks) show in no residual; whoever knows the frames adds them.
 *
 * Where rank, condition or covariance say that the charts do not determine all three, where they contradict each other or the
 * iteration does not settle, the outcome is one sentence and no number. Throws a RangeError for what is no observation:
 * not finite, without range, or with both or neither of I and V.
 */
export function fitForm(
  form: ModelForm,
  observations: readonly Observation[],
  { misfitFloor = MISFIT_FLOOR }: FitOptions = {},
): FitOutcome {
  checkObservations(observations);
  const used = observations.filter(({ omitted }) => omitted !== true);
  if (used.length < 3) return refuse(gapOf(used) ?? TOO_FEW, null);
  const problem = problemOf(used, misfitFloor, form);
  const begun = startFor(used, problem.weights);
  if ('ok' in begun) return begun;
  const start = atReference(form, begun, used);
  if (form !== 'constant' && !Object.values(start).every((value) => value > 0)) return fitForm('constant', observations);
  const solution = gaussNewton({ ...problem, start: tripleOf(start) });
  const refusal = refusalOf(solution, used);
  return (
    refusal ?? {
      ok: true,
      fit: { ...describe(form, solution), ...remainderOf(constantsAt(solution), observations, misfitFloor, form) },
    }
  );
}

/** A refit has settled when no parameter changes by more than this share: far less than leaving anything out changes them. */
const NEARLY = 1e-6;

/** The constants of a form fitted to part of what a whole fit rests on, beginning from that; null where the part does not determine them. */
export function refit({ form, parameters }: ModuleFit, observations: readonly Observation[]): ModuleConstants | null {
  if (observations.length < 3 || gapOf(observations) !== null) return null;
  const problem = problemOf(observations, MISFIT_FLOOR, form);
  const solution = gaussNewton({ ...problem, clusters: undefined, start: parameters, tolerance: NEARLY });
  return refusalOf(solution, observations) === null ? constantsAt(solution) : null;
}

/** Constants that fit nearly, or why there are none: a chart that is missing, or points that no constants answer. */
function startFor(used: readonly Observation[], weights: Vector): ModuleConstants | Refused {
  const start = startConstants(used, weights);
  if (start === null) return refuse(UNANSWERABLE, null);
  const problem = { ...problemOf(used, MISFIT_FLOOR), weights };
  const first = solveLeastSquares({ ...problem, clusters: undefined, rows: modelOf(start, used)!.jacobian });
  const gap = gapOf(used);
  if (gap !== null) return refuse(gap, first);
  return first.status === 'solved' ? start : refuse(tooLittle(used, relativeTo(tripleOf(start), first.weakest)), first);
}

/** Constants effective over the sheet as those of a form at 300.15 K: taken back from the mean temperature of all points. */
function atReference(form: ModelForm, constants: ModuleConstants, used: readonly Observation[]): ModuleConstants {
  const middle = mean(used.map(({ Tc, Th }) => (Tc + Th) / 2));
  const shape = lumpedAt(form, { alpha: 1, R: 1, K: 1 }, middle, middle);
  return { alpha: constants.alpha / shape.alpha, R: constants.R / shape.R, K: constants.K / shape.K };
}

/** Fits the constant form; see `fitForm`. */
export const fitConstant = (observations: readonly Observation[], options?: FitOptions): FitOutcome<ConstantFit> =>
  fitForm('constant', observations, options) as FitOutcome<ConstantFit>;

/** Fits the shaped form; see `fitForm`. */
export const fitShaped = (observations: readonly Observation[], options?: FitOptions): FitOutcome =>
  fitForm('shaped', observations, options);

/** Fits the leg form; see `fitForm`. */
export const fitLeg = (observations: readonly Observation[], options?: FitOptions): FitOutcome => fitForm('leg', observations, options);

const constantsAt = ({ parameters }: NonlinearFit) => constantsOf({ parameters: parameters as Triple });

const relativeTo = (parameters: Vector, direction: Vector | null) =>
  direction && direction.map((part, j) => part / Math.abs(parameters[j]!));

type Refused = Extract<FitOutcome, { readonly ok: false }>;

const refuse = (missing: string, linear: LinearFit | null): Refused => ({
  ok: false,
  missing,
  rank: linear?.rank ?? 0,
  condition: linear?.condition ?? Infinity,
});

/** What speaks against a solution, gravest first; null when nothing does. */
function refusalOf({ status, parameters, linear }: NonlinearFit, used: readonly Observation[]): Refused | null {
  if (linear?.status !== 'solved') return refuse(tooLittle(used, relativeTo(parameters, linear?.weakest ?? null)), linear);
  const weakest = weakestCombination(parameters, linear.covariance);
  if (linear.condition > LARGEST_CONDITION || weakest.u > LARGEST_RELATIVE_UNCERTAINTY) {
    return refuse(tooLittle(used, weakest.direction), linear);
  }
  if (status !== 'converged') return refuse(UNSETTLED, linear);
  const impossible = ['Seebeck coefficient', 'resistance', 'thermal conductance'].filter((_, j) => !(parameters[j]! > 0));
  return impossible.length === 0 ? null : refuse(`Together these charts give no positive ${impossible.join(' and ')}: ${CHECK}`, linear);
}

function describe(form: ModelForm, { parameters, linear, iterations, status, why }: NonlinearFit) {
  const { covariance, clusterCovariance, rank, condition } = linear as SolvedFit;
  return {
    form,
    parameters: parameters as Triple,
    covariance: clusterCovariance ? largerCovariance(covariance, clusterCovariance) : covariance,
    rank,
    condition,
    iterations,
    converged: status === 'converged',
    why,
  };
}
