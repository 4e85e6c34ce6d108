import { constantsOf, fitConstant, type ConstantFit, type FitOutcome, type Observation } from '@/lib/fit';
import { frameVariations, type Frame } from '@/lib/geometry';
import type { ModuleConstants } from '@/lib/module';
import type { ReadingCurve, ReadingDocument } from './document';
import { observationsOf } from './observations';

/** A fit of the constant form with what it rests on; its covariance holds the marks too. */
export interface FittedReading {
  readonly outcome: FitOutcome;
  readonly observations: readonly Observation[];
}

/** So many points of a curve are enough to see what the marks do to the model. */
const POINTS_FOR_MARKS = 40;

function thinCurve(curve: ReadingCurve): ReadingCurve {
  const { points } = curve;
  if (!points || points.length <= POINTS_FOR_MARKS) return curve;
  const kept = Array.from({ length: POINTS_FOR_MARKS }, (_, at) => Math.round((at * (points.length - 1)) / (POINTS_FOR_MARKS - 1)));
  return { ...curve, points: kept.flatMap((at) => [points[at] ?? []].filter((px) => px.length === 2)) };
}

const thinned = (document: ReadingDocument): ReadingDocument => ({
  ...document,
  charts: document.charts.map((chart) => ({ ...chart, curves: chart.curves?.map(thinCurve) })),
});

const isFitted = (outcome: FitOutcome): outcome is Extract<FitOutcome, { ok: true }> => outcome.ok;

/**
 * Covariance of α, R, K that comes from the marks. They are shared by all points of a chart, so no weighting of points can show it:
 * every frame is moved by one standard uncertainty along each of its independent directions and the model fitted anew; the products of the changes add up.
 */
function covarianceFromMarks(document: ReadingDocument, frames: readonly Frame[], constants: ModuleConstants): number[][] {
  const few = thinned(document);
  const fitWith = (moved: readonly Frame[]) => fitConstant(observationsOf(few, moved, constants).observations);
  const sum = [0, 1, 2].map(() => [0, 0, 0]);
  const middle = fitWith(frames);
  if (!isFitted(middle)) return sum;
  for (const [chart, frame] of frames.entries()) {
    for (const variation of frameVariations(frame)) {
      const outcome = fitWith(frames.map((other, at) => (at === chart ? variation : other)));
      if (!isFitted(outcome)) continue;
      const change = outcome.fit.parameters.map((value, at) => value - (middle.fit.parameters[at] ?? 0));
      sum.forEach((row, i) => row.forEach((value, j) => (row[j] = value + (change[i] ?? 0) * (change[j] ?? 0))));
    }
  }
  return sum;
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
  const constants = constantsOf(first.fit);
  const { observations } = observationsOf(document, frames, constants);
  const outcome = fitConstant(observations);
  if (!outcome.ok) return { outcome, observations };
  return { outcome: { ok: true, fit: withMarks(outcome.fit, covarianceFromMarks(document, frames, constants)) }, observations };
}
