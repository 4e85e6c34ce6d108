import type { Known } from './knowns';
import { distanceToLine, placesAt, projectionOfFrame, type Projection } from './projection';
import type { Frame, Mark, Px } from './types';
import { laidOut, valueAt } from './scale';

const rms = (values: readonly number[]) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);

/** Root mean square of the pixel distances between the marks and their value lines. */
export const rmsDistance = (projection: Projection, knowns: readonly Known[]): number =>
  rms(knowns.map(({ axis, d, place }) => distanceToLine(projection, axis, place, d)));

/** Root mean square difference, in the units of one axis, between the value of the frame at the marks and the known value. */
export function rmsInUnits(projection: Projection, scales: Frame['scales'], knowns: readonly Known[], axis: 'x' | 'y'): number {
  const at = axis === 'x' ? 0 : 1;
  const own = knowns.filter((known) => known.axis === axis);
  return rms(own.map(({ d, place }) => valueAt(placesAt(projection, d)[at], scales[axis]) - valueAt(place, scales[axis])));
}

/** How far one mark lies from the lines of its values, in pixels and signed along the growing value; null for a value it does not have. */
export interface MarkResidual {
  readonly x: number | null;
  readonly y: number | null;
}

/** Distances of every mark from its value lines, px, in the order of the marks. */
export function markResiduals(frame: Frame, marks: readonly Mark[]): readonly MarkResidual[] {
  const projection = projectionOfFrame(frame);
  return marks.map(({ px, x, y }) => {
    const d: Px = [px[0] - frame.origin[0], px[1] - frame.origin[1]];
    const from = (axis: 'x' | 'y', value: number | undefined) =>
      value === undefined ? null : distanceToLine(projection, axis, laidOut(value, frame.scales[axis]), d);
    return { x: from('x', x), y: from('y', y) };
  });
}
