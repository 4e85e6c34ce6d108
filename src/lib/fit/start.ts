import type { ModuleConstants } from '@/lib/module';
import { solveLeastSquares, type Vector } from '@/lib/numeric';
import { isLinear } from './observable';
import { modelOf } from './problem';
import type { Observation } from './types';

/** Where linear observations are linearised; any other place gives the same rows. */
const UNIT: ModuleConstants = { alpha: 1, R: 1, K: 1 };

/** Figure of merit of common material near room temperature, 1/K (common practice, no source); only where a search begins. */
const USUAL_Z = 2.5e-3;
/** Decades of α (V/K) and R (ohm) that cover a single couple to the largest module. */
const ALPHA_DECADES: readonly [number, number] = [-4, 0];
const R_DECADES: readonly [number, number] = [-3, 3];
const STEPS_A_DECADE = 3;

/**
 * Constants to begin the fit with: the solution of the linear observations where they determine it, otherwise the best of a
 * logarithmic grid over α and R at the usual figure of merit. Null where no grid point can answer every observation.
 */
export function startConstants(observations: readonly Observation[], weights: Vector): ModuleConstants | null {
  const linear = linearStart(observations, weights);
  return linear !== null && isUsable(linear, observations) ? linear : gridStart(observations, weights);
}

function isUsable(linear: ModuleConstants, observations: readonly Observation[]): boolean {
  if (observations.every(isLinear)) return true;
  return Object.values(linear).every((value) => value > 0) && modelOf(linear, observations) !== null;
}

function linearStart(observations: readonly Observation[], weights: Vector): ModuleConstants | null {
  const chosen = observations.filter(isLinear);
  const fit = solveLeastSquares({
    rows: modelOf(UNIT, chosen)!.jacobian,
    y: chosen.map(({ value }) => value),
    weights: weights.filter((_, i) => isLinear(observations[i]!)),
  });
  if (fit.status !== 'solved') return null;
  const [alpha, R, K] = fit.parameters as [number, number, number];
  return { alpha, R, K };
}

function gridStart(observations: readonly Observation[], weights: Vector): ModuleConstants | null {
  let best: ModuleConstants | null = null;
  let least = Infinity;
  for (const alpha of decades(ALPHA_DECADES)) {
    for (const R of decades(R_DECADES)) {
      const constants = { alpha, R, K: alpha ** 2 / (R * USUAL_Z) };
      const cost = costOf(constants, observations, weights);
      if (cost < least) [best, least] = [constants, cost];
    }
  }
  return best;
}

function costOf(constants: ModuleConstants, observations: readonly Observation[], weights: Vector): number {
  const answers = modelOf(constants, observations);
  if (answers === null) return Infinity;
  return observations.reduce((sum, { value }, i) => sum + weights[i]! * (value - answers.values[i]!) ** 2, 0);
}

const decades = ([from, to]: readonly [number, number]) =>
  Array.from({ length: (to - from) * STEPS_A_DECADE + 1 }, (_, i) => 10 ** (from + i / STEPS_A_DECADE));
