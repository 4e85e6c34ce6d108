import { predict, type ModuleFit, type PredictedValue, type PredictionPoint } from '@/lib/fit';
import { celsius, kelvin, toCelsius, toKelvin } from '@/lib/units';
import type { ReadingPrediction } from './document';
import type { ReadingModel, ReadPrediction, Validity } from './result';
import { tidyAll } from './tidy';

function pointOf({ hotSideC, coldSideC, deltaT, I, V }: ReadingPrediction): PredictionPoint {
  const Th = hotSideC === undefined ? toKelvin(celsius(coldSideC ?? NaN)) + deltaT : toKelvin(celsius(hotSideC));
  const faces = { Th, Tc: coldSideC === undefined ? Th - deltaT : toKelvin(celsius(coldSideC)) };
  return I === undefined ? { ...faces, V: V ?? NaN } : { ...faces, I };
}

/** Ends of a range belong to it, whatever the last bit of a subtraction says. */
const isWithin = (value: number, [low, high]: readonly [number, number]) => {
  const slack = 1e-9 * Math.max(1, Math.abs(low), Math.abs(high));
  return value >= low - slack && value <= high + slack;
};

const isInside = (validity: Validity, I: number, { Tc, Th }: PredictionPoint) =>
  isWithin(I, validity.I) && isWithin(Th - Tc, validity.deltaT) && isWithin(toCelsius(kelvin(Th)), validity.hotSideC);

/** What was asked, without a key that holds nothing. */
function askedOf({ hotSideC, coldSideC, deltaT, I, V }: ReadingPrediction) {
  return { ...(hotSideC === undefined ? { coldSideC } : { hotSideC }), deltaT, ...(I === undefined ? { V } : { I }) };
}

/** Next to no current the COP runs away beyond any number; then there is none. */
const orNone = (cop: PredictedValue | null) => (cop && Number.isFinite(cop.value) && Number.isFinite(cop.uRead) ? cop : null);

/** One prediction from a fitted model: of I and V the one asked stays a number, the other is an answer. */
export function predictionOf(asked: ReadingPrediction, fit: ModuleFit, model: ReadingModel): ReadPrediction {
  const point = pointOf(asked);
  const { I, V, Qc, Qh, P, COP } = tidyAll(predict(fit, point, { tolerancePercent: model.tolerancePercent }));
  const electrical = asked.I === undefined ? { I, V: asked.V ?? NaN } : { I: asked.I, V };
  return { ...askedOf(asked), inside: isInside(model.validity, I.value, point), Qc, Qh, ...electrical, P, COP: orNone(COP) };
}

/** The same without a model. */
export const missingPrediction = (asked: ReadingPrediction, missing: string): ReadPrediction => ({ ...askedOf(asked), missing });
