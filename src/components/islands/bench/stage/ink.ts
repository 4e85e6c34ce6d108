import type { SceneCurve, SceneMark } from '@/lib/editor';
import type { Px } from '@/lib/geometry';

/**
 * Colours of what is drawn over a picture. A picture is the same in both themes, so these are too: the light ramp of the
 * tokens with a white halo, which keeps 3:1 against white paper and against a dark photograph alike.
 */
export const INK = '#1B2430';
export const HALO = '#FFFFFF';
const OVER_PRINT = { halo: 1.5, haloColour: '#FFFFFFA6' } as const;
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

interface Stroke {
  readonly width: number;
  readonly colour: string;
  /** What the halo adds to the width, and its colour: a line over print has a thin pale one, so that the print shows beside it. */
  readonly halo?: number;
  readonly haloColour?: string;
  readonly dash?: readonly number[];
}

/** Twice over: first the wide halo, then the ink, so that the line shows on any ground. */
function twice(pen: Pen, unit: number, { width, colour, halo = 2.5, haloColour = HALO, dash = [] }: Stroke, path: () => void): void {
  for (const [stroke, extra, pattern] of [
    [haloColour, halo, []],
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
  if (!pointsOnly && used.length > 1)
    twice(pen, unit, { width: curve.active ? 1.5 : 1, colour, dash: dashOf(curve.style), ...OVER_PRINT }, () => polyline(pen, used));
  if (used.length <= 60 || curve.active) {
    const radius = (curve.active ? 3.75 : 3) * unit;
    twice(pen, unit, { width: 1.5, colour }, () => used.forEach(([x, y]) => outline(pen, x, y, radius)));
  }
  const out = points.filter((_, index) => omitted.has(index));
  if (out.length > 0) twice(pen, unit, { width: 1, colour: INK }, () => out.forEach(([x, y]) => OUTLINES.cross(pen, x, y, 4 * unit)));
}

/** A line of the fitted family. */
export function drawFitted(pen: Pen, points: readonly Px[], style: number, unit: number): void {
  twice(pen, unit, { width: 1.5, colour: colourOf(style), ...OVER_PRINT }, () => polyline(pen, points));
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
  twice(pen, unit, { width: 1.4, colour: INK }, () => arms(pen, px, 1.5 * unit, 10 * unit));
  twice(pen, unit, { width: 1.4, colour: INK, dash: mark.known === 'none' ? [3, 3] : [] }, () =>
    OUTLINES.circle(pen, px[0], px[1], 5.5 * unit),
  );
}

/** The ring round what is picked out. */
export function drawSelected(pen: Pen, [x, y]: Px, unit: number): void {
  twice(pen, unit, { width: 2, colour: INK }, () => OUTLINES.circle(pen, x, y, 9 * unit));
}

/** The keyboard's cross-hairs. */
export function drawAim(pen: Pen, px: Px, unit: number): void {
  twice(pen, unit, { width: 1.25, colour: INK }, () => arms(pen, px, 3 * unit, 22 * unit));
}
