import { constantsOf, fitConstant, type ConstantFit, type FitOutcome, type Observation } from '@/lib/fit';
import type { Frame } from '@/lib/geometry';
import type { ReadingDocument } from './document';
import { covarianceFromMarks } from './marks-covariance';
import { observationsOf } from './observations';

/** A fit of the constant form with what it rests on; its covariance holds the marks too. */
export interface FittedReading {
  readonly outcome: FitOutcome;
  readonly observations: readonly Observation[];
}

const withMarks = (fit: ConstantFit, marks: readonly (readonly number[])[]): ConstantFit => ({
  ...fit,
  covariance: fit.covariance.map((row, i) => row.map((value, j) => value + (marks[i]?.[j] ?? 0))),
});

/**
 * Fits the constant form to all curves of a reading. The first fit takes the uncertainty of the answer alone; the second takes both axes through
 * the first one's model. The covariance of the parameters is that of the points (see `fitConstant`) plus that of the marks.
 */
export function fitReading(document: ReadingDocument, frames: readonly Frame[]): FittedReading {
  const rough = observationsOf(document, frames).observations;
  const first = fitConstant(rough);
  if (!first.ok) return { outcome: first, observations: rough };
  const { observations } = observationsOf(document, frames, constantsOf(first.fit));
  const outcome = fitConstant(observations);
  if (!outcome.ok) return { outcome, observations };
  return { outcome: { ok: true, fit: withMarks(outcome.fit, covarianceFromMarks(document, frames, observations)) }, observations };
}
