import type { ModelForm, ModuleConstants } from '@/lib/module';
import type { ModelValues, NonlinearProblem, Vector } from '@/lib/numeric';
import { observe } from './observable';
import { constantsOf, type Observation } from './types';
import { curveOf, weightsOf } from './weights';

/** The constants as the solver holds them. */
export type Triple = readonly [alpha: number, R: number, K: number];

/** The constants in the order of the solver. */
export const tripleOf = ({ alpha, R, K }: ModuleConstants): Triple => [alpha, R, K];

/** The least-squares problem of some observations, without its start: model, observations, weights and curves as clusters. */
export function problemOf(
  observations: readonly Observation[],
  floor: number,
  form: ModelForm = 'constant',
): Omit<NonlinearProblem, 'start'> & { readonly weights: Vector } {
  return {
    model: (parameters) => modelOf(constantsOf({ parameters: parameters as Triple }), observations, form),
    y: observations.map(({ value }) => value),
    weights: weightsOf(observations, floor),
    clusters: observations.map(curveOf),
    names: ['Seebeck coefficient', 'resistance', 'thermal conductance'],
  };
}

/** Answers and derivatives at every observation; null where one of them has no answer. */
export function modelOf(
  constants: ModuleConstants,
  observations: readonly Observation[],
  form: ModelForm = 'constant',
): ModelValues | null {
  if (form !== 'constant' && !(constants.alpha > 0 && constants.R > 0 && constants.K > 0)) return null;
  const values: number[] = [];
  const jacobian: Triple[] = [];
  for (const point of observations) {
    const answer = observe(constants, point.answer, point, form);
    if (answer === null) return null;
    values.push(answer.value);
    jacobian.push(answer.gradient);
  }
  return { values, jacobian };
}
