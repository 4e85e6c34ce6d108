import type { SceneCurve, SceneMark } from '@/lib/editor';
import type { Px } from '@/lib/geometry';

/**
 * Colours of what is drawn over a picture. A picture is the same in both themes, so these are too: the light ramp of the
 * tokens with a white halo, which keeps 3:1 against white paper and against a dark photograph alike.
 */
export const INK = '#1B2430';
export const HALO = '#FFFFFF';
export const RAMP = ['#3D2E6B', '#6B4FA3', '#8F6FC8'] as const;

/** Dashes of the curves of a chart in turn, in CSS pixels. */
export const DASHES: readonly (readonly number[])[] = [[], [7, 4], [2, 4], [10, 4, 2, 4], [4, 3]];

/** Shapes of the points of the curves of a chart in turn. */
export const SHAPES = ['circle', 'square', 'diamond', 'triangle', 'cross'] as const;
export type Shape = (typeof SHAPES)[number];

const turn = <T>(list: readonly T[], at: number): T => list[at % list.length] as T;
export const colourOf = (style: number): string => turn(RAMP, style);
export const dashOf = (style: number): readonly number[] => turn(DASHES, style);
export const shapeOf = (style: number): Shape => turn(SHAPES, style);

/** What drawing needs of a context; Konva's and the browser's own both have it. */
export type Pen = Pick<
  CanvasRenderingContext2D,
  'beginPath' | 'moveTo' | 'lineTo' | 'arc' | 'rect' | 'closePath' | 'stroke' | 'setLineDash' | 'strokeStyle' | 'lineWidth'
>;

/** Twice over: first the wide halo, then the ink, so that the line shows on any ground. */
function twice(pen: Pen, width: number, colour: string, unit: number, path: () => void, dash: readonly number[] = []): void {
  for (const [stroke, extra, pattern] of [
    [HALO, 2.5, []],
    [colour, 0, dash],
  ] as const) {
    pen.beginPath();
    path();
    pen.strokeStyle = stroke;
    pen.lineWidth = (width + extra) * unit;
    pen.setLineDash(pattern.map((length) => length * unit));
    pen.stroke();
  }
  pen.setLineDash([]);
}

const polyline = (pen: Pen, points: readonly Px[]): void =>
  points.forEach(([x, y], index) => (index === 0 ? pen.moveTo(x, y) : pen.lineTo(x, y)));

const OUTLINES: Readonly<Record<Shape, (pen: Pen, x: number, y: number, r: number) => void>> = {
  circle: (pen, x, y, r) => {
    pen.moveTo(x + r, y);
    pen.arc(x, y, r, 0, 2 * Math.PI, false);
  },
  square: (pen, x, y, r) => pen.rect(x - r * 0.88, y - r * 0.88, r * 1.76, r * 1.76),
  diamond: (pen, x, y, r) => {
    polyline(pen, [
      [x, y - r * 1.25],
      [x + r * 1.25, y],
      [x, y + r * 1.25],
      [x - r * 1.25, y],
    ]);
    pen.closePath();
  },
  triangle: (pen, x, y, r) => {
    polyline(pen, [
      [x, y - r * 1.2],
      [x + r * 1.15, y + r * 0.85],
      [x - r * 1.15, y + r * 0.85],
    ]);
    pen.closePath();
  },
  cross: (pen, x, y, r) => {
    polyline(pen, [
      [x - r, y - r],
      [x + r, y + r],
    ]);
    polyline(pen, [
      [x - r, y + r],
      [x + r, y - r],
    ]);
  },
};

/** A curve: its line, unless `pointsOnly`, and its points; left-out points are pale and crossed through. `unit` is one CSS pixel in source pixels. */
export function drawCurve(pen: Pen, curve: SceneCurve, points: readonly Px[], unit: number, pointsOnly: boolean): void {
  const colour = colourOf(curve.style);
  const omitted = new Set(curve.omitted);
  const used = points.filter((_, index) => !omitted.has(index));
  const outline = OUTLINES[shapeOf(curve.style)];
  if (!pointsOnly && used.length > 1) twice(pen, curve.active ? 2 : 1.25, colour, unit, () => polyline(pen, used), dashOf(curve.style));
  if (used.length <= 60 || curve.active) {
    const radius = (curve.active ? 3.75 : 3) * unit;
    twice(pen, 1.5, colour, unit, () => used.forEach(([x, y]) => outline(pen, x, y, radius)));
  }
  const out = points.filter((_, index) => omitted.has(index));
  if (out.length > 0) twice(pen, 1, INK, unit, () => out.forEach(([x, y]) => OUTLINES.cross(pen, x, y, 4 * unit)));
}

/** A line of the fitted family. */
export function drawFitted(pen: Pen, points: readonly Px[], style: number, unit: number): void {
  twice(pen, 1.5, colourOf(style), unit, () => polyline(pen, points));
}

const arms = (pen: Pen, [x, y]: Px, inner: number, outer: number): void => {
  for (const [dx, dy] of [
    [1, 0],
    [-1, 0],
    [0, 1],
    [0, -1],
  ] as const) {
    pen.moveTo(x + dx * inner, y + dy * inner);
    pen.lineTo(x + dx * outer, y + dy * outer);
  }
};

/** A mark: cross-hairs in a ring; a mark without a value has the ring broken. */
export function drawMark(pen: Pen, mark: SceneMark, px: Px, unit: number): void {
  twice(pen, 1.4, INK, unit, () => arms(pen, px, 1.5 * unit, 10 * unit));
  twice(pen, 1.4, INK, unit, () => OUTLINES.circle(pen, px[0], px[1], 5.5 * unit), mark.known === 'none' ? [3, 3] : []);
}

/** The ring round what is picked out. */
export function drawSelected(pen: Pen, [x, y]: Px, unit: number): void {
  twice(pen, 2, INK, unit, () => OUTLINES.circle(pen, x, y, 9 * unit));
}

/** The keyboard's cross-hairs. */
export function drawAim(pen: Pen, px: Px, unit: number): void {
  twice(pen, 1.25, INK, unit, () => arms(pen, px, 3 * unit, 22 * unit));
}
