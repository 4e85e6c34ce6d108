import { constantsOf, impliedRatings, type ConstantFit, type Observation } from '@/lib/fit';
import { kelvin, REFERENCE_KELVIN, toCelsius } from '@/lib/units';
import type { ReadingDocument, ReadingModule } from './document';
import type { DerivedRatings, ReadingModel, Validity } from './result';
import { tidyAll } from './tidy';

/** A model of constants is believed this far on either side of the hot sides of its charts, K (a choice, no source). */
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
function validityOf(fit: ConstantFit, observations: readonly Observation[]): Validity {
  const { alpha, R } = constantsOf(fit);
  const currentAt = ({ I, V, Tc, Th }: Observation) => I ?? ((V ?? NaN) - alpha * (Th - Tc)) / R;
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

function derivedAt(fit: ConstantFit, hotSideC: number): DerivedRatings {
  const { imaxLargestDeltaT, imaxMostHeat, qmaxW, dTmaxK, vmaxV, Z } = impliedRatings(fit, hotSideC);
  return { hotSideC, imaxLargestDeltaT, imaxMostHeat, qmaxW, dTmaxK, vmaxV, Z };
}

/** The widest delivery tolerance the ratings state, percent; null when they state none. */
export function toleranceOf({ rated }: ReadingModule): number | null {
  const stated = (rated ?? []).flatMap(({ tolerancePercent }) => tolerancePercent ?? []);
  return stated.length === 0 ? null : Math.max(...stated);
}

const NAMES = [
  { name: 'alpha', unit: 'V/K' },
  { name: 'R', unit: 'ohm' },
  { name: 'K', unit: 'W/K' },
] as const;

/** The model of a reading as the result document has it. */
export function describeModel(document: ReadingDocument, fit: ConstantFit, observations: readonly Observation[]): ReadingModel {
  const entry = (at: 0 | 1 | 2) => ({ value: fit.parameters[at], u: Math.sqrt(fit.covariance[at]?.[at] ?? NaN), unit: NAMES[at].unit });
  return tidyAll<ReadingModel>({
    form: 'constant',
    grade: 'curves',
    at: 'effective',
    alpha: entry(0),
    R: entry(1),
    K: entry(2),
    temperature: { alphaPerK: 0, RPerK: 0, KPerK: 0 },
    parameters: NAMES.map(({ name, unit }, at) => ({ name, value: fit.parameters[at] ?? NaN, unit })),
    covariance: fit.covariance,
    rmsPercentOfQmax: fit.rmsPercentOfQmax,
    rmsPercentOfVmax: fit.rmsPercentOfVmax,
    tolerancePercent: toleranceOf(document.module),
    validity: validityOf(fit, observations),
    derived: hotSidesOf(document).map((hotSideC) => derivedAt(fit, hotSideC)),
  });
}
