import { impliedRatings, moduleOfFit, type FormChoice, type ModuleFit, type Observation } from '@/lib/fit';
import { moduleOfForm, temperatureCoefficients, type ModuleConstants, type ThermoelectricModule } from '@/lib/module';
import { kelvin, REFERENCE_KELVIN, toCelsius } from '@/lib/units';
import type { ReadingDocument, ReadingModule } from './document';
import type { DerivedRatings, ReadingModel, Validity } from './result';
import { tidyAll } from './tidy';

/** A model is believed this far on either side of the hot sides of its charts, K (a choice, no source). */
const HOT_SIDE_MARGIN_K = 10;

const rangeOf = (values: readonly number[]): [number, number] =>
  values.reduce<[number, number]>(([low, high], value) => [Math.min(low, value), Math.max(high, value)], [Infinity, -Infinity]);

/** A lower end this near to zero, as a share of the range, is zero read with a trembling hand. */
const NEARLY_ZERO = 0.01;

/** From zero, or from below it where points really lie there. */
function fromZero(values: readonly number[]): [number, number] {
  const [low, high] = rangeOf([0, ...values]);
  return [low > -NEARLY_ZERO * high ? 0 : low, high];
}

/** The ranges that the curves cover; current and difference reach down to zero, hot sides a margin further. */
function validityOf(fit: ModuleFit, observations: readonly Observation[]): Validity {
  const module = moduleOfFit(fit);
  const currentAt = ({ I, V, Tc, Th }: Observation) => I ?? module.currentAtVoltage(V ?? NaN, kelvin(Tc), kelvin(Th));
  const [coldest, warmest] = rangeOf(observations.map(({ Th }) => toCelsius(kelvin(Th))));
  return {
    I: fromZero(observations.map(currentAt)),
    deltaT: fromZero(observations.map(({ Tc, Th }) => Th - Tc)),
    hotSideC: [coldest - HOT_SIDE_MARGIN_K, warmest + HOT_SIDE_MARGIN_K],
  };
}

/** Hot sides that charts and ratings name, each once, coldest first; the reference temperature where a sheet names only cold sides. */
function hotSidesOf({ charts, module }: ReadingDocument): number[] {
  const named = [...charts, ...(module.rated ?? [])].flatMap(({ hotSideC }) => hotSideC ?? []);
  return named.length > 0 ? [...new Set(named)].sort((a, b) => a - b) : [toCelsius(REFERENCE_KELVIN)];
}

function derivedAt(fit: ModuleFit, hotSideC: number): DerivedRatings {
  const { imaxLargestDeltaT, imaxMostHeat, qmaxW, dTmaxK, vmaxV, Z } = impliedRatings(fit, hotSideC);
  return { hotSideC, imaxLargestDeltaT, imaxMostHeat, qmaxW, dTmaxK, vmaxV, Z };
}

/** The widest delivery tolerance the ratings state, percent; null when they state none. */
export function toleranceOf({ rated }: ReadingModule): number | null {
  const stated = (rated ?? []).flatMap(({ tolerancePercent }) => tolerancePercent ?? []);
  return stated.length === 0 ? null : Math.max(...stated);
}

/** What the parameters of every form are: for shaped and leg the published shapes times these, which are α, R and K at 300.15 K themselves. */
const NAMES = [
  { name: 'alpha', unit: 'V/K' },
  { name: 'R', unit: 'ohm' },
  { name: 'K', unit: 'W/K' },
] as const;

/** The model of a reading as the result document has it. */
export function describeModel(
  document: ReadingDocument,
  fit: ModuleFit,
  observations: readonly Observation[],
  choice: FormChoice | null,
): ReadingModel {
  const entry = (at: 0 | 1 | 2) => ({ value: fit.parameters[at], u: Math.sqrt(fit.covariance[at]?.[at] ?? NaN), unit: NAMES[at].unit });
  return tidyAll<ReadingModel>({
    form: fit.form,
    grade: 'curves',
    at: fit.form === 'constant' ? 'effective' : '300.15 K',
    alpha: entry(0),
    R: entry(1),
    K: entry(2),
    temperature: temperatureCoefficients(fit.form),
    parameters: NAMES.map(({ name, unit }, at) => ({ name, value: fit.parameters[at] ?? NaN, unit })),
    covariance: fit.covariance,
    rmsPercentOfQmax: fit.rmsPercentOfQmax,
    rmsPercentOfVmax: fit.rmsPercentOfVmax,
    tolerancePercent: toleranceOf(document.module),
    validity: validityOf(fit, observations),
    derived: hotSidesOf(document).map((hotSideC) => derivedAt(fit, hotSideC)),
    ...(choice && { choice }),
  });
}

/** The module that a model describes, whatever its form: the door for everyone who asks a model for heat, voltage or COP. */
export const moduleOf = (model: Pick<ReadingModel, 'form' | 'alpha' | 'R' | 'K'>): ThermoelectricModule =>
  moduleOfForm(model.form, constantsOfModel(model));

/** α, R and K of a model: effective ones for the constant form, else those at 300.15 K. */
export const constantsOfModel = ({ alpha, R, K }: Pick<ReadingModel, 'alpha' | 'R' | 'K'>): ModuleConstants => ({
  alpha: alpha.value,
  R: R.value,
  K: K.value,
});
