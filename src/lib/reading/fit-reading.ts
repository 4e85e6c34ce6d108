import { fitBest, fitConstant, fitForm, moduleOfFit, type FitOutcome, type FormChoice, type ModuleFit, type Observation } from '@/lib/fit';
import type { Frame } from '@/lib/geometry';
import type { ReadingDocument } from './document';
import { covarianceFromMarks } from './marks-covariance';
import { observationsOf } from './observations';

/** A fit with what it rests on; its covariance holds the marks too. */
export interface FittedReading {
  readonly outcome: FitOutcome;
  readonly observations: readonly Observation[];
  /** How the form was chosen; null where the document names it or nothing could be fitted. */
  readonly choice: FormChoice | null;
}

const withMarks = (fit: ModuleFit, marks: readonly (readonly number[])[]): ModuleFit => ({
  ...fit,
  covariance: fit.covariance.map((row, i) => row.map((value, j) => value + (marks[i]?.[j] ?? 0))),
});

/** The fit of the form a document names, or of the one that foretells best. */
function fitAsked(document: ReadingDocument, observations: readonly Observation[]) {
  const form = document.model?.form ?? 'auto';
  if (form !== 'auto') return { outcome: fitForm(form, observations), choice: null };
  const best = fitBest(observations);
  return 'ok' in best ? { outcome: best, choice: null } : best;
}

/**
 * Fits the form that a document asks to all its curves. A first fit of constants takes the uncertainty of the answer alone; the second takes both axes
 * through the first one's model. The covariance of the parameters is that of the points (see `fitForm`) plus that of the marks.
 */
export function fitReading(document: ReadingDocument, frames: readonly Frame[]): FittedReading {
  const rough = observationsOf(document, frames).observations;
  const first = fitConstant(rough);
  if (!first.ok) return { outcome: first, observations: rough, choice: null };
  const { observations } = observationsOf(document, frames, moduleOfFit(first.fit));
  const { outcome, choice } = fitAsked(document, observations);
  if (!outcome.ok) return { outcome, observations, choice: null };
  const fit = withMarks(outcome.fit, covarianceFromMarks(document, frames, observations, outcome.fit));
  return { outcome: { ok: true, fit }, observations, choice };
}
