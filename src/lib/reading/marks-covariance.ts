import { gainOf, type ModuleFit, type Observation } from '@/lib/fit';
import { frameVariations, type Frame } from '@/lib/geometry';
import { chartValues, stateAt } from './chart-values';
import type { ReadingDocument } from './document';

/** So many points of a curve are enough to see what the marks do to the model; a curve weighs no more than these anyway. */
const POINTS_OF_A_CURVE = 15;

function thinned(observations: readonly Observation[]): Observation[] {
  const curves = new Map<string, Observation[]>();
  for (const point of observations) {
    const name = `${point.chart}/${point.curve}`;
    curves.set(name, [...(curves.get(name) ?? []), point]);
  }
  return [...curves.values()].flatMap((points) => {
    const step = Math.max(1, (points.length - 1) / (POINTS_OF_A_CURVE - 1));
    return points.filter((_, at) => Math.round(Math.round(at / step) * step) === at);
  });
}

/** The same points as another frame of their chart would read them. */
function readWith(frame: Frame, chart: number, document: ReadingDocument, observations: readonly Observation[]): Observation[] {
  const shown = document.charts[chart];
  if (!shown) return [...observations];
  const values = chartValues(shown, document.module);
  return observations.map((point) => {
    const curve = point.chart === chart ? shown.curves?.[point.curve] : undefined;
    const px = curve?.points?.[point.point];
    return curve && px ? { ...point, ...stateAt(values, frame, curve.value, px) } : point;
  });
}

/**
 * Covariance of α, R, K that comes from the marks. They are shared by all points of a chart, so no weighting of points can show it: every frame is
 * moved by one standard uncertainty along each of its independent directions, and what the fit makes of the points then read follows from its linear
 * response to them (see `gainOf`); the products of the changes add up (JCGM 100:2008, eq. 13). `observations` are those of `frames`.
 */
export function covarianceFromMarks(
  document: ReadingDocument,
  frames: readonly Frame[],
  observations: readonly Observation[],
  fit: ModuleFit,
): readonly (readonly number[])[] {
  const few = thinned(observations);
  const gain = gainOf(fit, few);
  const changes = frames.flatMap((frame, chart) =>
    frameVariations(frame).flatMap((variation) => (gain ? [gain.changeBy(readWith(variation, chart, document, few))] : [])),
  );
  return [0, 1, 2].map((i) => [0, 1, 2].map((j) => changes.reduce((sum, change) => sum + (change[i] ?? 0) * (change[j] ?? 0), 0)));
}
