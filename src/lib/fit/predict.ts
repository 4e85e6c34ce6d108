import { maximaOf, type ModelForm, type ModuleMaxima } from '@/lib/module';
import { propagate, type Rows, type Vector } from '@/lib/numeric';
import { celsius, kelvin, toKelvin } from '@/lib/units';
import type { Triple } from './problem';
import { constantsOf, moduleOfFit, type FittedConstants, type PredictedValue, type UncertainValue } from './types';

/** Where a prediction is asked: absolute face temperatures in K and either current in A or voltage in V. */
export type PredictionPoint = { readonly Tc: number; readonly Th: number } & (
  { readonly I: number; readonly V?: undefined } | { readonly V: number; readonly I?: undefined }
);

/** Everything a module does at one point, in A, V, W and 1; COP is null where P ≤ 0. */
export interface Prediction {
  readonly I: PredictedValue;
  readonly V: PredictedValue;
  readonly Qc: PredictedValue;
  readonly Qh: PredictedValue;
  readonly P: PredictedValue;
  readonly COP: PredictedValue | null;
}

/** How predictions may be accompanied. */
export interface PredictionOptions {
  /** Delivery tolerance as stated on the sheet, percent of the value; tolerances are null when left out. */
  readonly tolerancePercent?: number | null | undefined;
}

/**
 * What a fitted module does at one point. `uRead` carries the covariance of the constants and the form's misfit, as one
 * more error of heat and one of voltage, by the law of propagation of uncertainty (JCGM 100:2008, 5.2.2); `tolerance` is the
 * stated percentage of the value, one half width.
 */
export function predict(fit: FittedConstants, at: PredictionPoint, { tolerancePercent }: PredictionOptions = {}): Prediction {
  const { heatW, voltageV } = fit.misfit ?? { heatW: null, voltageV: null };
  const covariance = withErrors(fit.covariance, heatW ?? 0, voltageV ?? 0);
  const { values, u } = propagate((parameters) => stateAt(parameters, at, fit.form), [...fit.parameters, 0, 0], covariance);
  const entry = (i: number): PredictedValue => ({
    value: values[i]!,
    uRead: u[i]!,
    tolerance: tolerancePercent == null ? null : (Math.abs(values[i]!) * tolerancePercent) / 100,
  });
  const consumes = values[POWER]! > 0;
  return { I: entry(0), V: entry(1), Qc: entry(2), Qh: entry(3), P: entry(POWER), COP: consumes ? entry(5) : null };
}

/** Place of the power among the values of `stateAt`. */
const POWER = 4;

/** I, V, Qc, Qh, P and COP from α, R, K and the misfit of heat (W) and voltage (V). */
function stateAt([alpha, R, K, heatError, voltageError]: Vector, at: PredictionPoint, form?: ModelForm): Vector {
  const [Tc, Th] = [kelvin(at.Tc), kelvin(at.Th)];
  const module = moduleOfFit({ form, parameters: [alpha!, R!, K!] });
  const I = at.I ?? module.currentAtVoltage(at.V - voltageError!, Tc, Th);
  const V = module.voltage(I, Tc, Th) + voltageError!;
  const Qc = module.heat(I, Tc, Th) + heatError!;
  const P = V * I;
  return [I, V, Qc, Qc + P, P, Qc / P];
}

/** Covariance with two more, independent parameters of the given standard uncertainties. */
function withErrors(covariance: Rows, heatW: number, voltageV: number): Rows {
  return [...covariance.map((row) => [...row, 0, 0]), [0, 0, 0, heatW ** 2, 0], [0, 0, 0, 0, voltageV ** 2]];
}

/** Ratings that the constants imply at one hot side, each with its standard uncertainty. */
export type ImpliedRatings = { readonly hotSideC: number } & { readonly [rating in keyof ModuleMaxima]: UncertainValue };

const UNITS: Readonly<Record<keyof ModuleMaxima, string>> = {
  imaxLargestDeltaT: 'A',
  imaxMostHeat: 'A',
  qmaxW: 'W',
  qMostHeatW: 'W',
  dTmaxK: 'K',
  vmaxV: 'V',
  Z: '1/K',
};

/**
 * The maxima of a fitted module with its hot side held at `hotSideC` (°C), from `maximaOf`, with
 * standard uncertainties from the covariance of the constants. For comparison with printed ratings, without a verdict.
 */
export function impliedRatings(fit: FittedConstants, hotSideC: number): ImpliedRatings {
  const names = Object.keys(UNITS) as (keyof ModuleMaxima)[];
  const maxima = (parameters: Vector) => {
    const found = maximaOf(
      fit.form ?? 'constant',
      constantsOf({ parameters: parameters as unknown as Triple }),
      toKelvin(celsius(hotSideC)),
    );
    return names.map((name) => found[name]);
  };
  const { values, u } = propagate(maxima, fit.parameters, fit.covariance);
  const entries = names.map((name, i): [string, UncertainValue] => [name, { value: values[i]!, u: u[i]!, unit: UNITS[name] }]);
  return { hotSideC, ...(Object.fromEntries(entries) as Record<keyof ModuleMaxima, UncertainValue>) };
}
