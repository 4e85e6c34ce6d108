import type { Frame, FrameKind, Px } from './types';

type Row = readonly [number, number, number];

/**
 * The one form behind every kind of frame: a projective map from pixels relative to the origin to places along the axes,
 * s = g1·p / g3·p and t = g2·p / g3·p with p = (dx, dy, 1). R. Hartley, A. Zisserman, Multiple View Geometry, 2nd edition 2004, 2.3 (from memory).
 */
export type Projection = readonly [Row, Row, Row];

/** Nine numbers of the projection from the parameters of a kind (see `Frame`). */
export function projectionOf(kind: FrameKind, parameters: readonly number[]): Projection {
  const q = (at: number) => parameters[at] ?? 0;
  if (kind === 'perspective') {
    return [
      [q(0), q(1), q(2)],
      [q(3), q(4), q(5)],
      [q(6), q(7), 1],
    ];
  }
  const angle = kind === 'turned' ? q(4) : 0;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  return [
    [cos / q(1), sin / q(1), -q(0) / q(1)],
    [-sin / q(3), cos / q(3), -q(2) / q(3)],
    [0, 0, 1],
  ];
}

/** The projection of a fitted frame. */
export const projectionOfFrame = (frame: Pick<Frame, 'kind' | 'parameters'>) => projectionOf(frame.kind, frame.parameters);

const dot = (row: Row, [dx, dy]: Px) => row[0] * dx + row[1] * dy + row[2];

/** Denominator of the map at a pixel: positive on the visible side of the horizon of a perspective frame, 1 everywhere otherwise. */
export const denominatorAt = (projection: Projection, d: Px): number => dot(projection[2], d);

/** Places (s, t) along the axes at a pixel relative to the origin. */
export function placesAt(projection: Projection, d: Px): Px {
  const w = denominatorAt(projection, d);
  return [dot(projection[0], d) / w, dot(projection[1], d) / w];
}

/** Gradients of both places over the pixel: [[∂s/∂px, ∂s/∂py], [∂t/∂px, ∂t/∂py]]. */
export function placeGradients(projection: Projection, d: Px): readonly [Px, Px] {
  const w = denominatorAt(projection, d);
  const [s, t] = placesAt(projection, d);
  const [g1, g2, g3] = projection;
  return [
    [(g1[0] - s * g3[0]) / w, (g1[1] - s * g3[1]) / w],
    [(g2[0] - t * g3[0]) / w, (g2[1] - t * g3[1]) / w],
  ];
}

const cross = (a: Row, b: Row): Row => [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];

/** The pixel, relative to the origin, that has these places along the axes: where the two lines of equal value meet. */
export function pixelAt([g1, g2, g3]: Projection, [s, t]: Px): Px {
  const lineOf = (row: Row, place: number): Row => [row[0] - place * g3[0], row[1] - place * g3[1], row[2] - place * g3[2]];
  const [dx, dy, w] = cross(lineOf(g1, s), lineOf(g2, t));
  return [dx / w, dy / w];
}

/** Signed distance in pixels from a pixel to the line on which an axis has this place. */
export function distanceToLine(projection: Projection, axis: 'x' | 'y', place: number, d: Px): number {
  const row = projection[axis === 'x' ? 0 : 1];
  const g3 = projection[2];
  const [lx, ly] = [row[0] - place * g3[0], row[1] - place * g3[1]];
  return (dot(row, d) - place * dot(g3, d)) / Math.hypot(lx, ly);
}
